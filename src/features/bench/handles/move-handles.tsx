// Arrows to move by: a scribed line with the ticks of a scale and a scriber's point, one for each axis of the car.
import { lengthParts } from '#shared/units';
import { useBench, useFacts, useOpen, useSession } from '../bench-model';
import { labelOf, shift, type Moved } from '../edits';
import { lengthRuns, plain, type Mark, type TextRun } from '../overlay/mark';
import { MarksSvg } from '../overlay/marks-svg';
import { stepFor } from '../steps';
import { datumFor, readingFrom, SIDES, type Axis } from '../tape/datums';
import { sceneBox } from '../viewport/extent';
import { project, type Frame, type Projected } from '../viewport/frame';
import { alongAxis, rayAt } from '../viewport/ray';
import { add, scale, type Triple } from '../viewport/vectors';
import { catchesAlong, snapTravel } from './catches';
import { ReadingPlate } from './reading-plate';
import { useHandleDrag } from './use-handle-drag';

export interface HandleProps {
  readonly frame: Frame;
  /** Where the handles stand. */
  readonly at: Triple;
  /** The zero point that is measured. */
  readonly zero: Triple;
  readonly moved: Moved;
  readonly moving: ReadonlySet<string>;
}

const AXES: readonly (readonly [Axis, Triple, string])[] = [
  [0, [1, 0, 0], 'rear'],
  [1, [0, 1, 0], 'right'],
  [2, [0, 0, 1], 'up'],
];

/** Length of an arrow on the screen, px, and how short it may come out before it is left away. */
const LENGTH = 92;
const SHORTEST = 20;
/** How near a catch holds, px. */
const REACH = 7;

interface MoveReading {
  readonly axis: Axis;
  readonly runs: readonly TextRun[];
}

export function MoveHandles({ frame, at, zero, moved, moving }: HandleProps) {
  const { open, meshes } = useBench();
  const { display } = useFacts();
  const committed = useOpen((o) => o.scene);
  const step = stepFor(
    display,
    useSession((s) => s.step),
  );
  const datums = useSession((s) => s.datums);
  const set = useSession((s) => s.set);
  const { reading, begin, move, drop, cancel } = useHandleDrag<MoveReading>();
  const foot = project(frame, at);
  if (foot === null) return null;

  const start = (axis: Axis, direction: Triple, grip: number): Parameters<typeof begin>[3] => {
    const box = sceneBox(committed, meshes, moving);
    const catches = catchesAlong(committed, meshes, axis, zero, box, moving);
    const datum = datumFor(committed, axis, datums[axis]);
    const from = readingFrom(datum, axis, zero);
    return (ray, mode) => {
      const t = alongAxis(ray, at, direction);
      if (t === null) return null;
      const reach = REACH / foot.perMm;
      const { travel, words } = snapTravel(t - grip, from, catches, { mode, step, reach });
      const now = from + travel;
      const parts = lengthParts(Math.abs(now), display, { denominator: 64 });
      const side = SIDES[axis]![now >= 0 ? 0 : 1];
      const runs = words === null ? [...lengthRuns(parts), ...plain(`\u2002${side} ${datum.name}`)] : plain(words);
      return { change: (scene) => shift(scene, moved, scale(direction, travel)), reading: { axis, runs } };
    };
  };

  return (
    <>
      {AXES.map(([axis, direction, word]) => {
        const arrow = arrowOf(frame, at, foot, direction);
        if (arrow === null) return null;
        const isHeld = reading?.axis === axis;
        return (
          <g
            key={axis}
            className="handle"
            data-held={isHeld || undefined}
            onPointerDown={(event) => {
              const { left, top } = event.currentTarget.ownerSVGElement!.getBoundingClientRect();
              const grip = gripAlong(frame, event.clientX - left, event.clientY - top, at, direction);
              set({ measuredAxis: axis });
              begin(event, frame, labelOf('Move', open.getState().scene, moved), start(axis, direction, grip));
            }}
            onPointerMove={move}
            onPointerUp={() => {
              set({ measuredAxis: null });
              drop();
            }}
            onPointerCancel={cancel}
          >
            <Arrow arrow={arrow} word={word} isHeld={isHeld} />
          </g>
        );
      })}
      <circle cx={foot.x} cy={foot.y} r={4} className="handle-punch" />
      {reading !== null && <ReadingPlate x={foot.x} y={foot.y + 34} runs={reading.runs} frame={frame} />}
    </>
  );
}

interface ArrowShape {
  readonly foot: Projected;
  readonly tip: Projected;
  /** Unit vector on the screen. */
  readonly u: readonly [number, number];
  readonly length: number;
}

function arrowOf(frame: Frame, at: Triple, foot: Projected, direction: Triple): ArrowShape | null {
  const tip = project(frame, add(at, scale(direction, LENGTH / foot.perMm)));
  if (tip === null) return null;
  const [dx, dy] = [tip.x - foot.x, tip.y - foot.y];
  const length = Math.hypot(dx, dy);
  return length < SHORTEST ? null : { foot, tip, u: [dx / length, dy / length], length };
}

function gripAlong(frame: Frame, x: number, y: number, at: Triple, direction: Triple): number {
  return alongAxis(rayAt(frame, x, y), at, direction) ?? 0;
}

function Arrow({ arrow, word, isHeld }: { arrow: ArrowShape; word: string; isHeld: boolean }) {
  const { foot, tip, u, length } = arrow;
  const [ux, uy] = u;
  const ink = isHeld ? 'laser' : 'chalk';
  const at = (along: number, across: number): [number, number] => [
    foot.x + ux * along - uy * across,
    foot.y + uy * along + ux * across,
  ];
  const ticks = [0.28, 0.4, 0.52, 0.64, 0.76].map((share, i): Mark => ({
    kind: 'line',
    points: [at(length * share, 0), at(length * share, i % 2 === 0 ? 5 : 8)],
    ink,
    width: 1.2,
  }));
  // a scriber's point: slender, ground on one side
  const point = [at(length, 0), at(length - 15, 5), at(length - 12, 0)];
  const marks: Mark[] = [
    { kind: 'line', points: [at(9, 0), at(length - 11, 0)], ink, width: isHeld ? 2.4 : 1.7 },
    ...ticks,
    {
      kind: 'path',
      d: `M${point.map((p) => p.map((x) => x.toFixed(1)).join(' ')).join('L')}Z`,
      x: 0,
      y: 0,
      ink,
      width: 0,
      filled: true,
    },
  ];
  const label = at(length + 14, 0);
  return (
    <>
      <line x1={at(12, 0)[0]} y1={at(12, 0)[1]} x2={tip.x} y2={tip.y} className="handle-hit" />
      <MarksSvg marks={marks} />
      <text x={label[0]} y={label[1] + 4} textAnchor="middle" className="handle-word">
        {word}
      </text>
    </>
  );
}
