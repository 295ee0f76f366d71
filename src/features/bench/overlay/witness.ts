// Witness marks: where a finding is closest, with the line between the two points, its reading, mark and word.
import type { Finding } from '#shared/check';
import type { LengthDisplay } from '#shared/units';
import { readingOf } from '../../../lib/finding-words';
import { project, type Frame } from '../viewport/frame';
import { lengthRuns, plain, widthOf, type Mark, type TextRun } from './mark';
import { placeLabels, type Rect, type Room } from './place-labels';
import { verdictGlyph } from './verdict-glyph';

export interface WitnessInput {
  readonly finding: Finding;
  /** Drawn larger, with its word, and before all others. */
  readonly isOpen: boolean;
  /** Its mark alone: labels of all would hide what they are about. */
  readonly isQuiet?: boolean;
}

interface Drawn extends WitnessInput {
  readonly a: readonly [number, number];
  readonly b: readonly [number, number];
  readonly middle: readonly [number, number];
  readonly runs: readonly TextRun[];
  readonly size: number;
  readonly width: number;
}

const PAD = 8;
const GLYPH = 16;
const GAP = 6;

function labelRuns(finding: Finding, display: LengthDisplay): TextRun[] {
  const { word, parts } = readingOf(finding, display);
  const said = word === '' ? [] : plain(parts === null ? word : `${word}\u00a0`);
  const length = parts === null ? [] : lengthRuns(parts);
  // the word of the verdict, unless the reading says it already
  const verdict = finding.verdict === 'hits' ? [] : plain(`\u00a0\u00a0${finding.verdict}`);
  return [...said, ...length, ...verdict];
}

function read(frame: Frame, input: WitnessInput, display: LengthDisplay): Drawn[] {
  const [p, q] = input.finding.at.points;
  const a = project(frame, p);
  const b = project(frame, q);
  if (a === null || b === null) return [];
  const middle = [(a.x + b.x) / 2, (a.y + b.y) / 2] as const;
  if (middle[0] < -40 || middle[1] < -40 || middle[0] > frame.width + 40 || middle[1] > frame.height + 40) return [];
  const runs = labelRuns(input.finding, display);
  const size = input.isOpen ? 15 : 13;
  const width = widthOf(runs, size, 600) + GLYPH * (size / 13) + GAP + 2 * PAD;
  return [{ ...input, a: [a.x, a.y], b: [b.x, b.y], middle, runs, size, width }];
}

/** Two ticks across the ends of the line between the points, and the line; longer than the gap where that is too small. */
function dimension({ a, b, finding, isOpen }: Drawn): Mark[] {
  const dx = b[0] - a[0];
  const dy = b[1] - a[1];
  const size = Math.hypot(dx, dy);
  const along = size < 0.5 ? ([1, 0] as const) : ([dx / size, dy / size] as const);
  const across = [-along[1], along[0]] as const;
  const tick = isOpen ? 10 : 7;
  const width = isOpen ? 2.4 : 1.8;
  const ends = [a, b].map((p) => ({
    kind: 'line' as const,
    points: [
      [p[0] - across[0] * tick, p[1] - across[1] * tick],
      [p[0] + across[0] * tick, p[1] + across[1] * tick],
    ] as const,
    ink: finding.verdict,
    width,
  }));
  const outside = 12;
  const line = (points: readonly (readonly [number, number])[]): Mark => ({
    kind: 'line',
    points,
    ink: finding.verdict,
    width,
  });
  // too near for a line between: two from outside, as on a drawing
  if (size < 12) {
    return [
      ...ends,
      line([[a[0] - along[0] * outside, a[1] - along[1] * outside], a]),
      line([b, [b[0] + along[0] * outside, b[1] + along[1] * outside]]),
    ];
  }
  return [...ends, line([a, b])];
}

function figure(drawn: Drawn): Mark[] {
  const { finding, middle, isOpen } = drawn;
  if (finding.verdict === 'hits') return verdictGlyph('hits', middle[0], middle[1], isOpen ? 1.9 : 1.35);
  return dimension(drawn);
}

function label(drawn: Drawn, x: number, y: number, height: number): Mark[] {
  const { finding, size, width, runs, middle, isOpen } = drawn;
  const k = size / 13;
  const inside = middle[0] >= x && middle[0] <= x + width && middle[1] >= y && middle[1] <= y + height;
  const foot = Math.max(x, Math.min(middle[0], x + width));
  const edge = middle[1] < y ? y : middle[1] > y + height ? y + height : y + height / 2;
  const leader: Mark[] = inside
    ? []
    : [{ kind: 'line', points: [middle, [foot, edge]], ink: finding.verdict, width: 1, opacity: 0.85 }];
  return [
    ...leader,
    { kind: 'plate', x, y, width, height, ink: finding.verdict, opacity: isOpen ? 1 : 0.94 },
    ...verdictGlyph(finding.verdict, x + PAD + (GLYPH * k) / 2, y + height / 2, 0.8 * k),
    {
      kind: 'text',
      x: x + PAD + GLYPH * k + GAP,
      y: y + height / 2 + size * 0.35,
      runs,
      size,
      weight: 600,
      ink: finding.verdict,
    },
  ];
}

/** Marks of some findings, the open one over all others; labels find room where they cover neither one another nor a mark. */
export function witnessMarks(
  frame: Frame,
  inputs: readonly WitnessInput[],
  display: LengthDisplay,
  room: Room,
  blocked: readonly Rect[] = [],
): Mark[] {
  const ordered = [...inputs].sort((x, y) => Number(y.isOpen) - Number(x.isOpen));
  const drawn = ordered.flatMap((input) => read(frame, input, display));
  const told = drawn.filter((d) => d.isQuiet !== true);
  const places = placeLabels(
    told.map((d) => ({ anchor: d.middle, width: d.width, height: d.size + 12 })),
    room,
    blocked,
  );
  const labels = told.map((d, i) => label(d, places[i]!.x, places[i]!.y, d.size + 12));
  return [...drawn.map(figure).reverse().flat(), ...labels.reverse().flat()];
}
