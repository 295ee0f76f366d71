// The shapes that the kernel compares, each in its own frame (its origin, mm): a box, a true cylinder, a mesh.
import type { Mesh } from './mesh';
import { buildTree, scaleTree } from './tree';
import type { Tree } from './tree';

export interface BoxShape {
  readonly kind: 'box';
  /** Half sizes along x, y, z. */
  readonly half: readonly [number, number, number];
}

/** Axis along local z, centred. */
export interface CylinderShape {
  readonly kind: 'cylinder';
  readonly radius: number;
  readonly half: number;
}

export interface MeshShape {
  readonly kind: 'mesh';
  readonly body: boolean;
  /** Scaled corners, mm. */
  readonly corners: Float64Array;
  readonly tree: Tree;
  readonly shellCorners: Uint32Array;
}

export type Shape = BoxShape | CylinderShape | MeshShape;

/** A shape in the world at rest. */
export interface Placed {
  readonly shape: Shape;
  /** From the shape's frame to the world. */
  readonly pose: Float64Array;
}

export function boxShape(x: number, y: number, z: number): BoxShape {
  return { kind: 'box', half: [x / 2, y / 2, z / 2] };
}

export function cylinderShape(diameter: number, length: number): CylinderShape {
  return { kind: 'cylinder', radius: diameter / 2, half: length / 2 };
}

/** A mesh with its tree, ready to be scaled. */
export interface IndexedMesh {
  readonly mesh: Mesh;
  readonly tree: Tree;
}

export function indexMesh(mesh: Mesh): IndexedMesh {
  return { mesh, tree: buildTree(mesh.corners, mesh.triangles) };
}

/** The mesh at `scale` mm per file unit. The scale is worked into the corners: nothing is measured in a scaled frame. */
export function meshShape(indexed: IndexedMesh, scale: number): MeshShape {
  const { mesh, tree } = indexed;
  return {
    kind: 'mesh',
    body: mesh.kind === 'body',
    corners: scale === 1 ? mesh.corners : mesh.corners.map((x) => x * scale),
    tree: scaleTree(tree, scale),
    shellCorners: mesh.shellCorners,
  };
}

/** Centre and half size of the shape's box in its own frame: cx, cy, cz, hx, hy, hz. */
export function shapeBox(shape: Shape): Float64Array {
  switch (shape.kind) {
    case 'box':
      return Float64Array.of(0, 0, 0, ...shape.half);
    case 'cylinder':
      return Float64Array.of(0, 0, 0, shape.radius, shape.radius, shape.half);
    case 'mesh':
      return shape.tree.boxes.subarray(0, 6);
  }
}

/** True if the shape has an inside that counts. */
export function isBody(shape: Shape): boolean {
  return shape.kind !== 'mesh' || shape.body;
}
