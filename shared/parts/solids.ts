// The few strokes that all recipes are drawn with. Everything comes out as boxes and cylinders of the scene document, in the
// part's own frame; places are rounded to a micrometre, so that documents stay readable.
import { poseFromRigid, rigidOf, type Pose, type Solid, type Vec3 } from '#shared/scene';
import { atan2Degrees, composeRigid, radiansOf, sinCosDegrees, type Rigid } from '#shared/units';

export type Axis = 'x' | 'y' | 'z';

const round = (x: number): number => Math.round(x * 1000) / 1000 + 0;
const roundAngle = (x: number): number => Math.round(x * 1e5) / 1e5 + 0;
const isZero = (v: Vec3): boolean => v.every((x) => x === 0);

export const add = (a: Vec3, b: Vec3): Vec3 => [a[0] + b[0], a[1] + b[1], a[2] + b[2]];
export const minus = (a: Vec3, b: Vec3): Vec3 => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
export const times = (a: Vec3, k: number): Vec3 => [a[0] * k, a[1] * k, a[2] * k];
export const along = (a: Vec3, b: Vec3, share: number): Vec3 => add(a, times(minus(b, a), share));
const dot = (a: Vec3, b: Vec3): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
const cross = (a: Vec3, b: Vec3): Vec3 => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];
export const lengthOf = (a: Vec3): number => Math.sqrt(dot(a, a));
export const unitOf = (a: Vec3): Vec3 => times(a, 1 / lengthOf(a));
export const roundVec = (v: Vec3): Vec3 => [round(v[0]), round(v[1]), round(v[2])];

/** The point at `degrees` from straight down, at `radius` from `centre`, in the plane of X and Z; positive is rearward. */
export function hanging(radius: number, degrees: number, centre: Vec3 = [0, 0, 0]): Vec3 {
  const [s, c] = sinCosDegrees(degrees);
  return [centre[0] + radius * s, centre[1], centre[2] - radius * c];
}

export function tangent(degrees: number): number {
  const [s, c] = sinCosDegrees(degrees);
  return s / c;
}

/** Arc sine in degrees, of -1 to 1. */
export const asinDegrees = (x: number): number => atan2Degrees(x, Math.sqrt(Math.max(0, 1 - x * x)));
export const arcLength = (radius: number, degrees: number): number => radius * radiansOf(degrees);

/** A pose with its zeros left out, as people write it. */
function poseOf(at: Vec3, turn: Vec3): Pose {
  const place = roundVec(at);
  const angles: Vec3 = [roundAngle(turn[0]), roundAngle(turn[1]), roundAngle(turn[2])];
  return { ...(isZero(place) ? {} : { at: place }), ...(isZero(angles) ? {} : { turn: angles }) };
}

export function box(id: string, name: string, size: Vec3, at: Vec3, turn: Vec3 = [0, 0, 0]): Solid {
  return { id, name, shape: { kind: 'box', size: roundVec(size) }, pose: poseOf(at, turn) };
}

const AXIS_TURN: Readonly<Record<Axis, Vec3>> = { x: [0, 90, 0], y: [-90, 0, 0], z: [0, 0, 0] };

/** A cylinder about its middle. */
export function cylinder(id: string, name: string, diameter: number, long: number, at: Vec3, axis: Axis): Solid {
  const shape = { kind: 'cylinder', diameter: round(diameter), length: round(long) } as const;
  return { id, name, shape, pose: poseOf(at, AXIS_TURN[axis]) };
}

/** The turn that takes +Z to the direction of `d`. */
function turnTo(d: Vec3): Vec3 {
  return [atan2Degrees(-d[1], d[2]) || 0, atan2Degrees(d[0], Math.sqrt(d[1] * d[1] + d[2] * d[2])), 0];
}

/** A cylinder from point to point. */
export function rod(id: string, name: string, diameter: number, from: Vec3, to: Vec3): Solid {
  const d = minus(to, from);
  const shape = { kind: 'cylinder', diameter: round(diameter), length: round(lengthOf(d)) } as const;
  return { id, name, shape, pose: poseOf(along(from, to, 0.5), turnTo(d)) };
}

/**
 * A flat bar from point to point: its length runs along the line, `thick` is measured as near to `flat` as the line allows,
 * `wide` across both.
 */
export function bar(
  id: string,
  name: string,
  { wide, thick, flat = [0, 1, 0] }: { readonly wide: number; readonly thick: number; readonly flat?: Vec3 },
  from: Vec3,
  to: Vec3,
): Solid {
  const d = minus(to, from);
  const z = unitOf(d);
  const y = unitOf(minus(flat, times(z, dot(flat, z))));
  const x = cross(y, z);
  const frame: Rigid = Float64Array.of(x[0], y[0], z[0], 0, x[1], y[1], z[1], 0, x[2], y[2], z[2], 0);
  const { turn = [0, 0, 0] } = poseFromRigid(frame);
  return box(id, name, [wide, thick, lengthOf(d)], along(from, to, 0.5), turn);
}

/** A hexagon head or nut: three boxes that make the hexagon exactly. */
export function hex(id: string, name: string, acrossFlats: number, high: number, at: Vec3, axis: Axis): Solid[] {
  const side = acrossFlats / Math.sqrt(3);
  return [0, 60, 120].map((spin, i) => {
    const turn: Vec3 = axis === 'z' ? [0, 0, spin] : axis === 'x' ? [spin, 0, 0] : [0, spin, 0];
    const size: Vec3 =
      axis === 'z' ? [acrossFlats, side, high] : axis === 'x' ? [high, acrossFlats, side] : [side, high, acrossFlats];
    return box(`${id}-${i + 1}`, name, size, at, turn);
  });
}

/** A hollow round tube about its middle, walled with flats that leave `bore` free. Its axis is Y. */
export function hollow(id: string, name: string, bore: number, wall: number, long: number, at: Vec3): Solid[] {
  const flats = 8;
  // wide enough that neighbours meet on the outside
  const wide = (bore + 2 * wall) * tangent(180 / flats);
  return Array.from({ length: flats }, (_, i) => {
    const [s, c] = sinCosDegrees((360 / flats) * i);
    const r = (bore + wall) / 2;
    return box(`${id}-${i + 1}`, name, [wall, long, wide], add(at, [r * c, 0, -r * s]), [0, (360 / flats) * i, 0]);
  });
}

/** A pipe along a line of points, its pieces drawn on so that they close at the corners. */
export function pipe(id: string, name: string, diameter: number, points: readonly Vec3[]): Solid[] {
  return points.slice(1).map((end, i) => {
    const start = points[i]!;
    const d = unitOf(minus(end, start));
    const overrun = (other: Vec3 | undefined, corner: Vec3, sign: 1 | -1): number => {
      if (other === undefined) return 0;
      const e = unitOf(times(minus(other, corner), sign));
      const c = Math.min(1, Math.max(-0.5, dot(d, e)));
      return (diameter / 2) * Math.sqrt((1 - c) / (1 + c));
    };
    const before = overrun(points[i - 1], start, -1);
    const after = overrun(points[i + 2], end, 1);
    return rod(`${id}-${i + 1}`, name, diameter, add(start, times(d, -before)), add(end, times(d, after)));
  });
}

/** The points of a line with its corners rounded to `radius`, `pieces` to a corner. */
export function bent(corners: readonly Vec3[], radius: number, pieces = 4): Vec3[] {
  const points: Vec3[] = [];
  corners.forEach((corner, i) => {
    const before = corners[i - 1];
    const after = corners[i + 1];
    if (before === undefined || after === undefined) {
      points.push(corner);
      return;
    }
    const u = unitOf(minus(before, corner));
    const v = unitOf(minus(after, corner));
    const half = atan2Degrees(lengthOf(minus(u, v)), lengthOf(add(u, v)));
    if (half > 89.5) return;
    const middle = unitOf(add(u, v));
    const [s, c] = sinCosDegrees(half);
    const reach = (radius * c) / s;
    const centre = add(corner, times(middle, radius / s));
    const a = minus(add(corner, times(u, reach)), centre);
    const b = minus(add(corner, times(v, reach)), centre);
    const sweep = 180 - 2 * half;
    const [whole] = sinCosDegrees(sweep);
    for (let k = 0; k <= pieces; k += 1) {
      const [sa] = sinCosDegrees(sweep * (1 - k / pieces));
      const [sb] = sinCosDegrees((sweep * k) / pieces);
      points.push(add(centre, add(times(a, sa / whole), times(b, sb / whole))));
    }
  });
  return points;
}

/** Solids that were drawn in a frame of their own, put into the part's frame. */
export function placed(solids: readonly Solid[], pose: Pose): Solid[] {
  const frame = rigidOf(pose);
  return solids.map((s) => {
    const { at = [0, 0, 0], turn = [0, 0, 0] } = poseFromRigid(composeRigid(frame, rigidOf(s.pose)));
    return { ...s, pose: poseOf(at, turn) };
  });
}
