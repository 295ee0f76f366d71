// What is drawn over the scene, as plain figures in CSS px: one list, set in SVG on the screen and painted on a canvas in a
// picture, so that both show the same.
import type { TextRun } from '../../../lib/text-runs';

export { lengthRuns, plain, type TextRun } from '../../../lib/text-runs';

export type Ink =
  'hits' | 'tight' | 'loose' | 'seated' | 'clears' | 'laser' | 'scribe' | 'scribe-soft' | 'chalk' | 'dye-deep';

export type Mark =
  | {
      readonly kind: 'line';
      readonly points: readonly (readonly [number, number])[];
      readonly ink: Ink;
      readonly width: number;
      readonly dash?: readonly number[];
      readonly opacity?: number;
    }
  /** An SVG path, its own origin put at x, y. */
  | {
      readonly kind: 'path';
      readonly d: string;
      readonly x: number;
      readonly y: number;
      readonly scale?: number;
      readonly ink: Ink;
      readonly width: number;
      readonly filled?: boolean;
      readonly opacity?: number;
      readonly round?: boolean;
    }
  | {
      readonly kind: 'plate';
      readonly x: number;
      readonly y: number;
      readonly width: number;
      readonly height: number;
      readonly ink: Ink;
      readonly opacity?: number;
    }
  | {
      readonly kind: 'text';
      readonly x: number;
      /** Baseline. */
      readonly y: number;
      readonly runs: readonly TextRun[];
      readonly size: number;
      readonly weight: 400 | 600 | 700;
      readonly ink: Ink;
    };

let pen: CanvasRenderingContext2D | null = null;
const widths = new Map<string, number>();

export const FONT = '"Exo 2", system-ui, sans-serif';

/** Width of a text in CSS px. */
export function widthOf(runs: readonly TextRun[], size: number, weight: number): number {
  pen ??= document.createElement('canvas').getContext('2d');
  return runs.reduce((sum, run) => {
    const font = `${weight} ${size * run.size}px ${FONT}`;
    const key = `${font}|${run.text}`;
    let width = widths.get(key);
    if (width === undefined) {
      if (pen !== null) pen.font = font;
      width = pen?.measureText(run.text).width ?? run.text.length * size * run.size * 0.55;
      // the font may still be on its way: what is measured before is not kept
      if (document.fonts.check(font)) widths.set(key, width);
    }
    return sum + width;
  }, 0);
}
