// All findings as a plain list, for whoever reads rather than looks, and for those that the ladder has no room for.
import { useState } from 'react';
import { VERDICTS, type Finding, type Verdict } from '#shared/check';
import { Dialog } from '../../../components/dialog';
import { CautionLine } from '../../../components/cautions';
import { VerdictMark } from '../../../components/verdict-mark';
import { useBench, useLive, useSession, useShown } from '../bench-model';
import { findingKey, motionName, pairName } from '../../../lib/finding-words';
import { openFinding } from '../open-finding';
import { Reading } from '../reading';
import { totalsOf } from './totals';
import type { Scene } from '#shared/scene';

const when = (scene: Scene, { motions }: Finding): string =>
  motions.length === 0 ? 'at rest' : motions.map((m) => motionName(scene, m.component, m.motion)).join(' with ');

export function GapList() {
  const bench = useBench();
  const isOpen = useSession((s) => s.sheet === 'gaps');
  const close = (): void => bench.session.getState().set({ sheet: null });
  return (
    <Dialog
      open={isOpen}
      onOpenChange={(open) => {
        if (!open) close();
      }}
      title="All gaps"
      lead="Worst first. Choose one to see it on the bench."
      wide
    >
      <List onChoose={(f) => openFinding(bench, f)} />
      <div className="mt-4 border-t border-dashed border-line pt-3">
        <CautionLine />
      </div>
    </Dialog>
  );
}

function List({ onChoose }: { readonly onChoose: (finding: Finding) => void }) {
  const scene = useShown();
  const findings = useLive((live) => live.findings);
  const [only, setOnly] = useState<Verdict | null>(null);
  const totals = totalsOf(findings);
  const shown = only === null ? findings : findings.filter((f) => f.verdict === only);
  return (
    <>
      <div className="mb-3 flex flex-wrap gap-2" role="group" aria-label="Show only">
        {VERDICTS.filter((v) => totals[v] > 0).map((v) => (
          <button
            key={v}
            type="button"
            className="filter-chip"
            aria-pressed={only === v}
            onClick={() => setOnly(only === v ? null : v)}
          >
            <VerdictMark verdict={v} count={totals[v]} />
          </button>
        ))}
      </div>
      {findings.length === 0 && <p>Nothing to compare yet: a gap needs two parts.</p>}
      <ol className="gap-list">
        {shown.map((f) => (
          <li key={findingKey(f)}>
            <button type="button" onClick={() => onChoose(f)}>
              <span className="gap-list-pair">{pairName(scene, f)}</span>
              <span className="gap-list-when">{when(scene, f)}</span>
              <Reading finding={f} />
            </button>
          </li>
        ))}
      </ol>
    </>
  );
}
