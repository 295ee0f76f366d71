// How far parts reach: boxes along the vehicle axes, mm.
import { worldPose, type Component, type Scene, type Shape, type Solid } from '#shared/scene';
import { applyRigid, composeRigid, rigidFromPose, type Rigid } from '#shared/units';
import type { MeshSource } from './mesh-source';
import { cornersOf, joinBoxes, scale, type Box, type Triple } from './vectors';

const meshBoxes = new WeakMap<object, Box>();

/** A solid's box in its own frame; null for a mesh of which nothing is known yet. */
export function shapeBoxOf(shape: Shape, meshes: MeshSource): Box | null {
  if (shape.kind === 'box') return around(scale(shape.size, 0.5));
  if (shape.kind === 'cylinder') return around([shape.diameter / 2, shape.diameter / 2, shape.length / 2]);
  const found = meshes.get(shape.mesh);
  if (found === undefined) return null;
  const box = found.state === 'ready' ? pointsBox(found.mesh) : found.box;
  return box === null ? null : { low: scale(box.low, shape.scale), high: scale(box.high, shape.scale) };
}

const around = (half: Triple): Box => ({ low: scale(half, -1), high: half });

function pointsBox(mesh: { readonly positions: Float32Array }): Box {
  const kept = meshBoxes.get(mesh);
  if (kept !== undefined) return kept;
  const low: [number, number, number] = [Infinity, Infinity, Infinity];
  const high: [number, number, number] = [-Infinity, -Infinity, -Infinity];
  for (let i = 0; i < mesh.positions.length; i += 1) {
    low[i % 3] = Math.min(low[i % 3]!, mesh.positions[i]!);
    high[i % 3] = Math.max(high[i % 3]!, mesh.positions[i]!);
  }
  const box = { low, high };
  meshBoxes.set(mesh, box);
  return box;
}

/** The box of a placed shape. A cylinder's is exact, a mesh's that of its own box's corners. */
function placedBox(shape: Shape, own: Box, pose: Rigid): Box {
  if (shape.kind === 'cylinder') {
    const at: Triple = [pose[3]!, pose[7]!, pose[11]!];
    const reach = [0, 4, 8].map((row) => {
      const axis = pose[row + 2]!;
      return (Math.abs(axis) * shape.length) / 2 + (Math.sqrt(Math.max(0, 1 - axis * axis)) * shape.diameter) / 2;
    });
    return {
      low: [at[0] - reach[0]!, at[1] - reach[1]!, at[2] - reach[2]!],
      high: [at[0] + reach[0]!, at[1] + reach[1]!, at[2] + reach[2]!],
    };
  }
  const corners = cornersOf(own).map((p) => applyRigid(pose, p));
  return joinBoxes(corners.map((p) => ({ low: p, high: p })))!;
}

/** A component's box with its frame placed by `frame`. */
export function solidsBox(solids: readonly Solid[], frame: Rigid, meshes: MeshSource): Box | null {
  return joinBoxes(
    solids.flatMap((solid) => {
      const own = shapeBoxOf(solid.shape, meshes);
      const pose = composeRigid(frame, rigidFromPose(solid.pose?.at, solid.pose?.turn));
      return own === null ? [] : [placedBox(solid.shape, own, pose)];
    }),
  );
}

/** A component's box in the car, at rest. */
export function componentBox(scene: Scene, component: Component, meshes: MeshSource): Box | null {
  return solidsBox(component.solids, worldPose(scene, component), meshes);
}

/** The box of some or all components; null for an empty scene. */
export function sceneBox(scene: Scene, meshes: MeshSource, ids?: ReadonlySet<string>): Box | null {
  return joinBoxes(
    scene.components.flatMap((c) => {
      if (ids !== undefined && !ids.has(c.id)) return [];
      const box = componentBox(scene, c, meshes);
      return box === null ? [] : [box];
    }),
  );
}
