// The gap between two sides over ranges of their paths: the least distance of their surfaces, or nothing where one lies
// inside the other.
import { composeRigid, type Rigid } from '#shared/units';
import { containedPoint } from './contain';
import { displacementAt } from './path';
import type { Triple } from './path';
import { Searcher } from './search';
import type { Nearest, Range, Settled, Side, Witness } from './search';

export interface Gap extends Nearest {
  /** True if a part lies wholly inside another at `positions`. */
  readonly contained: boolean;
  /** True if it is so over the whole of the ranges. */
  readonly containedThroughout: boolean;
}

/** Distances below this are written as contact, mm. */
export const CONTACT = 1e-6;

/**
 * The rounding that a bound may carry, mm: coordinates of size c are off by a few units in the last place, and a chain of
 * placements and products by some dozens of those.
 */
export function roundingOf(largestCoordinate: number): number {
  return 1e-11 + largestCoordinate * 256 * 2.220446049250313e-16;
}

function findContained(A: Side, B: Side, positions: readonly [number, number]): Pick<Gap, 'points' | 'solids'> | null {
  // boxes and cylinders are compared as solids by the search itself
  const meshesOfA = A.solids.some((s) => s.shape.kind === 'mesh');
  if (!meshesOfA && !B.solids.some((s) => s.shape.kind === 'mesh')) return null;
  const posesA = posesAt(A, positions[0]);
  const posesB = posesAt(B, positions[1]);
  for (const [i, a] of A.solids.entries()) {
    for (const [j, b] of B.solids.entries()) {
      const point: Triple | null = containedPoint(a, posesA[i]!, b, posesB[j]!);
      if (point !== null) return { points: [point, point], solids: [i, j] };
    }
  }
  return null;
}

function posesAt({ solids, path }: Side, position: number): Rigid[] {
  if (path.steps.length === 0) return solids.map((s) => s.pose);
  const move = displacementAt(path, position);
  return solids.map((s) => composeRigid(move, s.pose));
}

/** Measures gaps; keep one and use it again. */
export class GapMeter {
  readonly searcher = new Searcher();

  /**
   * The gap of two sides over ranges of positions.
   * @param settled as for Searcher.nearest
   * @param limit as for Searcher.nearest
   */
  measure(A: Side, B: Side, settled: Settled, rangeA?: Range, rangeB?: Range, limit?: number): Gap {
    const near = this.searcher.nearest(A, B, settled, rangeA, rangeB, limit);
    if (near.upper <= CONTACT) return touching(near, near.points[0]);
    // Surfaces that stay apart keep their inside and outside: one position speaks for all of the range. Where they are not
    // proven apart the two are close to touching, and the position where they are closest is the one to ask about.
    const positions: readonly [number, number] =
      near.lower > 0 ? [rangeA?.from ?? 0, rangeB?.from ?? 0] : near.positions;
    const inside = findContained(A, B, positions);
    if (inside === null) return { ...near, contained: false, containedThroughout: false };
    const { witness } = near;
    return { upper: 0, lower: 0, positions, ...inside, witness, contained: true, containedThroughout: near.lower > 0 };
  }

  /** Distance of one pair of single shapes, as an earlier answer named it, at positions of the paths. */
  distanceOf(A: Side, B: Side, witness: Witness, positions: readonly [number, number]): number {
    return this.searcher.distanceOf(A, B, witness, positions);
  }
}

/** Contact, as one point of both. */
function touching(near: Nearest, point: Triple): Gap {
  return { ...near, upper: 0, lower: 0, points: [point, point], contained: false, containedThroughout: false };
}
