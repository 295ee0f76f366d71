// The motions of a part: run along them, and say how they go.
import { edits, fixedSolids, freshId, type Component, type Motion, type Step } from '#shared/scene';
import { Button } from '../../../components/button';
import { useBench, useLive, useOpen, useSession, useShown } from '../bench-model';
import { StrokeStrip } from '../ladder/stroke-strip';
import { useSelection } from '../use-selection';
import { motionKey } from '../viewport/bodies';
import { spansOf } from '../../../lib/spans';
import { MotionFields } from './motion-fields';

export function MotionPanel() {
  const { main } = useSelection();
  const part = useShown().components.find((c) => c.id === main?.id);
  return part === undefined ? null : <Motions key={part.id} part={part} />;
}

const SWING: Step = { kind: 'swing', point: [0, 0, 0], axis: [0, 1, 0], from: 0, to: 20 };
const SLIDE: Step = { kind: 'slide', along: [-1, 0, 0], from: 0, to: 100 };

function Motions({ part }: { readonly part: Component }) {
  const { open } = useBench();
  const scene = useOpen((o) => o.scene);
  const canEdit = useOpen((o) => o.canEdit);
  // a solid belongs to one operating motion at most
  const free = fixedSolids(part).map((s) => s.id);
  const add = (name: string, use: Motion['use'], step: Step): void => {
    const solids = use === 'operating' && free.length < part.solids.length ? { solids: free } : {};
    const motion: Motion = { id: freshId(part.motions, name), name, use, steps: [step], ...solids };
    open.getState().apply(edits.addMotion(scene, part.id, motion));
  };
  return (
    <div className="tape-motions">
      {part.motions.length === 0 && (
        <p className="text-soft">It stays where it is. A pedal swings, a cylinder is drawn out, a hood opens.</p>
      )}
      {part.motions.map((motion) => (
        <MotionCard key={motion.id} part={part} motion={motion} />
      ))}
      {canEdit && (
        <div className="tape-row-deeds">
          <Button
            size="small"
            disabled={free.length === 0}
            onClick={() => add(`${part.name} stroke`.slice(0, 120), 'operating', SWING)}
          >
            Add a stroke
          </Button>
          <Button size="small" onClick={() => add('Draw out', 'service', SLIDE)}>
            Add a draw-out
          </Button>
        </div>
      )}
    </div>
  );
}

function MotionCard({ part, motion }: { readonly part: Component; readonly motion: Motion }) {
  const findings = useLive((live) => live.findings);
  const arc = useSession((s) => s.arc);
  const set = useSession((s) => s.set);
  const key = motionKey(part.id, motion.id);
  const spans = spansOf(findings, part.id, motion.id);
  return (
    <section className="motion-card" aria-label={motion.name}>
      <StrokeStrip component={part} motion={motion} hits={spans.hits} tight={spans.tight} />
      <div className="tape-row-deeds">
        <button
          type="button"
          className="button-text"
          aria-pressed={arc === key}
          onClick={() => set({ arc: arc === key ? null : key })}
        >
          {arc === key ? 'fold the swept arc' : 'show the swept arc'}
        </button>
      </div>
      <MotionFields part={part} motion={motion} />
    </section>
  );
}
