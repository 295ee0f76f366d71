// A motion's stroke as a strip: the stretches that hit and that are tight are drawn on it, and a hand can run along it.
import { useId } from 'react';
import type { Span } from '#shared/check';
import type { Component, Motion } from '#shared/scene';
import { formatPercent } from '#shared/units';
import { useFacts, useSession } from '../bench-model';
import { sayPosition, strokeEnds } from '../../../lib/motion-words';
import { motionKey } from '../viewport/bodies';

export interface StrokeStripProps {
  readonly component: Component;
  readonly motion: Motion;
  readonly hits: readonly Span[];
  readonly tight: readonly Span[];
  /** Where the open finding is, 0 to 1. */
  readonly witness?: number;
}

const STEPS = 500;

const percent = (x: number): string => `${(x * 100).toFixed(2)}%`;

function Stretch({ span, kind }: { readonly span: Span; readonly kind: 'hits' | 'tight' }) {
  // a hit at a single place has to be seen too
  const width = Math.max(span[1] - span[0], 0.008);
  const left = Math.min(span[0], 1 - width);
  return <span className={`strip-${kind}`} style={{ left: percent(left), width: percent(width) }} />;
}

const say = (spans: readonly Span[], word: string): string[] =>
  spans.map(([a, b]) =>
    b - a < 0.005 ? `${word} at ${formatPercent(a)}` : `${word} from ${formatPercent(a)} to ${formatPercent(b)}`,
  );

export function StrokeStrip({ component, motion, hits, tight, witness }: StrokeStripProps) {
  const id = useId();
  const { display } = useFacts();
  const key = motionKey(component.id, motion.id);
  const position = useSession((s) => s.positions[key]);
  const setPosition = useSession((s) => s.setPosition);
  const set = useSession((s) => s.set);
  const [start, end] = strokeEnds(motion, component.category);
  const summary = [...say(hits, 'hits'), ...say(tight, 'tight')].join(', ') || 'clears all the way';
  return (
    <div className="strip">
      <div className="strip-head">
        <label htmlFor={id}>{motion.name}</label>
        <span className="figures">{position === undefined ? 'at rest' : sayPosition(motion, position, display)}</span>
      </div>
      <div className="strip-track">
        {tight.map((span) => (
          <Stretch key={`t${span[0]}`} span={span} kind="tight" />
        ))}
        {hits.map((span) => (
          <Stretch key={`h${span[0]}`} span={span} kind="hits" />
        ))}
        {witness !== undefined && <span className="strip-witness" style={{ left: percent(witness) }} />}
        <input
          id={id}
          type="range"
          min={0}
          max={STEPS}
          step={1}
          value={Math.round((position ?? 0) * STEPS)}
          aria-valuetext={position === undefined ? 'at rest' : sayPosition(motion, position, display)}
          aria-describedby={`${id}-spans`}
          data-rest={position === undefined || undefined}
          onChange={(event) => {
            setPosition(key, Number(event.target.value) / STEPS);
            set({ arc: key });
          }}
          onDoubleClick={() => setPosition(key, null)}
        />
      </div>
      <div className="strip-ends">
        <span>{start}</span>
        {position !== undefined && (
          <button type="button" className="button-text strip-rest" onClick={() => setPosition(key, null)}>
            back to rest
          </button>
        )}
        <span>{end}</span>
      </div>
      <p id={`${id}-spans`} className="sr-only">
        {summary}
      </p>
    </div>
  );
}
