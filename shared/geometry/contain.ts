// Is one thing inside another? Asked only where the surfaces are known to be apart, so one point of each connected piece
// answers for the whole piece. The winding number is summed from solid angles (A. van Oosterom and J. Strackee, IEEE
// Trans. Biomed. Eng. 30(2), 1983): it has no rays that could graze an edge, and on a sheet it is the generalised winding
// number (A. Jacobson and others, ACM Trans. Graph. 32(4), 2013).
import { atan2Radians, applyRigid, invertRigid } from '#shared/units';
import type { Rigid } from '#shared/units';
import type { Triple } from './path';
import { shapeBox } from './shape';
import type { MeshShape, Placed, Shape } from './shape';

/**
 * Winding number of a mesh about a point in its frame: 1 inside a closed mesh that is turned outward, 0 outside, in
 * between for an open one. Undefined on the surface itself.
 */
export function windingNumber(mesh: MeshShape, p: Triple): number {
  const { corners } = mesh;
  const { triangles } = mesh.tree;
  let sum = 0;
  for (let k = 0; k < triangles.length; k += 3) {
    const a = 3 * triangles[k]!;
    const b = 3 * triangles[k + 1]!;
    const c = 3 * triangles[k + 2]!;
    const ax = corners[a]! - p[0];
    const ay = corners[a + 1]! - p[1];
    const az = corners[a + 2]! - p[2];
    const bx = corners[b]! - p[0];
    const by = corners[b + 1]! - p[1];
    const bz = corners[b + 2]! - p[2];
    const cx = corners[c]! - p[0];
    const cy = corners[c + 1]! - p[1];
    const cz = corners[c + 2]! - p[2];
    const la = Math.sqrt(ax * ax + ay * ay + az * az);
    const lb = Math.sqrt(bx * bx + by * by + bz * bz);
    const lc = Math.sqrt(cx * cx + cy * cy + cz * cz);
    const triple = ax * (by * cz - bz * cy) + ay * (bz * cx - bx * cz) + az * (bx * cy - by * cx);
    const rest =
      la * lb * lc +
      (ax * bx + ay * by + az * bz) * lc +
      (bx * cx + by * cy + bz * cz) * la +
      (cx * ax + cy * ay + cz * az) * lb;
    sum += atan2Radians(triple, rest);
  }
  // each triangle's solid angle is twice its arc tangent; the whole sphere is 4 pi
  return sum / (2 * Math.PI);
}

/** True if a point in the shape's frame lies inside it. A sheet has no inside. */
export function isInside(shape: Shape, p: Triple): boolean {
  switch (shape.kind) {
    case 'box':
      return Math.abs(p[0]) < shape.half[0] && Math.abs(p[1]) < shape.half[1] && Math.abs(p[2]) < shape.half[2];
    case 'cylinder':
      return Math.abs(p[2]) < shape.half && p[0] * p[0] + p[1] * p[1] < shape.radius * shape.radius;
    case 'mesh':
      return shape.body && inBox(shapeBox(shape), p) && Math.abs(windingNumber(shape, p)) > 0.5;
  }
}

/** True if a point lies in a box given as centre and half sizes. */
export function inBox(box: Float64Array, p: Triple): boolean {
  for (let k = 0; k < 3; k += 1) if (Math.abs(p[k]! - box[k]!) > box[k + 3]!) return false;
  return true;
}

/** One point of every connected piece of a shape, in its own frame. */
export function piecePoints(shape: Shape): Triple[] {
  if (shape.kind !== 'mesh') return [[0, 0, 0]];
  return Array.from(shape.shellCorners, (i): Triple => [
    shape.corners[3 * i]!,
    shape.corners[3 * i + 1]!,
    shape.corners[3 * i + 2]!,
  ]);
}

/**
 * A world point where one of two solids, whose surfaces are apart, lies inside the other; null if neither does.
 * Boxes and cylinders are compared as solids by the distance search itself, so only meshes need asking here.
 * @param poseA @param poseB world poses at the moment that is asked about
 */
export function containedPoint(A: Placed, poseA: Rigid, B: Placed, poseB: Rigid): Triple | null {
  return pieceInside(A.shape, poseA, B.shape, poseB) ?? pieceInside(B.shape, poseB, A.shape, poseA);
}

function pieceInside(inner: Shape, innerPose: Rigid, outer: Shape, outerPose: Rigid): Triple | null {
  if (outer.kind === 'mesh' && !outer.body) return null;
  if (outer.kind !== 'mesh' && inner.kind !== 'mesh') return null;
  const back = invertRigid(outerPose);
  for (const point of piecePoints(inner)) {
    const world = applyRigid(innerPose, point);
    if (isInside(outer, applyRigid(back, world))) return world;
  }
  return null;
}
