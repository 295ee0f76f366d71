// A path: how one side moves, as rigid displacements of the world. A path has steps of equal share of its position 0 to 1;
// each is a swing about a fixed line or a slide along a fixed direction, at an even rate.
import { composeRigid, identityRigid, rigidFromSlide, rigidFromSwing, sinCosDegrees, radiansOf } from '#shared/units';
import type { Rigid } from '#shared/units';

export type Triple = readonly [number, number, number];

/** World frame, mm and degrees; `axis` and `along` are unit vectors. `from` is 0 but for the first step. */
export type PathStep =
  | {
      readonly kind: 'swing';
      readonly point: Triple;
      readonly axis: Triple;
      readonly from: number;
      readonly to: number;
    }
  | { readonly kind: 'slide'; readonly along: Triple; readonly from: number; readonly to: number };

export interface Path {
  readonly steps: readonly PathStep[];
  /** Displacement at the end of each step before it: befores[0] is the identity. */
  readonly befores: readonly Rigid[];
}

function displacement(step: PathStep, value: number): Rigid {
  return step.kind === 'swing' ? rigidFromSwing(step.point, step.axis, value) : rigidFromSlide(step.along, value);
}

/** A path from its steps. */
export function pathOf(steps: readonly PathStep[]): Path {
  const befores: Rigid[] = [];
  let before = identityRigid();
  for (const step of steps) {
    befores.push(before);
    before = composeRigid(displacement(step, step.to), before);
  }
  return { steps, befores };
}

/** The path that stays where it is. */
export const STILL: Path = pathOf([]);

function valueAt(step: PathStep, share: number): number {
  return share === 1 ? step.to : step.from + share * (step.to - step.from);
}

/** Displacement of the world at a position 0 to 1. */
export function displacementAt(path: Path, position: number): Rigid {
  const n = path.steps.length;
  if (n === 0) return identityRigid();
  const index = Math.min(n - 1, Math.max(0, Math.floor(position * n)));
  const step = path.steps[index]!;
  return composeRigid(displacement(step, valueAt(step, position * n - index)), path.befores[index]!);
}

/**
 * A stretch of one step of a path, seen from its middle: everything that the bounds need, worked out once.
 * Within it a point x (placed as in the middle) goes to x turned about the axis by at most ±h, or slid by at most ±s.
 */
export interface Stretch {
  readonly path: Path;
  readonly step: number;
  /** Positions on the whole path, 0 to 1. */
  readonly from: number;
  readonly to: number;
  readonly middle: number;
  /** Displacement of the world in the middle. */
  readonly at: Rigid;
  readonly kind: 'still' | 'swing' | 'slide';
  /** Swing: a point of the axis and its unit vector. Slide: `axis` is the direction. */
  readonly point: Triple;
  readonly axis: Triple;
  /** Swing: sine and cosine of the half angle, chord of the half angle at unit radius, 1 - cos h. */
  readonly sin: number;
  readonly cos: number;
  readonly chord: number;
  readonly bump: number;
  /** Slide: half the length, mm. */
  readonly half: number;
  halves: readonly [Stretch, Stretch] | null;
  /** Its place in the list of the search it belongs to; -1 before. */
  number: number;
  /** World poses of the side's solids in the middle, filled as needed. */
  readonly poses: (Rigid | undefined)[];
  readonly inverses: (Rigid | undefined)[];
}

const ORIGIN: Triple = [0, 0, 0];
const REST = identityRigid();

/** The stretch of step `step` between two positions of the path. Written out in one literal: a search makes many thousands. */
function stretchOf(path: Path, step: number, from: number, to: number): Stretch {
  const middle = from + (to - from) / 2;
  const s = path.steps[step];
  let at: Rigid = REST;
  let sin = 0;
  let cos = 1;
  let chord = 0;
  let bump = 0;
  let slide = 0;
  if (s !== undefined) {
    const n = path.steps.length;
    at = displacement(s, valueAt(s, middle * n - step));
    if (step > 0) at = composeRigid(at, path.befores[step]!);
    // the part of the step's whole travel that lies on either side of the middle
    const half = Math.abs(s.to - s.from) * n * Math.max(to - middle, middle - from);
    if (s.kind === 'slide') slide = half;
    else if (half >= 180) [cos, chord, bump] = [-1, 2, 2];
    else if (half > 0) {
      [sin, cos] = sinCosDegrees(half);
      const [halfSin] = sinCosDegrees(half / 2);
      // never less than the true chord; a small angle's chord is at most its arc
      chord = 2 * halfSin;
      bump = 2 * halfSin * halfSin;
    }
  }
  return {
    path,
    step,
    from,
    to,
    middle,
    at,
    kind: s === undefined ? 'still' : s.kind,
    point: s?.kind === 'swing' ? s.point : ORIGIN,
    axis: s === undefined ? ORIGIN : s.kind === 'swing' ? s.axis : s.along,
    sin,
    cos,
    chord,
    bump,
    half: slide,
    halves: null,
    number: -1,
    poses: [],
    inverses: [],
  };
}

/** The stretches that cover the positions `from` to `to` of a path, one for each step they touch. */
export function stretchesOf(path: Path, from = 0, to = 1): Stretch[] {
  const n = path.steps.length;
  if (n === 0) return [stretchOf(path, 0, from, to)];
  const stretches: Stretch[] = [];
  for (let step = 0; step < n; step += 1) {
    const a = Math.max(from, step / n);
    const b = Math.min(to, (step + 1) / n);
    if (a < b || (a === b && stretches.length === 0 && (b < (step + 1) / n || step === n - 1))) {
      stretches.push(stretchOf(path, step, a, b));
    }
  }
  return stretches;
}

/** Both halves of a stretch; made once and kept. */
export function halve(s: Stretch): readonly [Stretch, Stretch] {
  s.halves ??= [stretchOf(s.path, s.step, s.from, s.middle), stretchOf(s.path, s.step, s.middle, s.to)];
  return s.halves;
}

/** True if the stretch is too short to be halved any further in floating point. */
export function isPoint(s: Stretch): boolean {
  return s.kind === 'still' || s.middle <= s.from || s.middle >= s.to;
}

/** Travel in mm of a point at `radius` from the axis of a swing over a whole step, or of a slide. */
export function stepTravel(step: PathStep, radius: number): number {
  const span = Math.abs(step.to - step.from);
  return step.kind === 'swing' ? radius * radiansOf(span) : span;
}
