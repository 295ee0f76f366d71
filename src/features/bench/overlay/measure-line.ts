// A dimension from a datum to the part's zero point, straight along the car, across it, or up: what a row of the tape says.
import { lengthParts, type LengthDisplay } from '#shared/units';
import { SIDES, datumCoordinate, readingFrom, type Axis, type Datum } from '../tape/datums';
import { project, type Frame } from '../viewport/frame';
import type { Triple } from '../viewport/vectors';
import { lengthRuns, plain, widthOf, type Mark } from './mark';

const TICK = 7;

export interface MeasureOptions {
  readonly display: LengthDisplay;
  /** Without its words, where a handle says them already. */
  readonly isBare: boolean;
}

export function measureLine(
  frame: Frame,
  datum: Datum,
  axis: Axis,
  at: Triple,
  { display, isBare }: MeasureOptions,
): Mark[] {
  const foot = at.map((x, k) => (k === axis ? datumCoordinate(datum, axis, at) : x)) as unknown as Triple;
  const a = project(frame, foot);
  const b = project(frame, at);
  if (a === null || b === null) return [];
  const reading = readingFrom(datum, axis, at);
  const isOn = Math.abs(reading) < 0.005;
  const words = `${isOn ? 'on' : SIDES[axis]![reading > 0 ? 0 : 1]} ${datum.name}`;
  const runs = [
    ...(isOn ? [] : [...lengthRuns(lengthParts(Math.abs(reading), display, { denominator: 64 })), ...plain('\u2002')]),
    ...plain(words),
  ];
  const [dx, dy] = [b.x - a.x, b.y - a.y];
  const size = Math.hypot(dx, dy);
  const [ux, uy] = size < 1 ? [1, 0] : [dx / size, dy / size];
  const tick = (p: { x: number; y: number }): Mark => ({
    kind: 'line',
    points: [
      [p.x - uy * TICK, p.y + ux * TICK],
      [p.x + uy * TICK, p.y - ux * TICK],
    ],
    ink: 'laser',
    width: 1.6,
  });
  const width = widthOf(runs, 13, 600) + 16;
  const x = Math.max(8, Math.min(frame.width - width - 8, (a.x + b.x) / 2 - width / 2));
  const y = Math.max(8, Math.min(frame.height - 32, (a.y + b.y) / 2 + (Math.abs(uy) > 0.7 ? 12 : 14)));
  const line: Mark[] = [
    {
      kind: 'line',
      points: [
        [a.x, a.y],
        [b.x, b.y],
      ],
      ink: 'laser',
      width: 1.6,
    },
    tick(a),
    tick(b),
  ];
  if (isBare) return line;
  return [
    ...line,
    { kind: 'plate', x, y, width, height: 24, ink: 'laser' },
    { kind: 'text', x: x + 8, y: y + 16.5, runs, size: 13, weight: 600, ink: 'scribe' },
  ];
}
