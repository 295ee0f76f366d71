// Arcs to turn by: a quarter of a protractor about each axis of the car, on the side that faces the eye.
import { formatAngle } from '#shared/units';
import { useBench } from '../bench-model';
import { labelOf, turn } from '../edits';
import { plain, type Mark } from '../overlay/mark';
import { MarksSvg } from '../overlay/marks-svg';
import { TURN_STEP } from '../steps';
import { project, type Frame } from '../viewport/frame';
import { angleOn, onPlane, planeAxes, rayAt } from '../viewport/ray';
import { add, dot, scale, sub, unit, type Triple } from '../viewport/vectors';
import type { HandleProps } from './move-handles';
import { ReadingPlate } from './reading-plate';
import { useHandleDrag } from './use-handle-drag';

const AXES: readonly (readonly [Triple, string])[] = [
  [[1, 0, 0], 'lean'],
  [[0, 1, 0], 'tip'],
  [[0, 0, 1], 'plan'],
];
const RADIUS = 84;
/** A plane that is looked at along is no use: sine of some 12 degrees. */
const EDGE_ON = 0.2;
const FINE = 0.25;

interface TurnReading {
  readonly word: string;
  readonly degrees: number;
}

/** How far round the hand has gone since it took hold, the short way. */
const between = (from: number, to: number): number => ((to - from + 540) % 360) - 180;

export function TurnHandles({ frame, at, zero, moved }: HandleProps) {
  const { open } = useBench();
  const { reading, begin, move, drop, cancel } = useHandleDrag<TurnReading>();
  const foot = project(frame, at);
  if (foot === null) return null;
  const radius = RADIUS / foot.perMm;
  const toEye = unit(sub(frame.eye, at));
  return (
    <>
      {AXES.map(([axis, word]) => {
        if (Math.abs(dot(axis, toEye)) < EDGE_ON) return null;
        const axes = planeAxes(axis);
        const middle = arcMiddle(axes, toEye);
        const isHeld = reading?.word === word;
        return (
          <g
            key={word}
            className="handle"
            onPointerDown={(event) => {
              const { left, top } = event.currentTarget.ownerSVGElement!.getBoundingClientRect();
              const first = onPlane(rayAt(frame, event.clientX - left, event.clientY - top), at, axis);
              if (first === null) return;
              const from = angleOn(first, at, axes);
              begin(event, frame, labelOf('Turn', open.getState().scene, moved), (ray, mode) => {
                const p = onPlane(ray, at, axis);
                if (p === null) return null;
                const swept = between(from, angleOn(p, at, axes));
                const grid = mode === 'fine' ? FINE : TURN_STEP;
                const degrees = mode === 'free' ? swept : Math.round(swept / grid) * grid;
                return { change: (s) => turn(s, moved, zero, axis, degrees), reading: { word, degrees } };
              });
            }}
            onPointerMove={move}
            onPointerUp={drop}
            onPointerCancel={cancel}
          >
            <Arc frame={frame} at={at} axes={axes} radius={radius} middle={middle} word={word} isHeld={isHeld} />
          </g>
        );
      })}
      <circle cx={foot.x} cy={foot.y} r={4} className="handle-punch" />
      {reading !== null && (
        <ReadingPlate
          x={foot.x}
          y={foot.y + 34}
          runs={plain(
            `${reading.word} ${reading.degrees > 0 ? '+' : ''}${formatAngle(reading.degrees, { decimals: 2 })}`,
          )}
          frame={frame}
        />
      )}
    </>
  );
}

/** The quarter that lies nearest to the eye. */
function arcMiddle(axes: readonly [Triple, Triple], toEye: Triple): number {
  return (Math.atan2(dot(toEye, axes[1]), dot(toEye, axes[0])) * 180) / Math.PI;
}

interface ArcProps {
  readonly frame: Frame;
  readonly at: Triple;
  readonly axes: readonly [Triple, Triple];
  readonly radius: number;
  readonly middle: number;
  readonly word: string;
  readonly isHeld: boolean;
}

function Arc({ frame, at, axes, radius, middle, word, isHeld }: ArcProps) {
  const ink = isHeld ? 'laser' : 'chalk';
  const place = (degrees: number, r: number): [number, number] | null => {
    const a = (degrees * Math.PI) / 180;
    const p = project(frame, add(at, add(scale(axes[0], r * Math.cos(a)), scale(axes[1], r * Math.sin(a)))));
    return p === null ? null : [p.x, p.y];
  };
  const points: [number, number][] = [];
  for (let d = -45; d <= 45; d += 5) {
    const p = place(middle + d, radius);
    if (p !== null) points.push(p);
  }
  const ticks: Mark[] = [];
  for (let d = -45; d <= 45; d += 9) {
    const [a, b] = [place(middle + d, radius), place(middle + d, radius * (d % 45 === 0 ? 1.12 : 1.06))];
    if (a !== null && b !== null) ticks.push({ kind: 'line', points: [a, b], ink, width: 1.2 });
  }
  const label = place(middle, radius * 1.22);
  return (
    <>
      <polyline points={points.map((p) => p.join(',')).join(' ')} className="handle-hit" />
      <MarksSvg marks={[{ kind: 'line', points, ink, width: isHeld ? 2.4 : 1.7 }, ...ticks]} />
      {label !== null && (
        <text x={label[0]} y={label[1] + 4} textAnchor="middle" className="handle-word">
          {word}
        </text>
      )}
    </>
  );
}
