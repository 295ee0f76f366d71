// Text for a canvas or an SVG, in pieces of different size, so that a fraction is set as one.
import type { LengthParts } from '#shared/units';

export interface TextRun {
  readonly text: string;
  /** Share of the mark's size. */
  readonly size: number;
  /** Raised by this share of the mark's size; negative: lowered. */
  readonly raise: number;
}

export const plain = (text: string): TextRun[] => [{ text, size: 1, raise: 0 }];

/** A length as it is set in print: a real fraction, the unit after it. */
export function lengthRuns(parts: LengthParts): TextRun[] {
  const runs: TextRun[] = [];
  const whole = `${parts.sign === '-' ? '\u2212' : ''}${parts.whole}`;
  if (whole !== '') runs.push({ text: whole, size: 1, raise: 0 });
  if (parts.numerator !== 0) {
    runs.push(
      { text: String(parts.numerator), size: 0.72, raise: 0.3 },
      { text: '\u2044', size: 0.95, raise: 0.02 },
      { text: String(parts.denominator), size: 0.72, raise: -0.1 },
    );
  }
  runs.push(parts.unit === 'mm' ? { text: '\u00a0mm', size: 0.8, raise: 0 } : { text: '"', size: 1, raise: 0 });
  return runs;
}
