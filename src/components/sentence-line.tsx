// A sentence whose lengths are set in the reader's unit, as real fractions.
import type { SentencePart } from '#shared/review';
import { formatPercent, lengthParts, type LengthDisplay } from '#shared/units';
import { Fraction, Gap } from './fraction';

export interface SentenceLineProps {
  readonly parts: readonly SentencePart[];
  readonly display: LengthDisplay;
}

export const SentenceLine = ({ parts, display }: SentenceLineProps) => (
  <>
    {parts.map((part, i) => {
      if (typeof part === 'string') return <span key={i}>{part}</span>;
      if ('percent' in part) return <span key={i}>{formatPercent(part.percent)}</span>;
      return (
        <b key={i} className="whitespace-nowrap">
          {'gap' in part ? <Gap mm={part.gap} display={display} /> : <Need mm={part.need} display={display} />}
        </b>
      );
    })}
  </>
);

/** A length that is needed: rounded up, so that it still does what it is for. */
export const Need = ({ mm, display }: { readonly mm: number; readonly display: LengthDisplay }) => (
  <Fraction parts={lengthParts(mm, display, { denominator: 32, rounding: 'up' })} />
);
