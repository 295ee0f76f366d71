// One side of an entry of the search: a solid, the node of its tree, the stretch of its path, and what the bounds need of
// them, worked out once for as long as the three stay.
import { composeRigid, invertRigid } from '#shared/units';
import type { Rigid } from '#shared/units';
import type { Convex } from './convex';
import type { Stretch } from './path';
import { shapeBox } from './shape';
import type { MeshShape, Placed } from './shape';

/** A solid with what the walk needs of it. */
export interface Body {
  readonly placed: Placed;
  readonly mesh: MeshShape | null;
  readonly nodeCount: number;
  /** Box of the root, for single shapes. */
  readonly box: Float64Array;
}

/** How one solid stands within the present entry. */
export interface Stand {
  body: Body;
  stretch: Stretch;
  pose: Rigid;
  /** Centre in the world and half sizes of the present node, and its corners if it is a triangle. */
  node: number;
  readonly centre: Float64Array;
  readonly half: Float64Array;
  readonly corners: Float64Array;
  single: boolean;
  /** Radius of the ball about the centre, and the longest way a point of the node can go from the middle. */
  size: number;
  travel: number;
}

function newStand(body: Body, stretch: Stretch): Stand {
  return {
    body,
    stretch,
    pose: body.placed.pose,
    node: -1,
    centre: new Float64Array(3),
    half: new Float64Array(3),
    corners: new Float64Array(9),
    single: false,
    size: 0,
    travel: 0,
  };
}

export function bodyOf(placed: Placed): Body {
  const mesh = placed.shape.kind === 'mesh' ? placed.shape : null;
  return { placed, mesh, nodeCount: mesh === null ? 0 : mesh.tree.nodes.length / 2, box: shapeBox(placed.shape) };
}

/** World pose of solid `index` in the middle of a stretch. */
function poseIn(stretch: Stretch, index: number, body: Body): Rigid {
  return (stretch.poses[index] ??=
    stretch.kind === 'still' ? body.placed.pose : composeRigid(stretch.at, body.placed.pose));
}

export function inverseIn(stretch: Stretch, index: number, body: Body): Rigid {
  return (stretch.inverses[index] ??= invertRigid(poseIn(stretch, index, body)));
}

/** Square of the distance of a point from the axis of a swing. */
function radiusSquared(s: Stretch, x: number, y: number, z: number): number {
  const px = x - s.point[0];
  const py = y - s.point[1];
  const pz = z - s.point[2];
  const along = px * s.axis[0] + py * s.axis[1] + pz * s.axis[2];
  const r2 = px * px + py * py + pz * pz - along * along;
  return r2 > 0 ? r2 : 0;
}

/** Brings a stand to a node of a solid in the middle of a stretch. */
export function standAt(old: Stand | null, body: Body, index: number, node: number, stretch: Stretch): Stand {
  const s = old ?? newStand(body, stretch);
  if (old !== null && s.body === body && s.node === node && s.stretch === stretch) return s;
  s.body = body;
  s.stretch = stretch;
  s.node = node;
  const m = (s.pose = poseIn(stretch, index, body));
  const { mesh } = body;
  const { centre, half } = s;
  if (mesh !== null && node >= body.nodeCount) {
    s.single = true;
    const o = 3 * (node - body.nodeCount);
    const c = s.corners;
    for (let k = 0; k < 3; k += 1) {
      const p = 3 * mesh.tree.triangles[o + k]!;
      const x = mesh.corners[p]!;
      const y = mesh.corners[p + 1]!;
      const z = mesh.corners[p + 2]!;
      c[3 * k] = m[0]! * x + m[1]! * y + m[2]! * z + m[3]!;
      c[3 * k + 1] = m[4]! * x + m[5]! * y + m[6]! * z + m[7]!;
      c[3 * k + 2] = m[8]! * x + m[9]! * y + m[10]! * z + m[11]!;
    }
    let r2 = 0;
    let size2 = 0;
    for (let k = 0; k < 3; k += 1) centre[k] = (c[k]! + c[k + 3]! + c[k + 6]!) / 3;
    for (let k = 0; k < 9; k += 3) {
      if (stretch.kind === 'swing') r2 = Math.max(r2, radiusSquared(stretch, c[k]!, c[k + 1]!, c[k + 2]!));
      const dx = c[k]! - centre[0]!;
      const dy = c[k + 1]! - centre[1]!;
      const dz = c[k + 2]! - centre[2]!;
      size2 = Math.max(size2, dx * dx + dy * dy + dz * dz);
    }
    s.size = Math.sqrt(size2);
    s.travel = stretch.kind === 'swing' ? stretch.chord * Math.sqrt(r2) : stretch.half;
    return s;
  }
  s.single = mesh === null;
  const box = mesh === null ? body.box : mesh.tree.boxes;
  const o = mesh === null ? 0 : 6 * node;
  const x = box[o]!;
  const y = box[o + 1]!;
  const z = box[o + 2]!;
  centre[0] = m[0]! * x + m[1]! * y + m[2]! * z + m[3]!;
  centre[1] = m[4]! * x + m[5]! * y + m[6]! * z + m[7]!;
  centre[2] = m[8]! * x + m[9]! * y + m[10]! * z + m[11]!;
  const hx = (half[0] = box[o + 3]!);
  const hy = (half[1] = box[o + 4]!);
  const hz = (half[2] = box[o + 5]!);
  s.size = Math.sqrt(hx * hx + hy * hy + hz * hz);
  s.travel =
    stretch.kind === 'swing'
      ? stretch.chord * (Math.sqrt(radiusSquared(stretch, centre[0], centre[1], centre[2])) + s.size)
      : stretch.half;
  return s;
}

/** How many children a node of a mesh has: two nodes, or the triangles of a leaf. */
export function childrenOf(body: Body, node: number): number {
  return body.mesh!.tree.nodes[2 * node + 1]! || 2;
}

/** Child k of a node; triangles are numbered on after the nodes. */
export function childOf(body: Body, node: number, k: number): number {
  const { nodes } = body.mesh!.tree;
  const first = nodes[2 * node]!;
  if (nodes[2 * node + 1]! > 0) return body.nodeCount + first + k;
  return k === 0 ? node + 1 : first;
}

export function isTriangle(s: Stand): boolean {
  return s.single && s.body.mesh !== null;
}

export function convexOf(s: Stand): Convex {
  const { shape } = s.body.placed;
  if (shape.kind === 'mesh') return { kind: 'triangle', corners: s.corners };
  return { kind: 'placed', shape, pose: s.pose };
}
