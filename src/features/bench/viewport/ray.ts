// From a place on the screen back into the car.
import { Matrix4, Vector3 } from 'three';
import type { Frame } from './frame';
import { cross, dot, scale, sub, unit, type Triple } from './vectors';
import type { Ray } from './picking';

/** The ray through a place of the picture, CSS px from its top left. */
export function rayAt(frame: Frame, x: number, y: number): Ray {
  const inverse = new Matrix4().fromArray([...frame.matrix]).invert();
  const [u, v] = [(x / frame.width) * 2 - 1, 1 - (y / frame.height) * 2];
  const near = new Vector3(u, v, -1).applyMatrix4(inverse).toArray();
  const far = new Vector3(u, v, 0.5).applyMatrix4(inverse).toArray();
  return { from: near, along: unit(sub(far, near)) };
}

/** How far along the line `point` + t·`axis` a ray comes nearest to it, mm; null where the two run alongside. */
export function alongAxis(ray: Ray, point: Triple, axis: Triple): number | null {
  const across = cross(axis, ray.along);
  const size = dot(across, across);
  if (size < 1e-4) return null;
  return dot(cross(sub(ray.from, point), ray.along), across) / size;
}

/** Where a ray goes through the plane at `point` square to `normal`; null where it runs along it. */
export function onPlane(ray: Ray, point: Triple, normal: Triple): Triple | null {
  const facing = dot(ray.along, normal);
  if (Math.abs(facing) < 0.05) return null;
  const t = dot(sub(point, ray.from), normal) / facing;
  return [0, 1, 2].map((k) => ray.from[k]! + ray.along[k]! * t) as unknown as Triple;
}

/** Two unit vectors that span the plane square to an axis, right-handed with it. */
export function planeAxes(axis: Triple): readonly [Triple, Triple] {
  const u: Triple = Math.abs(axis[2]) > 0.9 ? [1, 0, 0] : [0, 0, 1];
  const first = unit(sub(u, scale(axis, dot(u, axis))));
  return [first, cross(axis, first)];
}

export function angleOn(point: Triple, centre: Triple, [u, v]: readonly [Triple, Triple]): number {
  const d = sub(point, centre);
  return (Math.atan2(dot(d, v), dot(d, u)) * 180) / Math.PI;
}
