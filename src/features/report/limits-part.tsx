// What the check could not see: meshes that were taken as open surfaces, and jointed pairs that are not followed in motion.
import { Section } from '../../components/page-head';
import { countOf } from '../../lib/format';
import { nameOf } from '../../lib/finding-words';
import type { ReportModel } from './report-model';

export function LimitsPart({ model: { scene, report } }: { readonly model: ReportModel }) {
  const sheets = report.meshes.filter((m) => m.kind === 'sheet');
  const owners = (mesh: string): string =>
    scene.components
      .filter((c) => c.solids.some((s) => s.shape.kind === 'mesh' && s.shape.mesh === mesh))
      .map((c) => c.name)
      .join(', ');
  const { unchecked } = report;
  if (sheets.length === 0 && unchecked.length === 0) return null;
  return (
    <Section title="What was not checked">
      <div className="grid gap-5">
        {sheets.length > 0 && (
          <div>
            <h3 className="font-bold">Taken as open surfaces</h3>
            <p className="mt-0.5 text-sm text-soft">
              Only the surface of these meshes counts. What lies inside them, or behind a tear, is not seen.
            </p>
            <ul className="report-plain">
              {sheets.map((mesh) => (
                <li key={mesh.sha256}>
                  <b>{owners(mesh.mesh)}</b>
                  {mesh.badEdges > 0 && (
                    <span className="text-soft">: {countOf(mesh.badEdges, 'torn or folded edge')}</span>
                  )}
                </li>
              ))}
            </ul>
          </div>
        )}
        {unchecked.length > 0 && (
          <div>
            <h3 className="font-bold">Jointed, so not checked in motion</h3>
            <p className="mt-0.5 text-sm text-soft">
              A pedal turns in its own bracket. These pairs are checked at rest only: move them through by hand.
            </p>
            <ul className="report-plain report-pairs">
              {unchecked.map(([a, b]) => (
                <li key={`${a}|${b}`}>
                  {nameOf(scene, a)}, {nameOf(scene, b)}
                </li>
              ))}
            </ul>
          </div>
        )}
      </div>
    </Section>
  );
}
