// What lies under the pointer: rays against the solids themselves, so that a cylinder is as round here as it is in the check.
import type { Component, Scene, Shape } from '#shared/scene';
import { applyRigid, composeRigid, invertRigid, rigidFromPose, turnByRigid } from '#shared/units';
import { bodiesOf, bodyPose, type Positions } from './bodies';
import type { Cut } from './light';
import { isGlass } from './look';
import type { MeshSource } from './mesh-source';
import { add, dot, scale, sub, unit, type Triple } from './vectors';

/** In the car, mm; `along` is a unit vector. */
export interface Ray {
  readonly from: Triple;
  readonly along: Triple;
}

export interface Hit {
  readonly component: string;
  readonly distance: number;
  readonly isGlass: boolean;
}

export interface PickScene {
  readonly scene: Scene;
  readonly positions: Positions;
  readonly meshes: MeshSource;
  readonly isOff: (id: string) => boolean;
  readonly isFaded: (id: string) => boolean;
  readonly cut: Cut | null;
}

/** Everything along a ray: solid things first, each lot from near to far, so that glass never keeps from what is behind. */
export function pickAll(where: PickScene, ray: Ray): Hit[] {
  const hits = where.scene.components.flatMap((component): Hit[] => {
    if (where.isOff(component.id)) return [];
    const distance = nearest(where, component, ray);
    const veiled = isGlass(component.category) || where.isFaded(component.id);
    return distance === null ? [] : [{ component: component.id, distance, isGlass: veiled }];
  });
  return hits.sort((a, b) => Number(a.isGlass) - Number(b.isGlass) || a.distance - b.distance);
}

function nearest({ scene, positions, meshes, cut }: PickScene, component: Component, ray: Ray): number | null {
  let best: number | null = null;
  for (const body of bodiesOf(component)) {
    const pose = bodyPose(scene, component, body, positions);
    for (const i of body.solids) {
      const solid = component.solids[i]!;
      const inverse = invertRigid(composeRigid(pose, rigidFromPose(solid.pose?.at, solid.pose?.turn)));
      const local = { from: applyRigid(inverse, ray.from), along: turnByRigid(inverse, ray.along) };
      for (const t of meets(solid.shape, local, meshes)) {
        if (t <= 0 || (best !== null && t >= best)) continue;
        if (cut === null || !isCutAway(cut, add(ray.from, scale(ray.along, t)))) best = t;
      }
    }
  }
  return best;
}

const isCutAway = ({ point, towards }: Cut, p: Triple): boolean => dot(unit(towards), sub(p, point)) > 0;

/** Distances at which a ray enters and leaves a shape, or meets the faces of a mesh. */
function meets(shape: Shape, ray: Ray, meshes: MeshSource): number[] {
  if (shape.kind === 'box') return meetsBox(scale(shape.size, -0.5), scale(shape.size, 0.5), ray);
  if (shape.kind === 'cylinder') return meetsCylinder(shape.diameter / 2, shape.length / 2, ray);
  const found = meshes.get(shape.mesh);
  if (found === undefined) return [];
  if (found.state === 'ready') return meetsMesh(found.mesh, shape.scale, ray);
  if (found.box === null) return [];
  return meetsBox(scale(found.box.low, shape.scale), scale(found.box.high, shape.scale), ray);
}

export function meetsBox(low: Triple, high: Triple, { from, along }: Ray): number[] {
  let [enter, leave] = [-Infinity, Infinity];
  for (const k of [0, 1, 2] as const) {
    const a = (low[k] - from[k]) / along[k];
    const b = (high[k] - from[k]) / along[k];
    if (Number.isNaN(a) || Number.isNaN(b)) return [];
    enter = Math.max(enter, Math.min(a, b));
    leave = Math.min(leave, Math.max(a, b));
  }
  return enter <= leave ? [enter, leave] : [];
}

export function meetsCylinder(radius: number, half: number, { from, along }: Ray): number[] {
  const a = along[0] ** 2 + along[1] ** 2;
  const b = from[0] * along[0] + from[1] * along[1];
  const c = from[0] ** 2 + from[1] ** 2 - radius ** 2;
  let [enter, leave] = [-Infinity, Infinity];
  if (a > 1e-12) {
    const inside = b * b - a * c;
    if (inside < 0) return [];
    enter = (-b - Math.sqrt(inside)) / a;
    leave = (-b + Math.sqrt(inside)) / a;
  } else if (c > 0) {
    return [];
  }
  if (along[2] !== 0) {
    const [s, t] = [(-half - from[2]) / along[2], (half - from[2]) / along[2]];
    enter = Math.max(enter, Math.min(s, t));
    leave = Math.min(leave, Math.max(s, t));
  } else if (Math.abs(from[2]) > half) {
    return [];
  }
  return enter <= leave ? [enter, leave] : [];
}

interface Triangles {
  readonly positions: Float32Array;
  readonly index: Uint32Array;
}

/** Distances at which a ray goes through triangles, both sides (Möller and Trumbore's way). */
function meetsMesh({ positions: p, index }: Triangles, mmPerUnit: number, ray: Ray): number[] {
  const [ox, oy, oz] = scale(ray.from, 1 / mmPerUnit);
  const [dx, dy, dz] = ray.along;
  const found: number[] = [];
  for (let t = 0; t < index.length; t += 3) {
    const [a, b, c] = [3 * index[t]!, 3 * index[t + 1]!, 3 * index[t + 2]!];
    const ux = p[b]! - p[a]!;
    const uy = p[b + 1]! - p[a + 1]!;
    const uz = p[b + 2]! - p[a + 2]!;
    const vx = p[c]! - p[a]!;
    const vy = p[c + 1]! - p[a + 1]!;
    const vz = p[c + 2]! - p[a + 2]!;
    const hx = dy * vz - dz * vy;
    const hy = dz * vx - dx * vz;
    const hz = dx * vy - dy * vx;
    const det = ux * hx + uy * hy + uz * hz;
    if (Math.abs(det) < 1e-14) continue;
    const sx = ox - p[a]!;
    const sy = oy - p[a + 1]!;
    const sz = oz - p[a + 2]!;
    const u = (sx * hx + sy * hy + sz * hz) / det;
    if (u < 0 || u > 1) continue;
    const qx = sy * uz - sz * uy;
    const qy = sz * ux - sx * uz;
    const qz = sx * uy - sy * ux;
    const v = (dx * qx + dy * qy + dz * qz) / det;
    if (v < 0 || u + v > 1) continue;
    found.push(((vx * qx + vy * qy + vz * qz) / det) * mmPerUnit);
  }
  return found;
}
