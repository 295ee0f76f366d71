// Convex shapes by their support: the farthest point along a direction. Boxes and cylinders are exact here; no facet
// stands in for a curve.
import type { BoxShape, CylinderShape } from './shape';

/** A convex set in some common frame: corners of a triangle, or a box or cylinder placed there. */
export type Convex =
  | { readonly kind: 'triangle'; readonly corners: Float64Array }
  | { readonly kind: 'placed'; readonly shape: BoxShape | CylinderShape; readonly pose: Float64Array };

/** Writes the point of `c` that lies farthest along (x, y, z) to out[o..o+2]. */
export function farthest(c: Convex, x: number, y: number, z: number, out: Float64Array, o: number): void {
  if (c.kind === 'triangle') {
    const t = c.corners;
    let best = 0;
    let reach = t[0]! * x + t[1]! * y + t[2]! * z;
    for (let i = 3; i < 9; i += 3) {
      const r = t[i]! * x + t[i + 1]! * y + t[i + 2]! * z;
      if (r > reach) {
        reach = r;
        best = i;
      }
    }
    out[o] = t[best]!;
    out[o + 1] = t[best + 1]!;
    out[o + 2] = t[best + 2]!;
    return;
  }
  const m = c.pose;
  const lx = m[0]! * x + m[4]! * y + m[8]! * z;
  const ly = m[1]! * x + m[5]! * y + m[9]! * z;
  const lz = m[2]! * x + m[6]! * y + m[10]! * z;
  let px: number;
  let py: number;
  let pz: number;
  if (c.shape.kind === 'box') {
    const h = c.shape.half;
    px = lx < 0 ? -h[0] : h[0];
    py = ly < 0 ? -h[1] : h[1];
    pz = lz < 0 ? -h[2] : h[2];
  } else {
    const across = Math.sqrt(lx * lx + ly * ly);
    const k = across > 0 ? c.shape.radius / across : 0;
    px = k * lx;
    py = k * ly;
    pz = lz < 0 ? -c.shape.half : c.shape.half;
  }
  out[o] = m[0]! * px + m[1]! * py + m[2]! * pz + m[3]!;
  out[o + 1] = m[4]! * px + m[5]! * py + m[6]! * pz + m[7]!;
  out[o + 2] = m[8]! * px + m[9]! * py + m[10]! * pz + m[11]!;
}

/** How far `c` reaches along (x, y, z), which need not be a unit vector: the support function. */
export function reach(c: Convex, x: number, y: number, z: number, scratch: Float64Array): number {
  farthest(c, x, y, z, scratch, 0);
  return scratch[0]! * x + scratch[1]! * y + scratch[2]! * z;
}
