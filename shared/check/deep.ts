// How deep two bodies overlap, at least: the proof that a whole stretch of a motion hits. A point that lies u mm inside one
// body and v mm inside the other stays common to both, in some place, while neither is moved by more than u + v: the ball of
// radius u about it goes with its body, the ball of radius v stays, and the two still meet.
import { type Placed } from '#shared/geometry';

type Vector = [number, number, number];

/** How far inside the shape a world point lies, mm; negative outside. Boxes and cylinders only. */
function marginAt({ shape, pose: m }: Placed, [x, y, z]: Vector): number {
  const dx = x - m[3]!;
  const dy = y - m[7]!;
  const dz = z - m[11]!;
  const px = Math.abs(m[0]! * dx + m[4]! * dy + m[8]! * dz);
  const py = Math.abs(m[1]! * dx + m[5]! * dy + m[9]! * dz);
  const pz = Math.abs(m[2]! * dx + m[6]! * dy + m[10]! * dz);
  if (shape.kind === 'box') return Math.min(shape.half[0] - px, shape.half[1] - py, shape.half[2] - pz);
  if (shape.kind === 'cylinder') return Math.min(shape.radius - Math.sqrt(px * px + py * py), shape.half - pz);
  return -Infinity;
}

/** Half sizes of a box or cylinder in its own frame. */
function halves({ shape }: Placed): Vector {
  if (shape.kind === 'box') return [...shape.half];
  return shape.kind === 'cylinder' ? [shape.radius, shape.radius, shape.half] : [0, 0, 0];
}

/** The point of a shape's box that is closest to a world point. */
function clampedInto(placed: Placed, [x, y, z]: Vector): Vector {
  const m = placed.pose;
  const half = halves(placed);
  const d = [x - m[3]!, y - m[7]!, z - m[11]!] as const;
  const p = half.map((h, k) => {
    const own = m[k]! * d[0] + m[4 + k]! * d[1] + m[8 + k]! * d[2];
    return Math.max(-h, Math.min(h, own));
  });
  const at = (row: number): number => m[row]! * p[0]! + m[row + 1]! * p[1]! + m[row + 2]! * p[2]! + m[row + 3]!;
  return [at(0), at(4), at(8)];
}

const centre = ({ pose: m }: Placed): Vector => [m[3]!, m[7]!, m[11]!];
const ROUNDS = 40;

/** Climbs to a point deep in both; any point that it ends at is a proof, the deepest is the best one. */
function depthOfPair(a: Placed, b: Placed): number {
  const ha = halves(a);
  const hb = halves(b);
  const between = clampedInto(a, centre(b));
  const other = clampedInto(b, between);
  let best: Vector = [(between[0] + other[0]) / 2, (between[1] + other[1]) / 2, (between[2] + other[2]) / 2];
  let least = Math.min(marginAt(a, best), marginAt(b, best));
  let step = Math.max(...ha, ...hb) / 2;
  const smallest = Math.min(...ha, ...hb) / 64;
  for (let round = 0; round < ROUNDS && step > smallest; round += 1) {
    let better: Vector | null = null;
    for (const m of [a.pose, b.pose]) {
      for (let k = 0; k < 3; k += 1) {
        for (const way of [step, -step]) {
          const p: Vector = [best[0] + way * m[k]!, best[1] + way * m[4 + k]!, best[2] + way * m[8 + k]!];
          const margin = Math.min(marginAt(a, p), marginAt(b, p));
          if (margin > least) {
            least = margin;
            better = p;
          }
        }
      }
    }
    if (better === null) step /= 2;
    else best = better;
  }
  return least <= 0 ? 0 : marginAt(a, best) + marginAt(b, best);
}

/** True if the balls about the two shapes meet. */
function mayMeet(a: Placed, b: Placed): boolean {
  const [p, q] = [centre(a), centre(b)];
  const size = (v: Vector): number => Math.sqrt(v[0] * v[0] + v[1] * v[1] + v[2] * v[2]);
  const apart = size([p[0] - q[0], p[1] - q[1], p[2] - q[2]]);
  return apart < size(halves(a)) + size(halves(b));
}

/**
 * A depth in mm by which some body of `a` and some body of `b` overlap at least, placed as they are: neither side may move
 * by as much without the two still overlapping. 0 where no overlap of boxes or cylinders is proven; meshes prove none.
 * @param enough deeper than this need not be known, mm
 */
export function overlapAtLeast(a: readonly Placed[], b: readonly Placed[], enough: number): number {
  let deepest = 0;
  for (const x of a) {
    if (x.shape.kind === 'mesh') continue;
    for (const y of b) {
      if (y.shape.kind === 'mesh' || !mayMeet(x, y)) continue;
      deepest = Math.max(deepest, depthOfPair(x, y));
      if (deepest > enough) return deepest;
    }
  }
  return deepest;
}
