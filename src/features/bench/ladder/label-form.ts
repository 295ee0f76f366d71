// How a rung's label is set: on one line if pair and reading fit beside one another, on two where names are long, and small
// where so much is wrong that only small labels find room.
import type { Finding } from '#shared/check';
import type { LengthDisplay, LengthParts } from '#shared/units';
import { heightOf, readingOf } from '../../../lib/finding-words';
import { plain, widthOf } from '../overlay/mark';

export type LabelForm = 'line' | 'pair' | 'dense';

/** px. Two names stand under one another; so do length and word. */
export const LABEL_HEIGHT: Readonly<Record<LabelForm, number>> = { line: 26, pair: 37, dense: 18 };

/** Sizes as the style sheet sets them, px. */
const NAME = 13;
const WORD = 12;
const LENGTH = 17;
/** Mark, gaps and padding around the words, and a little that measuring may be off by. */
const AROUND = 54;
/** The arrow of what is deeper than the rule. */
const DEEPER = 18;

/** No rule reaches farther below zero, mm; 1 1/2 in is a little less. */
const DEEPEST = 38;

/** Width of a length as the kit sets it: a real fraction in smaller figures. */
function lengthWidth({ sign, whole, numerator, denominator, unit }: LengthParts): number {
  const figure = LENGTH * 0.62;
  const fraction =
    numerator === 0
      ? 0
      : widthOf(plain(`${numerator}${denominator}`), figure, 600) + widthOf(plain('\u2044'), figure * 1.45, 400) - 2;
  const ofUnit = unit === 'mm' ? widthOf(plain(' mm'), LENGTH * 0.75, 400) : widthOf(plain('"'), LENGTH, 700);
  return widthOf(plain(`${sign}${whole}`), LENGTH, 700) + fraction + ofUnit;
}

/** @param width px that the label has */
export function labelForm(names: string, finding: Finding, display: LengthDisplay, width: number): LabelForm {
  const { word, parts } = readingOf(finding, display);
  const said = widthOf(plain(word === '' ? finding.verdict : word), WORD, 600);
  const length = parts === null ? 0 : lengthWidth(parts);
  const arrow = heightOf(finding) < -DEEPEST ? DEEPER : 0;
  return widthOf(plain(names), NAME, 600) + said + length + AROUND + arrow <= width ? 'line' : 'pair';
}
