// How far two stands stay apart along one direction over the whole of their stretches. Parts that pass one another side by
// side keep their gap in this bound at any length of stretch.
import { reach } from './convex';
import { convexOf } from './stand';
import type { Stand } from './stand';

/** How far apart the two stay along the direction d from A to B over the whole of both stretches; negative if they do not. */
export function apartThroughout(a: Stand, b: Stand, d: Float64Array, scratch: Float64Array): number {
  const length = Math.sqrt(d[0]! * d[0]! + d[1]! * d[1]! + d[2]! * d[2]!);
  if (!(length > 0)) return 0;
  const nx = d[0]! / length;
  const ny = d[1]! / length;
  const nz = d[2]! / length;
  return -reachThroughout(a, nx, ny, nz, scratch) - reachThroughout(b, -nx, -ny, -nz, scratch);
}

/** How far a stand reaches along the unit vector n over its whole stretch, at most. */
function reachThroughout(s: Stand, nx: number, ny: number, nz: number, scratch: Float64Array): number {
  const t = s.stretch;
  if (t.kind === 'still') return reachOf(s, nx, ny, nz, scratch);
  const [kx, ky, kz] = t.axis;
  const along = nx * kx + ny * ky + nz * kz;
  if (t.kind === 'slide') return reachOf(s, nx, ny, nz, scratch) + Math.abs(along) * t.half;
  // n turned back by ±h: reaching along n after a turn is reaching along the turned-back n before it
  const px = nx - along * kx;
  const py = ny - along * ky;
  const pz = nz - along * kz;
  const qx = ky * nz - kz * ny;
  const qy = kz * nx - kx * nz;
  const qz = kx * ny - ky * nx;
  const [ox, oy, oz] = t.point;
  const pivot = nx * ox + ny * oy + nz * oz;
  let most = -Infinity;
  for (let side = -1; side <= 1; side += 2) {
    const w = side * t.sin;
    const mx = along * kx + t.cos * px + w * qx;
    const my = along * ky + t.cos * py + w * qy;
    const mz = along * kz + t.cos * pz + w * qz;
    const r = pivot - (mx * ox + my * oy + mz * oz) + reachOf(s, mx, my, mz, scratch);
    if (r > most) most = r;
  }
  if (t.bump === 0) return most;
  const radius = s.travel / t.chord;
  return most + t.bump * radius * Math.sqrt(px * px + py * py + pz * pz);
}

/** How far a stand reaches along (x, y, z) in the middle of its stretch. */
function reachOf(s: Stand, x: number, y: number, z: number, scratch: Float64Array): number {
  if (s.single) return reach(convexOf(s), x, y, z, scratch);
  const m = s.pose;
  const h = s.half;
  return (
    s.centre[0]! * x +
    s.centre[1]! * y +
    s.centre[2]! * z +
    h[0]! * Math.abs(m[0]! * x + m[4]! * y + m[8]! * z) +
    h[1]! * Math.abs(m[1]! * x + m[5]! * y + m[9]! * z) +
    h[2]! * Math.abs(m[2]! * x + m[6]! * y + m[10]! * z)
  );
}
