// The marks of verdicts over the scene: the same signs as on paper.
import type { Verdict } from '#shared/check';
import { VERDICT_STROKES } from '../../../lib/verdict-strokes';
import type { Mark } from './mark';

/** The glyph around x, y. @param scale 1: 16 px */
export function verdictGlyph(verdict: Verdict, x: number, y: number, scale = 1): Mark[] {
  return VERDICT_STROKES[verdict].map((stroke) => ({ kind: 'path', x, y, scale, ink: verdict, ...stroke }));
}
