// The scale bar of square-on looks: a round length, ruled like a steel scale.
import { MM_PER_INCH, type LengthDisplay } from '#shared/units';
import { plain, widthOf, type Mark } from './mark';

const ROUND_IN = [0.25, 0.5, 1, 2, 3, 6, 12, 24, 48] as const;
const ROUND_MM = [5, 10, 20, 50, 100, 200, 500, 1000, 2000] as const;

/** The longest round length that is at most `most` CSS px long. */
export function scaleLength(
  millimetresPerPixel: number,
  display: LengthDisplay,
  most: number,
): { readonly mm: number; readonly label: string; readonly parts: number } {
  const isMm = display === 'mm';
  const unit = isMm ? 1 : MM_PER_INCH;
  const rounds: readonly number[] = isMm ? ROUND_MM : ROUND_IN;
  const fitting = rounds.filter((n) => (n * unit) / millimetresPerPixel <= most);
  const n = fitting.at(-1) ?? rounds[0]!;
  const fraction = n === 0.25 ? '1/4' : n === 0.5 ? '1/2' : String(n);
  return { mm: n * unit, label: isMm ? `${n} mm` : `${fraction} in`, parts: isMm ? 5 : n % 3 === 0 ? 6 : 4 };
}

/** @param x, y left end of the bar's foot */
export function scaleBar(millimetresPerPixel: number, display: LengthDisplay, x: number, y: number): Mark[] {
  const { mm, label, parts } = scaleLength(millimetresPerPixel, display, 200);
  const width = mm / millimetresPerPixel;
  const ticks = Array.from({ length: parts + 1 }, (_, i): Mark => {
    const at = x + (width * i) / parts;
    const height = i === 0 || i === parts ? 11 : 6;
    return {
      kind: 'line',
      points: [
        [at, y],
        [at, y - height],
      ],
      ink: 'scribe',
      width: 1.4,
    };
  });
  const runs = plain(label);
  return [
    {
      kind: 'line',
      points: [
        [x, y],
        [x + width, y],
      ],
      ink: 'scribe',
      width: 1.4,
    },
    ...ticks,
    {
      kind: 'text',
      x: x + width - widthOf(runs, 12, 600),
      y: y - 16,
      runs,
      size: 12,
      weight: 600,
      ink: 'scribe',
    },
  ];
}
