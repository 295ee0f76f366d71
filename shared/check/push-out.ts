// How far, and which way, the first side must be moved to come free of the second. Every answer was tried: the gap at the
// end of it was measured and is at least `touch`. Directions come from the shapes (faces, axes, contact, centres) and are
// then turned a little at a time towards shorter ones.
import { roundingOf, shapeBox, STILL, type GapMeter, type Placed } from '#shared/geometry';
import { applyRigid, turnByRigid } from '#shared/units';
import type { Point } from './report';

export interface PushOut {
  readonly vector: Point;
  readonly length: number;
}

type Vector = readonly [number, number, number];

const dot = (a: Vector, b: Vector): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
const scaled = (a: Vector, k: number): Vector => [a[0] * k, a[1] * k, a[2] * k];
const minus = (a: Vector, b: Vector): Vector => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
const cross = (a: Vector, b: Vector): Vector => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];

function unit(a: Vector): Vector | null {
  const length = Math.sqrt(dot(a, a));
  return length > 1e-9 ? scaled(a, 1 / length) : null;
}

function centreOf(solid: Placed): Vector {
  const box = shapeBox(solid.shape);
  return applyRigid(solid.pose, [box[0]!, box[1]!, box[2]!]);
}

/** How far the solids reach along n, at most: by their boxes. */
function reachOf(solids: readonly Placed[], n: Vector): number {
  let most = -Infinity;
  for (const solid of solids) {
    const box = shapeBox(solid.shape);
    const m = solid.pose;
    let r = dot(centreOf(solid), n);
    for (let k = 0; k < 3; k += 1) r += box[3 + k]! * Math.abs(m[k]! * n[0] + m[4 + k]! * n[1] + m[8 + k]! * n[2]);
    most = Math.max(most, r);
  }
  return most;
}

/** Adds ±n unless a direction within about a degree of it is there already. */
function addBoth(list: Vector[], n: Vector | null): void {
  if (n === null) return;
  for (const d of [n, scaled(n, -1)]) if (!list.some((e) => dot(d, e) > 0.99985)) list.push(d);
}

/** Directions worth trying, from the shapes themselves. */
function directionsFor(a: readonly Placed[], b: readonly Placed[], contact: Vector | null): Vector[] {
  const list: Vector[] = [];
  if (contact !== null) addBoth(list, contact);
  for (const solid of [...a, ...b]) {
    if (list.length > 96) break;
    for (const axis of [
      [1, 0, 0],
      [0, 1, 0],
      [0, 0, 1],
    ] as const) {
      addBoth(list, turnByRigid(solid.pose, axis));
    }
  }
  for (const x of a) {
    for (const y of b) {
      if (list.length > 160) break;
      const offset = minus(centreOf(x), centreOf(y));
      addBoth(list, unit(offset));
      // across a cylinder's axis, away from the other's middle
      for (const c of [x, y]) {
        if (c.shape.kind !== 'cylinder') continue;
        const axis = turnByRigid(c.pose, [0, 0, 1]);
        addBoth(list, unit(minus(offset, scaled(axis, dot(offset, axis)))));
        addBoth(list, unit(cross(offset, axis)));
      }
    }
  }
  for (const axis of [
    [1, 0, 0],
    [0, 1, 0],
    [0, 0, 1],
  ] as const) {
    addBoth(list, axis);
  }
  return list;
}

/**
 * A verified push-out of solids `a` from solids `b`, both placed as they are.
 * @param touch the gap that must be there afterwards, mm
 * @param contact a direction to try first
 * @returns the shortest translation found; at worst past the far side of the other's box
 */
export function findPushOut(
  meter: GapMeter,
  a: readonly Placed[],
  b: readonly Placed[],
  touch: number,
  largest: number,
  contact: Vector | null = null,
): PushOut {
  const needed = touch + 2 * roundingOf(largest);
  const still = { solids: b, path: STILL };
  const isFree = (v: Vector): boolean => {
    const moved = a.map((solid) => {
      const pose = solid.pose.slice();
      pose[3] = pose[3]! + v[0];
      pose[7] = pose[7]! + v[1];
      pose[11] = pose[11]! + v[2];
      return { shape: solid.shape, pose };
    });
    const near = meter.measure(
      { solids: moved, path: STILL },
      still,
      (lower, upper) => upper < needed || lower >= needed,
      undefined,
      undefined,
      needed,
    );
    return near.lower >= needed;
  };
  let bestDirection: Vector = [1, 0, 0];
  let best = Infinity;
  /** Shortens the best along n, if n is any better. */
  const attempt = (n: Vector, knownFree: number): boolean => {
    let free = knownFree;
    if (!(free < best)) {
      // worth a closer look only if it is free a good deal earlier than the best
      free = best * 0.999 - touch / 4;
      if (!(free > 0) || !isFree(scaled(n, free))) return false;
    } else if (!isFree(scaled(n, free))) return false;
    let held = 0;
    const fine = Math.max(touch / 4, free * 1e-6);
    for (let i = 0; i < 60 && free - held > fine; i += 1) {
      const middle = held + (free - held) / 2;
      if (isFree(scaled(n, middle))) free = middle;
      else held = middle;
    }
    best = free;
    bestDirection = n;
    return true;
  };
  const candidates = directionsFor(a, b, contact)
    .map((n) => ({ n, past: reachOf(b, n) + reachOf(a, scaled(n, -1)) + 2 * needed }))
    .sort((x, y) => x.past - y.past);
  for (const { n, past } of candidates) attempt(n, past);
  refine(() => bestDirection, attempt);
  return { vector: scaled(bestDirection, best), length: best };
}

/** Turns the best direction by smaller and smaller angles as long as that shortens it. */
function refine(current: () => Vector, attempt: (n: Vector, knownFree: number) => boolean): void {
  for (const tilt of [0.5, 0.25, 0.12, 0.06, 0.03, 0.015]) {
    for (let round = 0; round < 4; round += 1) {
      const n = current();
      const u = unit(cross(n, Math.abs(n[0]) < 0.7 ? [1, 0, 0] : [0, 1, 0]))!;
      const v = cross(n, u);
      let better = false;
      for (const [p, q] of [
        [tilt, 0],
        [-tilt, 0],
        [0, tilt],
        [0, -tilt],
      ] as const) {
        const turned = unit([n[0] + p * u[0] + q * v[0], n[1] + p * u[1] + q * v[1], n[2] + p * u[2] + q * v[2]])!;
        if (attempt(turned, Infinity)) better = true;
      }
      if (!better) break;
    }
  }
}
