// The stretches of one motion in which the gap is below a limit. A stretch is searched as a whole: proven clear, or proven
// to overlap all along, it is done; otherwise it is halved until what is left is shorter than the accuracy of travel. So no
// hit hides between samples, and the ends are good to the accuracy.
import {
  displacementAt,
  roundingOf,
  stepTravel,
  type GapMeter,
  type Path,
  type Placed,
  type Side as MovingSide,
} from '#shared/geometry';
import { shapeBox } from '#shared/geometry';
import { applyRigid, composeRigid } from '#shared/units';
import { overlapAtLeast } from './deep';
import { gapOver, march, type MarchGround } from './march';
import type { Span } from './report';

/** Stretches of this share of the accuracy are not divided any more. */
const LEAF = 0.9;
/** Stretches of at most so many such shares are walked along rather than halved. */
const MARCH = 4096;

export interface SpanQuestion {
  readonly meter: GapMeter;
  readonly a: MovingSide;
  readonly b: MovingSide;
  /** Which of the two moves. */
  readonly moving: 'a' | 'b';
  /** Gaps below this count, mm. */
  readonly limit: number;
  /** A gap may be called clear from limit - slack on, mm. */
  readonly slack: number;
  /** mm of travel of the fastest moving point. */
  readonly accuracy: number;
  readonly largest: number;
}

/** Farthest that any point of the solids lies from the axis of a swing, at most, mm. */
function largestRadius(solids: readonly Placed[], path: Path, step: number): number {
  const s = path.steps[step]!;
  if (s.kind === 'slide') return 0;
  const before = path.befores[step]!;
  let most = 0;
  for (const solid of solids) {
    const pose = composeRigid(before, solid.pose);
    const box = shapeBox(solid.shape);
    for (let k = 0; k < 8; k += 1) {
      const p = applyRigid(pose, [
        box[0]! + (k & 1 ? box[3]! : -box[3]!),
        box[1]! + (k & 2 ? box[4]! : -box[4]!),
        box[2]! + (k & 4 ? box[5]! : -box[5]!),
      ]);
      const d = [p[0] - s.point[0], p[1] - s.point[1], p[2] - s.point[2]] as const;
      const along = d[0] * s.axis[0] + d[1] * s.axis[1] + d[2] * s.axis[2];
      most = Math.max(most, d[0] * d[0] + d[1] * d[1] + d[2] * d[2] - along * along);
    }
  }
  return Math.sqrt(most);
}

/** Travel of the fastest point, mm, over each step of the moving side's path. */
export function stepTravels(side: MovingSide): number[] {
  return side.path.steps.map((step, i) => stepTravel(step, largestRadius(side.solids, side.path, i)));
}

/** Adds a stretch, joining it to the one before if less than the accuracy of travel lies between. */
function addSpan(
  spans: [number, number][],
  from: number,
  to: number,
  travelBetween: (a: number, b: number) => number,
  accuracy: number,
): void {
  const last = spans.at(-1);
  if (last !== undefined && travelBetween(last[1], from) <= accuracy) last[1] = Math.max(last[1], to);
  else spans.push([from, to]);
}

/** The stretches below the limit, in order; a lone one shorter than the accuracy as [p, p]. */
export function spansBelow(q: SpanQuestion): Span[] {
  const side = q.moving === 'a' ? q.a : q.b;
  const travels = stepTravels(side);
  const n = travels.length;
  const travelBetween = (from: number, to: number): number => {
    let sum = 0;
    for (const [i, travel] of travels.entries()) {
      const a = Math.max(from, i / n);
      const b = Math.min(to, (i + 1) / n);
      if (b > a) sum += travel * (b - a) * n;
    }
    return sum;
  };
  const { meter, a, b, moving } = q;
  // in the middle of what may go either way: parts that keep exactly the limit all along are clear of it, not here and there
  const limit = q.limit - q.slack / 2;
  const ground: MarchGround = { meter, a, b, moving, limit, clearFrom: q.limit - q.slack + roundingOf(q.largest) };
  const rest = { from: 0, to: 1 };
  const other = q.moving === 'a' ? q.b : q.a;
  /** Whether the gap in the middle, or the depth of an overlap there, outlasts all that moves on the way to either end. */
  const isBelowAllAlong = (middle: number, reaches: number): boolean => {
    const spare = limit - reaches;
    if (spare > 0) {
      const here = { from: middle, to: middle };
      const near = q.meter.measure(
        q.a,
        q.b,
        (lower, upper) => upper < spare || lower >= spare,
        q.moving === 'a' ? here : rest,
        q.moving === 'b' ? here : rest,
        spare,
      );
      return near.upper < spare;
    }
    const move = displacementAt(side.path, middle);
    const placed = side.solids.map((s) => ({ shape: s.shape, pose: composeRigid(move, s.pose) }));
    return overlapAtLeast(placed, other.solids, -spare) > -spare;
  };
  const spans: [number, number][] = [];
  const lone: number[] = [];

  const take = (from: number, to: number, position: number): void => {
    const before = spans.length;
    addSpan(spans, from, to, travelBetween, q.accuracy);
    if (spans.length > before) lone.push(position);
  };
  const visit = (from: number, to: number): void => {
    const middle = from + (to - from) / 2;
    const near = gapOver(ground, { from, to });
    if (near.upper >= limit) return;
    const travel = travelBetween(from, to);
    const position = near.positions[q.moving === 'a' ? 0 : 1];
    const reaches = Math.max(travelBetween(from, middle), travelBetween(middle, to));
    if (near.containedThroughout || isBelowAllAlong(middle, reaches)) {
      take(from, to, position);
      return;
    }
    const paces = Math.ceil(travel / (LEAF * q.accuracy));
    if (paces <= 1 || middle <= from || middle >= to) {
      take(from, to, position);
      return;
    }
    if (paces > MARCH) {
      visit(from, middle);
      visit(middle, to);
      return;
    }
    // from the hit outward to where it ends on either side; what lies beyond is another matter
    const pace = (to - from) / paces;
    const pacesDown = Math.ceil((position - from) / pace);
    const pacesUp = Math.ceil((to - position) / pace);
    const down = march(ground, position, from, pacesDown, near.witness);
    const up = march(ground, position, to, pacesUp, near.witness);
    if (down + 1 < pacesDown) visit(from, position - ((down + 1) / pacesDown) * (position - from));
    take(
      down === pacesDown ? from : position - (down / pacesDown) * (position - from),
      up === pacesUp ? to : position + (up / pacesUp) * (to - position),
      position,
    );
    if (up + 1 < pacesUp) visit(position + ((up + 1) / pacesUp) * (to - position), to);
  };
  for (let step = 0; step < n; step += 1) visit(step / n, (step + 1) / n);
  return spans.map(([from, to], i): Span => {
    const p = lone[i]!;
    return travelBetween(from, to) < q.accuracy ? [p, p] : [from, to];
  });
}
