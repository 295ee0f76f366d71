// The gap between two sides over ranges of their paths: the least distance of their surfaces, or nothing where one lies
// inside the other.
import { composeRigid } from '#shared/units';
import { containedPoint } from './contain';
import { displacementAt } from './path';
import type { Triple } from './path';
import { Searcher } from './search';
import type { Nearest, Range, Settled, Side } from './search';

export interface Gap extends Nearest {
  /** True if a part lies wholly inside another at `positions`, and so all along: their surfaces never meet. */
  readonly contained: boolean;
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
  const moveA = displacementAt(A.path, positions[0]);
  const moveB = displacementAt(B.path, positions[1]);
  for (const [i, a] of A.solids.entries()) {
    for (const [j, b] of B.solids.entries()) {
      const point: Triple | null = containedPoint(a, composeRigid(moveA, a.pose), b, composeRigid(moveB, b.pose));
      if (point !== null) return { points: [point, point], solids: [i, j] };
    }
  }
  return null;
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
    if (inside === null) return { ...near, contained: false };
    return { upper: 0, lower: 0, positions, ...inside, contained: true };
  }
}

/** Contact, as one point of both. */
function touching(near: Nearest, point: Triple): Gap {
  return { ...near, upper: 0, lower: 0, points: [point, point], contained: false };
}
