// A motion's stroke to be read, not to be moved: the stretches that hit and that are tight, and where the finding is.
import type { Span } from '#shared/check';
import type { Motion } from '#shared/scene';
import { formatPercent } from '#shared/units';
import { strokeEnds } from '../lib/motion-words';
import './stroke-track.css';

export interface StrokeTrackProps {
  readonly motion: Motion;
  readonly category: string;
  readonly hits: readonly Span[];
  readonly tight: readonly Span[];
  /** Where the finding is, 0 to 1. */
  readonly witness: number;
}

/** A stretch narrower than this could not be seen. */
const LEAST = 0.012;

const percent = (x: number): string => `${(x * 100).toFixed(2)}%`;

function Stretch({ span: [from, to], kind }: { readonly span: Span; readonly kind: 'hits' | 'tight' }) {
  const width = Math.max(to - from, LEAST);
  return <span data-kind={kind} style={{ left: percent(Math.min(from, 1 - width)), width: percent(width) }} />;
}

/** "hits from 41 % to 43 %", for those who cannot see the strip and for those who want the figures. */
export function strokeWords(hits: readonly Span[], tight: readonly Span[]): string {
  const say = (spans: readonly Span[], word: string): string[] =>
    spans.map(([from, to]) =>
      formatPercent(from) === formatPercent(to)
        ? `${word} at ${formatPercent(from)}`
        : `${word} from ${formatPercent(from)} to ${formatPercent(to)}`,
    );
  return [...say(hits, 'hits'), ...say(tight, 'tight')].join(', ') || 'clears all the way';
}

export function StrokeTrack({ motion, category, hits, tight, witness }: StrokeTrackProps) {
  const [start, end] = strokeEnds(motion, category);
  return (
    <figure className="stroke-track">
      <div className="stroke-track-run" aria-hidden="true">
        {tight.map((span) => (
          <Stretch key={`t${span[0]}`} span={span} kind="tight" />
        ))}
        {hits.map((span) => (
          <Stretch key={`h${span[0]}`} span={span} kind="hits" />
        ))}
        <i style={{ left: percent(witness) }} />
      </div>
      <figcaption>
        <span aria-hidden="true">{start}</span>
        <span className="text-center">
          <b className="font-semibold">{motion.name}</b>: {strokeWords(hits, tight)}
        </span>
        <span aria-hidden="true">{end}</span>
      </figcaption>
    </figure>
  );
}
