// How a rung's label is set: on one line if pair and reading fit beside one another, on two where names are long, and small
// where so much is wrong that only small labels find room.
import type { Finding } from '#shared/check';
import type { LengthDisplay } from '#shared/units';
import { readingOf } from '../../../lib/finding-words';
import { lengthRuns, plain, widthOf } from '../overlay/mark';

export type LabelForm = 'line' | 'pair' | 'dense';

/** px. Two names stand under one another; so do length and word. */
export const LABEL_HEIGHT: Readonly<Record<LabelForm, number>> = { line: 26, pair: 37, dense: 18 };

/** Mark, gaps and padding around the words, px. */
const AROUND = 42;

export function labelForm(names: string, finding: Finding, display: LengthDisplay, width: number): LabelForm {
  const { word, parts } = readingOf(finding, display);
  const said = widthOf(plain(word === '' ? finding.verdict : word), 12, 600);
  const length = parts === null ? 0 : widthOf(lengthRuns(parts), 17, 700);
  return widthOf(plain(names), 13, 600) + said + length + AROUND <= width ? 'line' : 'pair';
}
