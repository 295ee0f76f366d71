// Rigid placements: a rotation and a translation, as twelve numbers row by row:
//   [ r00 r01 r02 tx  r10 r11 r12 ty  r20 r21 r22 tz ],  x' = R x + t.
// Millimetres; the frames are the caller's.
import { sinCosDegrees } from './trig';

export type Rigid = Float64Array;
type Triple = readonly [number, number, number];

/** The placement that changes nothing. */
export function identityRigid(): Rigid {
  return Float64Array.of(1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1, 0);
}

/** A pose of the scene document: rotation Rx(rx)·Ry(ry)·Rz(rz), degrees, then translation, mm. */
export function rigidFromPose(at: Triple = [0, 0, 0], turn: Triple = [0, 0, 0]): Rigid {
  const [sx, cx] = sinCosDegrees(turn[0]);
  const [sy, cy] = sinCosDegrees(turn[1]);
  const [sz, cz] = sinCosDegrees(turn[2]);
  return Float64Array.of(
    cy * cz,
    -cy * sz,
    sy,
    at[0],
    cx * sz + sx * sy * cz,
    cx * cz - sx * sy * sz,
    -sx * cy,
    at[1],
    sx * sz - cx * sy * cz,
    sx * cz + cx * sy * sz,
    cx * cy,
    at[2],
  );
}

/** a after b: the placement of something placed by b inside a frame placed by a. `out` may be neither. */
export function composeRigid(a: Rigid, b: Rigid, out: Rigid = new Float64Array(12)): Rigid {
  for (let row = 0; row < 12; row += 4) {
    const a0 = a[row]!;
    const a1 = a[row + 1]!;
    const a2 = a[row + 2]!;
    out[row] = a0 * b[0]! + a1 * b[4]! + a2 * b[8]!;
    out[row + 1] = a0 * b[1]! + a1 * b[5]! + a2 * b[9]!;
    out[row + 2] = a0 * b[2]! + a1 * b[6]! + a2 * b[10]!;
    out[row + 3] = a0 * b[3]! + a1 * b[7]! + a2 * b[11]! + a[row + 3]!;
  }
  return out;
}

/** The placement that undoes a. */
export function invertRigid(a: Rigid, out: Rigid = new Float64Array(12)): Rigid {
  const tx = a[3]!;
  const ty = a[7]!;
  const tz = a[11]!;
  for (let row = 0; row < 3; row += 1) {
    const c0 = a[row]!;
    const c1 = a[row + 4]!;
    const c2 = a[row + 8]!;
    out[row * 4] = c0;
    out[row * 4 + 1] = c1;
    out[row * 4 + 2] = c2;
    out[row * 4 + 3] = -(c0 * tx + c1 * ty + c2 * tz);
  }
  return out;
}

/** The point p, placed by a. */
export function applyRigid(a: Rigid, p: Triple): [number, number, number] {
  return [
    a[0]! * p[0] + a[1]! * p[1] + a[2]! * p[2] + a[3]!,
    a[4]! * p[0] + a[5]! * p[1] + a[6]! * p[2] + a[7]!,
    a[8]! * p[0] + a[9]! * p[1] + a[10]! * p[2] + a[11]!,
  ];
}

/** The direction d, turned by a (its translation left out). */
export function turnByRigid(a: Rigid, d: Triple): [number, number, number] {
  return [
    a[0]! * d[0] + a[1]! * d[1] + a[2]! * d[2],
    a[4]! * d[0] + a[5]! * d[1] + a[6]! * d[2],
    a[8]! * d[0] + a[9]! * d[1] + a[10]! * d[2],
  ];
}

/**
 * A swing: rotation by `degrees` about the line through `point` along the unit vector `axis`, right-hand rule
 * (Rodrigues' formula).
 */
export function rigidFromSwing(point: Triple, axis: Triple, degrees: number): Rigid {
  const [s, c] = sinCosDegrees(degrees);
  const [x, y, z] = axis;
  const v = 1 - c;
  const r = [
    c + x * x * v,
    x * y * v - z * s,
    x * z * v + y * s,
    y * x * v + z * s,
    c + y * y * v,
    y * z * v - x * s,
    z * x * v - y * s,
    z * y * v + x * s,
    c + z * z * v,
  ] as const;
  const [px, py, pz] = point;
  return Float64Array.of(
    r[0],
    r[1],
    r[2],
    px - (r[0] * px + r[1] * py + r[2] * pz),
    r[3],
    r[4],
    r[5],
    py - (r[3] * px + r[4] * py + r[5] * pz),
    r[6],
    r[7],
    r[8],
    pz - (r[6] * px + r[7] * py + r[8] * pz),
  );
}

/** A slide by `distance` mm along the unit vector `along`. */
export function rigidFromSlide(along: Triple, distance: number): Rigid {
  return Float64Array.of(1, 0, 0, along[0] * distance, 0, 1, 0, along[1] * distance, 0, 0, 1, along[2] * distance);
}
