// What a finding reads: its gap, or by how much it overlaps, never without the mark and the word of its verdict.
import type { Finding } from '#shared/check';
import type { LengthDisplay } from '#shared/units';
import { readingOf } from '../lib/finding-words';
import { Fraction } from './fraction';

export interface VerdictReadingProps {
  readonly finding: Finding;
  readonly display: LengthDisplay;
}

/** The length with the word that belongs to it; the verdict's own mark and word stand beside it. */
export function VerdictReading({ finding, display }: VerdictReadingProps) {
  const { word, parts } = readingOf(finding, display);
  return (
    <span className="whitespace-nowrap">
      {word !== '' && <span className="mr-1 text-[0.8em] font-normal">{word}</span>}
      {parts !== null && <Fraction parts={parts} />}
    </span>
  );
}
