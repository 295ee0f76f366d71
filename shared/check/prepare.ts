// From the document and its meshes to what the engine compares: shapes placed in the world, paths in the world.
import {
  boxShape,
  cylinderShape,
  indexMesh,
  meshShape,
  pathOf,
  shapeBox,
  STILL,
  type IndexedMesh,
  type Mesh,
  type MeshShape,
  type Path,
  type PathStep,
  type Placed,
} from '#shared/geometry';
import { worldPose, type Component, type Motion, type Scene, type Solid, type Step, type Vec3 } from '#shared/scene';
import { applyRigid, turnByRigid, type Rigid } from '#shared/units';
import type { MeshEntry } from './report';

/** A mesh that a document names, read and judged; `sha256` is of the file's bytes. */
export interface LoadedMesh {
  readonly indexed: IndexedMesh;
  readonly sha256: string;
  /** The mesh at so many mm per file unit; made once, as a live check prepares the same scene over and over. */
  readonly shapeAt: (scale: number) => MeshShape;
}

export function loadedMesh(mesh: Mesh, sha256: string): LoadedMesh {
  const indexed = indexMesh(mesh);
  const shapes = new Map<number, MeshShape>();
  const shapeAt = (scale: number): MeshShape => {
    const made = shapes.get(scale) ?? meshShape(indexed, scale);
    shapes.set(scale, made);
    return made;
  };
  return { indexed, sha256, shapeAt };
}

export interface PreparedMotion {
  readonly component: string;
  readonly motion: Motion;
  readonly path: Path;
  /** Places in the component's list of solids that move. */
  readonly solids: readonly number[];
}

export interface PreparedComponent {
  readonly component: Component;
  readonly solids: readonly Placed[];
  readonly solidIds: readonly string[];
  readonly operating: readonly PreparedMotion[];
  readonly service: readonly PreparedMotion[];
  /** Places of the solids that no operating motion moves. */
  readonly fixed: readonly number[];
}

export interface Prepared {
  readonly scene: Scene;
  readonly components: readonly PreparedComponent[];
  readonly meshes: readonly MeshEntry[];
  /**
   * What rounding is measured against, mm: no coordinate of anything at rest is larger. The next power of two, so that the
   * figures of a pair do not hang on how far away some third part is moved.
   */
  readonly largest: number;
}

export interface Refusal {
  readonly path: string;
  readonly reason: string;
}
export type PrepareResult =
  { readonly ok: true; readonly prepared: Prepared } | { readonly ok: false; readonly refusal: Refusal };

/** Farthest from an origin that a corner may lie, mm. */
const FARTHEST = 100_000;
/** Triangles that all placed meshes of a scene may have together. */
const MAX_SCENE_TRIANGLES = 10_000_000;

function unit(v: Vec3): Vec3 {
  // scaled by the largest part first, so that neither tiny nor huge directions lose their length
  const largest = Math.max(Math.abs(v[0]), Math.abs(v[1]), Math.abs(v[2]));
  const [x, y, z] = [v[0] / largest, v[1] / largest, v[2] / largest];
  const length = Math.sqrt(x * x + y * y + z * z);
  return [x / length, y / length, z / length];
}

function stepInWorld(step: Step, frame: Rigid): PathStep {
  if (step.kind === 'slide') {
    return { kind: 'slide', along: unit(turnByRigid(frame, unit(step.along))), from: step.from, to: step.to };
  }
  return {
    kind: 'swing',
    point: applyRigid(frame, step.point),
    axis: unit(turnByRigid(frame, unit(step.axis))),
    from: step.from,
    to: step.to,
  };
}

function prepareMotion(component: Component, motion: Motion, frame: Rigid): PreparedMotion {
  const solids = component.solids.flatMap((solid, i) =>
    motion.solids === undefined || motion.solids.includes(solid.id) ? [i] : [],
  );
  return { component: component.id, motion, path: pathOf(motion.steps.map((s) => stepInWorld(s, frame))), solids };
}

/** Largest coordinate of any corner of a placed shape; boxes and cylinders by the corners of their box. */
function farthestCorner(shape: Placed['shape'], pose: Rigid | null): number {
  let far = 0;
  const look = (x: number, y: number, z: number): void => {
    const p = pose === null ? ([x, y, z] as const) : applyRigid(pose, [x, y, z]);
    far = Math.max(far, Math.sqrt(p[0] * p[0] + p[1] * p[1] + p[2] * p[2]));
  };
  if (shape.kind === 'mesh') {
    // the eight corners of the mesh's box settle it for nearly every mesh; only a doubtful one is walked corner by corner
    const box = shapeBox(shape);
    eachBoxCorner(box, look);
    if (far <= FARTHEST) return far;
    far = 0;
    for (let i = 0; i < shape.corners.length; i += 3) {
      look(shape.corners[i]!, shape.corners[i + 1]!, shape.corners[i + 2]!);
    }
    return far;
  }
  eachBoxCorner(shapeBox(shape), look);
  return far;
}

function eachBoxCorner(box: Float64Array, look: (x: number, y: number, z: number) => void): void {
  for (let k = 0; k < 8; k += 1) {
    look(
      box[0]! + (k & 1 ? box[3]! : -box[3]!),
      box[1]! + (k & 2 ? box[4]! : -box[4]!),
      box[2]! + (k & 4 ? box[5]! : -box[5]!),
    );
  }
}

/** Builds shapes and counts the triangles of all placed meshes. */
class ShapeMaker {
  triangles = 0;
  constructor(private readonly meshes: ReadonlyMap<string, LoadedMesh>) {}

  make(solid: Solid): Placed['shape'] | string {
    const { shape } = solid;
    if (shape.kind === 'box') return boxShape(...shape.size);
    if (shape.kind === 'cylinder') return cylinderShape(shape.diameter, shape.length);
    const loaded = this.meshes.get(shape.mesh);
    if (loaded === undefined) return 'the mesh is missing';
    this.triangles += loaded.indexed.mesh.triangles.length / 3;
    return loaded.shapeAt(shape.scale);
  }
}

function prepareComponent(
  scene: Scene,
  component: Component,
  path: string,
  maker: ShapeMaker,
): { ok: true; made: PreparedComponent; largest: number } | { ok: false; refusal: Refusal } {
  const solids: Placed[] = [];
  let largest = 0;
  for (const [i, solid] of component.solids.entries()) {
    const where = `${path}.solids[${i}].shape`;
    const shape = maker.make(solid);
    if (typeof shape === 'string') return { ok: false, refusal: { path: `${where}.mesh`, reason: shape } };
    if (maker.triangles > MAX_SCENE_TRIANGLES) {
      const reason = `the scene's meshes have more than ${MAX_SCENE_TRIANGLES} triangles together`;
      return { ok: false, refusal: { path: `${where}.mesh`, reason } };
    }
    const own = farthestCorner(shape, null);
    const pose = worldPose(scene, component, solid);
    const world = farthestCorner(shape, pose);
    if (!(own <= FARTHEST) || !(world <= FARTHEST)) {
      const frame = own <= FARTHEST ? 'the car' : 'its own frame';
      const reason = `a corner lies more than 100 m from the origin of ${frame}`;
      return { ok: false, refusal: { path: where, reason } };
    }
    largest = Math.max(largest, own, world);
    solids.push({ shape, pose });
  }
  const frame = worldPose(scene, component);
  const motions = component.motions.map((m) => prepareMotion(component, m, frame));
  const operating = motions.filter((m) => m.motion.use === 'operating');
  const moved = new Set(operating.flatMap((m) => m.solids));
  return {
    ok: true,
    largest,
    made: {
      component,
      solids,
      solidIds: component.solids.map((s) => s.id),
      operating,
      service: motions.filter((m) => m.motion.use === 'service'),
      fixed: component.solids.flatMap((_, i) => (moved.has(i) ? [] : [i])),
    },
  };
}

/** The meshes of a scene in the order in which the document first names them. */
export function meshNames(scene: Scene): string[] {
  const names = new Set<string>();
  for (const c of scene.components) for (const s of c.solids) if (s.shape.kind === 'mesh') names.add(s.shape.mesh);
  return [...names];
}

function meshEntries(scene: Scene, meshes: ReadonlyMap<string, LoadedMesh>): MeshEntry[] {
  return meshNames(scene).flatMap((name) => {
    const loaded = meshes.get(name);
    if (loaded === undefined) return [];
    const { kind, triangles, badEdges } = loaded.indexed.mesh;
    return [{ mesh: name, sha256: loaded.sha256, kind, triangles: triangles.length / 3, badEdges }];
  });
}

function powerAbove(length: number): number {
  let power = 1024;
  while (power < length) power *= 2;
  return power;
}

/**
 * Makes a scene ready for the engine.
 * @param meshes by the name that the document uses
 * @returns the prepared scene, or the path and reason of the first mesh or solid that goes beyond the limits
 */
export function prepareScene(scene: Scene, meshes: ReadonlyMap<string, LoadedMesh>): PrepareResult {
  const maker = new ShapeMaker(meshes);
  const components: PreparedComponent[] = [];
  let largest = 0;
  for (const [i, component] of scene.components.entries()) {
    const result = prepareComponent(scene, component, `components[${i}]`, maker);
    if (!result.ok) return result;
    components.push(result.made);
    largest = Math.max(largest, result.largest);
  }
  return {
    ok: true,
    prepared: { scene, components, meshes: meshEntries(scene, meshes), largest: powerAbove(largest) },
  };
}

/** A side that stays: the chosen solids at rest. */
export function restingSide(c: PreparedComponent, solids: readonly number[]): { solids: Placed[]; path: Path } {
  return { solids: solids.map((i) => c.solids[i]!), path: STILL };
}
