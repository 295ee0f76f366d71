// The peer: what people would write first with three-mesh-bvh alone. What moves together is one triangle mesh with one tree;
// every comparison of the check is done at 200 places of its motion by the library's own distance call. It proves nothing
// between the samples, does not see a part that lies inside another, and gives neither spans nor push-outs.
import { planCheck, type Prepared, type Task } from '#shared/check';
import { displacementAt, STILL, type Placed } from '#shared/geometry';
import { composeRigid, invertRigid, type Rigid } from '#shared/units';
import { BoxGeometry, BufferAttribute, BufferGeometry, CylinderGeometry, Matrix4, Vector3 } from 'three';
import { mergeGeometries } from 'three/addons/utils/BufferGeometryUtils.js';
import { MeshBVH } from 'three-mesh-bvh';

export const SAMPLES = 200;
/** Facets of a cylinder; 64 keep a 50 mm tube round within 0.03 mm. */
const FACETS = 64;

interface Tree {
  readonly geometry: BufferGeometry;
  readonly bvh: MeshBVH;
}

function geometryOf({ shape }: Placed): BufferGeometry {
  if (shape.kind === 'box') return new BoxGeometry(2 * shape.half[0], 2 * shape.half[1], 2 * shape.half[2]);
  if (shape.kind === 'cylinder') {
    return new CylinderGeometry(shape.radius, shape.radius, 2 * shape.half, FACETS).rotateX(Math.PI / 2);
  }
  const geometry = new BufferGeometry();
  geometry.setAttribute('position', new BufferAttribute(Float32Array.from(shape.corners), 3));
  geometry.setIndex(new BufferAttribute(Uint32Array.from(shape.tree.triangles), 1));
  return geometry;
}

/** One mesh with one tree for all solids of a side, in the car at rest. */
function treeOf(solids: readonly Placed[]): Tree {
  const pieces = solids.map((placed) => {
    const geometry = geometryOf(placed);
    geometry.clearGroups();
    for (const name of Object.keys(geometry.attributes)) if (name !== 'position') geometry.deleteAttribute(name);
    return geometry.applyMatrix4(matrixOf(placed.pose));
  });
  const geometry = mergeGeometries(pieces);
  const bvh = new MeshBVH(geometry);
  geometry.boundsTree = bvh;
  return { geometry, bvh };
}

const matrixOf = (r: Rigid): Matrix4 =>
  new Matrix4().set(
    ...([r[0]!, r[1]!, r[2]!, r[3]!, r[4]!, r[5]!, r[6]!, r[7]!, r[8]!, r[9]!, r[10]!, r[11]!] as const),
    ...([0, 0, 0, 1] as const),
  );

/** The pairs of positions at which a comparison is sampled: every `stride`-th of 200. */
function samplesOf(task: Task, stride: number): (readonly [number, number])[] {
  return allSamplesOf(task).filter((_, i) => i % stride === 0);
}

function allSamplesOf(task: Task): (readonly [number, number])[] {
  const moving = [task.a.motion, task.b.motion].filter((m) => m !== null).length;
  if (moving === 0) return [[0, 0]];
  if (moving === 1) return Array.from({ length: SAMPLES }, (_, i) => [i / (SAMPLES - 1), i / (SAMPLES - 1)] as const);
  // every combination on a grid of about as many samples
  const side = Math.round(Math.sqrt(SAMPLES));
  return Array.from({ length: side * side }, (_, i) => [(i % side) / (side - 1), Math.floor(i / side) / (side - 1)]);
}

/** From the second side's frame to the first's, both at their positions. */
function between(task: Task, p: number, q: number): Matrix4 {
  const moveA = displacementAt(task.a.motion?.path ?? STILL, p);
  const moveB = displacementAt(task.b.motion?.path ?? STILL, q);
  return matrixOf(composeRigid(invertRigid(moveA), moveB));
}

export class SampledPeer {
  private readonly trees = new Map<string, Tree>();
  private readonly tasks: readonly Task[];

  /** Trees are built here, outside of what is timed. */
  constructor(prepared: Prepared) {
    this.tasks = planCheck(prepared).tasks;
    for (const task of this.tasks) {
      this.treeFor(task.a);
      this.treeFor(task.b);
    }
  }

  /** Smallest distance that was sampled, for every comparison of the check, mm. */
  distances(stride: number): Float64Array {
    return Float64Array.from(this.tasks, (task) => this.least(task, stride));
  }

  /** Whether any sample touches, for every comparison of the check. */
  contacts(): boolean[] {
    return this.tasks.map((task) => {
      const a = this.treeFor(task.a);
      const b = this.treeFor(task.b);
      return samplesOf(task, 1).some(([p, q]) => a.bvh.intersectsGeometry(b.geometry, between(task, p, q)));
    });
  }

  private treeFor({ component, solids }: Task['a']): Tree {
    const key = `${component.component.id} ${solids.join()}`;
    const tree = this.trees.get(key) ?? treeOf(solids.map((i) => component.solids[i]!));
    this.trees.set(key, tree);
    return tree;
  }

  private least(task: Task, stride: number): number {
    const a = this.treeFor(task.a);
    const b = this.treeFor(task.b);
    const spare = { point: new Vector3(), distance: 0, faceIndex: 0 };
    let best = Infinity;
    for (const [p, q] of samplesOf(task, stride)) {
      const matrix = between(task, p, q);
      // what is farther than the best so far need not be worked out
      const found = a.bvh.closestPointToGeometry(b.geometry, matrix, spare, undefined, 0, best) as {
        distance: number;
      } | null;
      if (found !== null && found.distance < best) best = found.distance;
    }
    return best;
  }
}
