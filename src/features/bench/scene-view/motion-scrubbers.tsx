// A scrubber for every motion of the scene, those that hit first.
import { useState } from 'react';
import type { Motion } from '#shared/scene';
import { StrokeStrip } from '../ladder/stroke-strip';
import { useLive, useOpen, useSession } from '../bench-model';
import { motionKey } from '../viewport/bodies';
import { spansOf } from '../../../lib/spans';

/** So many stand there at once; the rest on request. */
const FIRST = 3;

export function MotionScrubbers() {
  const scene = useOpen((o) => o.scene);
  const findings = useLive((live) => live.findings);
  const arc = useSession((s) => s.arc);
  const [showsAll, setShowsAll] = useState(false);
  const rank = (use: Motion['use'], hits: number, tight: number): number =>
    (hits > 0 ? 0 : tight > 0 ? 1 : 2) + (use === 'service' ? 3 : 0);
  const rows = scene.components
    .flatMap((component) =>
      component.motions.map((motion) => ({ component, motion, ...spansOf(findings, component.id, motion.id) })),
    )
    .map((row, place) => ({ ...row, place, rank: rank(row.motion.use, row.hits.length, row.tight.length) }))
    .sort((a, b) => a.rank - b.rank || a.place - b.place);
  if (rows.length === 0) return null;
  // the motion that is looked at is there in any case
  const shown = rows.filter((row, i) => showsAll || i < FIRST || motionKey(row.component.id, row.motion.id) === arc);
  return (
    <section aria-label="Motions" className="scene-motions">
      {shown.map(({ component, motion, hits, tight }) => (
        <div key={`${component.id}.${motion.id}`}>
          <p className="scene-motion-part">{component.name}</p>
          <StrokeStrip component={component} motion={motion} hits={hits} tight={tight} />
        </div>
      ))}
      {rows.length > FIRST && (
        <button
          type="button"
          className="button-text text-sm"
          aria-expanded={showsAll}
          onClick={() => setShowsAll(!showsAll)}
        >
          {showsAll ? 'Fewer motions' : `All ${rows.length} motions`}
        </button>
      )}
    </section>
  );
}
