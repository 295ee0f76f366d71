// The distance between two triangles, up to rounding: the least over nine pairs of edges, six corners against
// faces, and zero where an edge passes through a face. Degenerate triangles (corners all but in a line) are handled as their
// edges.
// Segments: C. Ericson, Real-Time Collision Detection (2005), 5.1.9, with the near-parallel case taken from the cross
// product, which keeps the error of the distance at rounding of the coordinates; corner against face: ibid. 5.1.5.

/** Where a routine writes its answer: distance, then the two closest points. */
export type PairAnswer = Float64Array;
export const PAIR_ANSWER_LENGTH = 7;

function put(
  out: PairAnswer,
  d2: number,
  ax: number,
  ay: number,
  az: number,
  bx: number,
  by: number,
  bz: number,
): void {
  out[0] = d2;
  out[1] = ax;
  out[2] = ay;
  out[3] = az;
  out[4] = bx;
  out[5] = by;
  out[6] = bz;
}

const clamp01 = (x: number): number => (x > 0 ? (x < 1 ? x : 1) : 0);

/**
 * Closest points of the segment from corner i to corner j of P with that from k to l of Q; written to `out` (squared
 * distance first) if nearer than what stands there.
 */
function closerSegments(
  P: Float64Array,
  i: number,
  j: number,
  Q: Float64Array,
  k: number,
  l: number,
  out: PairAnswer,
): void {
  const px = P[i]!;
  const py = P[i + 1]!;
  const pz = P[i + 2]!;
  const qx = Q[k]!;
  const qy = Q[k + 1]!;
  const qz = Q[k + 2]!;
  const ux = P[j]! - px;
  const uy = P[j + 1]! - py;
  const uz = P[j + 2]! - pz;
  const vx = Q[l]! - qx;
  const vy = Q[l + 1]! - qy;
  const vz = Q[l + 2]! - qz;
  const rx = px - qx;
  const ry = py - qy;
  const rz = pz - qz;
  const a = ux * ux + uy * uy + uz * uz;
  const e = vx * vx + vy * vy + vz * vz;
  const f = vx * rx + vy * ry + vz * rz;
  let s = 0;
  let t = 0;
  if (a === 0) {
    if (e !== 0) t = clamp01(f / e);
  } else {
    const c = ux * rx + uy * ry + uz * rz;
    if (e === 0) s = clamp01(-c / a);
    else {
      const b = ux * vx + uy * vy + uz * vz;
      const nx = uy * vz - uz * vy;
      const ny = uz * vx - ux * vz;
      const nz = ux * vy - uy * vx;
      const nn = nx * nx + ny * ny + nz * nz;
      if (nn > 0) {
        const mx = ry * vz - rz * vy;
        const my = rz * vx - rx * vz;
        const mz = rx * vy - ry * vx;
        s = clamp01(-(mx * nx + my * ny + mz * nz) / nn);
      }
      t = (b * s + f) / e;
      if (!(t >= 0)) {
        t = 0;
        s = clamp01(-c / a);
      } else if (t > 1) {
        t = 1;
        s = clamp01((b - c) / a);
      }
    }
  }
  const ax = px + s * ux;
  const ay = py + s * uy;
  const az = pz + s * uz;
  const bx = qx + t * vx;
  const by = qy + t * vy;
  const bz = qz + t * vz;
  const d2 = (ax - bx) * (ax - bx) + (ay - by) * (ay - by) + (az - bz) * (az - bz);
  if (d2 < out[0]!) put(out, d2, ax, ay, az, bx, by, bz);
}

/** Closest points of two segments given by six numbers each; `out` gets the distance and the points. */
export function segmentDistance(P: Float64Array, Q: Float64Array, out: PairAnswer): number {
  out[0] = Infinity;
  closerSegments(P, 0, 3, Q, 0, 3, out);
  return (out[0] = Math.sqrt(out[0]));
}

/** A triangle's normal, unscaled, and its square. */
interface Plane {
  nx: number;
  ny: number;
  nz: number;
  nn: number;
}

/**
 * Triangles flatter than this (sine of the angle between the two shorter edges) are handled as their edges: the plane of
 * three corners that all but stand in a line is noise, and the face reaches no farther than this share of its length.
 */
const FLAT = 1e-8;
/** Likewise where the two shorter edges are below this, mm. */
const TINY = 1e-12;

/** The plane of a triangle, from its two shorter edges; `nn` is 0 if it is too flat to have one. */
function planeOf(T: Float64Array): Plane {
  const ax = T[3]! - T[0]!;
  const ay = T[4]! - T[1]!;
  const az = T[5]! - T[2]!;
  const bx = T[6]! - T[3]!;
  const by = T[7]! - T[4]!;
  const bz = T[8]! - T[5]!;
  const cx = T[0]! - T[6]!;
  const cy = T[1]! - T[7]!;
  const cz = T[2]! - T[8]!;
  const aa = ax * ax + ay * ay + az * az;
  const bb = bx * bx + by * by + bz * bz;
  const cc = cx * cx + cy * cy + cz * cz;
  // edges one after another, whichever two: their product has the same sense
  const first = aa >= bb && aa >= cc ? 1 : bb >= cc ? 2 : 0;
  const [ux, uy, uz, vx, vy, vz] =
    first === 1 ? [bx, by, bz, cx, cy, cz] : first === 2 ? [cx, cy, cz, ax, ay, az] : [ax, ay, az, bx, by, bz];
  const nx = uy * vz - uz * vy;
  const ny = uz * vx - ux * vz;
  const nz = ux * vy - uy * vx;
  const nn = nx * nx + ny * ny + nz * nz;
  const [uu, vv] = first === 1 ? [bb, cc] : first === 2 ? [cc, aa] : [aa, bb];
  const isFlat = nn <= FLAT * FLAT * uu * vv || Math.min(uu, vv) <= TINY * TINY;
  return { nx, ny, nz, nn: isFlat ? 0 : nn };
}

const height = (T: Float64Array, n: Plane, x: number, y: number, z: number): number =>
  (x - T[0]!) * n.nx + (y - T[1]!) * n.ny + (z - T[2]!) * n.nz;

/** True if the point, projected along n, falls on the triangle. */
function over(T: Float64Array, n: Plane, x: number, y: number, z: number): boolean {
  for (let i = 0; i < 9; i += 3) {
    const j = i === 6 ? 0 : i + 3;
    const ex = T[j]! - T[i]!;
    const ey = T[j + 1]! - T[i + 1]!;
    const ez = T[j + 2]! - T[i + 2]!;
    const wx = x - T[i]!;
    const wy = y - T[i + 1]!;
    const wz = z - T[i + 2]!;
    const side = (ey * wz - ez * wy) * n.nx + (ez * wx - ex * wz) * n.ny + (ex * wy - ey * wx) * n.nz;
    if (side < 0) return false;
  }
  return true;
}

/**
 * Corners and edges of P against the face of Q. Returns true if an edge of P passes through the face (then `out` is a
 * common point at distance 0). `swap`: P is the second side, so the points are written the other way round.
 */
function againstFace(P: Float64Array, Q: Float64Array, n: Plane, swap: boolean, out: PairAnswer): boolean {
  const h0 = height(Q, n, P[0]!, P[1]!, P[2]!);
  const h1 = height(Q, n, P[3]!, P[4]!, P[5]!);
  const h2 = height(Q, n, P[6]!, P[7]!, P[8]!);
  for (let i = 0; i < 3; i += 1) {
    const h = i === 0 ? h0 : i === 1 ? h1 : h2;
    const next = i === 0 ? h1 : i === 1 ? h2 : h0;
    const o = 3 * i;
    const x = P[o]!;
    const y = P[o + 1]!;
    const z = P[o + 2]!;
    const d2 = (h * h) / n.nn;
    if (d2 < out[0]! && over(Q, n, x, y, z)) {
      const k = h / n.nn;
      const fx = x - k * n.nx;
      const fy = y - k * n.ny;
      const fz = z - k * n.nz;
      if (swap) put(out, d2, fx, fy, fz, x, y, z);
      else put(out, d2, x, y, z, fx, fy, fz);
    }
    if ((h < 0 && next > 0) || (h > 0 && next < 0)) {
      const p = i === 2 ? 0 : o + 3;
      const w = h / (h - next);
      const cx = x + w * (P[p]! - x);
      const cy = y + w * (P[p + 1]! - y);
      const cz = z + w * (P[p + 2]! - z);
      if (over(Q, n, cx, cy, cz)) {
        put(out, 0, cx, cy, cz, cx, cy, cz);
        return true;
      }
    }
  }
  return false;
}

/**
 * Distance between two triangles in one frame.
 * @param P @param Q nine numbers each, mm
 * @param out gets the distance (mm) and the closest points, of P first; one common point where they cross
 * @returns the distance; its error is within 1e-12 of the largest coordinate
 */
export function triangleDistance(P: Float64Array, Q: Float64Array, out: PairAnswer): number {
  out[0] = Infinity;
  const nq = planeOf(Q);
  if (nq.nn > 0 && againstFace(P, Q, nq, false, out)) return 0;
  const np = planeOf(P);
  if (np.nn > 0 && againstFace(Q, P, np, true, out)) return 0;
  for (let i = 0; i < 9; i += 3) {
    const j = i === 6 ? 0 : i + 3;
    closerSegments(P, i, j, Q, 0, 3, out);
    closerSegments(P, i, j, Q, 3, 6, out);
    closerSegments(P, i, j, Q, 6, 0, out);
  }
  return (out[0] = Math.sqrt(out[0]));
}
