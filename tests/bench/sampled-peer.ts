// The peer: what people would write first with three-mesh-bvh alone. Every solid is a triangle mesh with a tree; every
// comparison of the check is done at 200 places of its motion by the library's own distance call. It proves nothing between
// the samples and does not see a part that lies inside another.
import { planCheck, type Prepared, type Task } from '#shared/check';
import { displacementAt, STILL, type Placed } from '#shared/geometry';
import { composeRigid, invertRigid, type Rigid } from '#shared/units';
import { BoxGeometry, BufferAttribute, BufferGeometry, CylinderGeometry, Matrix4, type Vector3 } from 'three';
import { MeshBVH, type HitPointInfo } from 'three-mesh-bvh';

const SAMPLES = 200;
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

function treeOf(placed: Placed): Tree {
  const geometry = geometryOf(placed);
  geometry.clearGroups();
  const bvh = new MeshBVH(geometry);
  geometry.boundsTree = bvh;
  return { geometry, bvh };
}

const matrixOf = (r: Rigid): Matrix4 =>
  new Matrix4().set(
    ...([r[0]!, r[1]!, r[2]!, r[3]!, r[4]!, r[5]!, r[6]!, r[7]!, r[8]!, r[9]!, r[10]!, r[11]!] as const),
    ...([0, 0, 0, 1] as const),
  );

/** The pairs of positions at which a comparison is sampled. */
function samplesOf(task: Task): (readonly [number, number])[] {
  const moving = [task.a.motion, task.b.motion].filter((m) => m !== null).length;
  if (moving === 0) return [[0, 0]];
  if (moving === 1) return Array.from({ length: SAMPLES }, (_, i) => [i / (SAMPLES - 1), i / (SAMPLES - 1)] as const);
  // every combination on a grid of about as many samples
  const side = Math.round(Math.sqrt(SAMPLES));
  return Array.from({ length: side * side }, (_, i) => [(i % side) / (side - 1), Math.floor(i / side) / (side - 1)]);
}

export class SampledPeer {
  private readonly trees = new Map<Placed, Tree>();

  /** Trees are built here, outside of what is timed. */
  constructor(private readonly prepared: Prepared) {
    const shapes = new Map<Placed['shape'], Tree>();
    for (const placed of prepared.components.flatMap((c) => c.solids)) {
      const tree = shapes.get(placed.shape) ?? treeOf(placed);
      shapes.set(placed.shape, tree);
      this.trees.set(placed, tree);
    }
  }

  /** Smallest distance that was sampled, for every comparison of the check, mm. */
  run(): Float64Array {
    const { tasks } = planCheck(this.prepared);
    return Float64Array.from(tasks, (task) => this.least(task));
  }

  private least(task: Task): number {
    const a = task.a.solids.map((i) => task.a.component.solids[i]!);
    const b = task.b.solids.map((i) => task.b.component.solids[i]!);
    const spare = { point: null, distance: 0, faceIndex: 0 } as unknown as HitPointInfo & { point: Vector3 };
    let best = Infinity;
    for (const [p, q] of samplesOf(task)) {
      const moveA = displacementAt(task.a.motion?.path ?? STILL, p);
      const moveB = displacementAt(task.b.motion?.path ?? STILL, q);
      for (const x of a) {
        const toA = invertRigid(composeRigid(moveA, x.pose));
        for (const y of b) {
          const matrix = matrixOf(composeRigid(toA, composeRigid(moveB, y.pose)));
          // what is farther than the best so far need not be worked out
          const found = this.trees
            .get(x)!
            .bvh.closestPointToGeometry(this.trees.get(y)!.geometry, matrix, spare, undefined, 0, best);
          if (found !== null && found.distance < best) best = found.distance;
        }
      }
    }
    return best;
  }
}
