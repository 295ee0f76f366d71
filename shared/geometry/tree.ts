// The bounding volume tree of a mesh. three-mesh-bvh decides how the triangles are divided; the boxes themselves are then
// computed here in double precision from the corners, so that a box really holds its triangles and a bound drawn from
// it is a proof. (The library keeps its boxes in single precision, and its 16-bit leaf counts overflow on a mesh with
// more than 65,535 triangles around one point: leaves are therefore told apart by where the next one begins.)
import { BufferAttribute, BufferGeometry } from 'three';
import { CENTER, MeshBVH } from 'three-mesh-bvh';

/** Triangles a leaf holds at most. */
const LEAF_TRIANGLES = 8;

export interface Tree {
  /** Corner numbers, three a triangle, in the order of the leaves. */
  readonly triangles: Uint32Array;
  /**
   * For each node two numbers: an inner node has its right child's number (its left child is the next node) and 0; a
   * leaf has its first triangle and how many it holds.
   */
  readonly nodes: Uint32Array;
  /** For each node centre x, y, z and half size x, y, z; same unit and frame as the corners. */
  readonly boxes: Float64Array;
}

interface RawLeafOrder {
  readonly index: Uint32Array;
  readonly words: Uint32Array;
  readonly halves: Uint16Array;
}

/** Lets three-mesh-bvh divide the triangles; single precision is enough to decide who goes where. */
function divide(corners: Float64Array, triangles: Uint32Array): RawLeafOrder {
  let largest = 0;
  for (let i = 0; i < corners.length; i += 1) {
    const x = Math.abs(corners[i]!);
    if (x > largest) largest = x;
  }
  // brought to about one, because single precision overflows where a file has huge units
  const shrink = largest > 0 ? 1 / largest : 1;
  const single = new Float32Array(corners.length);
  for (let i = 0; i < corners.length; i += 1) single[i] = corners[i]! * shrink;
  const geometry = new BufferGeometry();
  geometry.setAttribute('position', new BufferAttribute(single, 3));
  geometry.setIndex(new BufferAttribute(triangles.slice(), 1));
  const bvh = new MeshBVH(geometry, { strategy: CENTER, targetLeafSize: LEAF_TRIANGLES, verbose: false });
  const { roots, index } = MeshBVH.serialize(bvh, { cloneBuffers: false });
  const root = roots[0];
  if (roots.length !== 1 || !(root instanceof ArrayBuffer) || !(index instanceof Uint32Array)) {
    throw new Error('the tree builder answered in an unknown form');
  }
  return { index, words: new Uint32Array(root), halves: new Uint16Array(root) };
}

/** Collects nodes; doubles as it grows. */
class NodeList {
  data = new Uint32Array(1024);
  count = 0;
  add(): number {
    if (2 * this.count === this.data.length) {
      const grown = new Uint32Array(this.data.length * 2);
      grown.set(this.data);
      this.data = grown;
    }
    this.count += 1;
    return this.count - 1;
  }
}

const LEAF = 0xffff;
const WORDS = 8;

/** Copies the divided order into our own nodes and halves what is still too large for a leaf. */
function copyNodes(raw: RawLeafOrder): NodeList {
  const list = new NodeList();
  const total = raw.index.length / 3;
  const rawCount = raw.words.length / WORDS;
  const starts = new Map<number, number>();
  let previous = -1;
  for (let node = 0; node < rawCount; node += 1) {
    if (raw.halves[node * 16 + 15] !== LEAF) continue;
    if (previous >= 0) starts.set(previous, raw.words[node * WORDS + 6]!);
    previous = node;
  }
  if (previous >= 0) starts.set(previous, total);

  const leaf = (first: number, count: number): void => {
    const node = list.add();
    if (count <= LEAF_TRIANGLES) {
      list.data[2 * node] = first;
      list.data[2 * node + 1] = count;
      return;
    }
    const half = count >> 1;
    leaf(first, half);
    list.data[2 * node] = list.count;
    leaf(first + half, count - half);
  };
  // depth at most the library's 40 plus the halving of one leaf: recursion is safe
  const copy = (rawNode: number): void => {
    if (raw.halves[rawNode * 16 + 15] === LEAF) {
      const first = raw.words[rawNode * WORDS + 6]!;
      leaf(first, starts.get(rawNode)! - first);
      return;
    }
    const node = list.add();
    copy(rawNode + 1);
    list.data[2 * node] = list.count;
    copy(rawNode + raw.words[rawNode * WORDS + 6]!);
  };
  copy(0);
  return list;
}

/** The boxes of all nodes from the corners, leaves first. */
function fitBoxes(corners: Float64Array, triangles: Uint32Array, nodes: Uint32Array): Float64Array {
  const count = nodes.length / 2;
  const low = new Float64Array(3 * count);
  const high = new Float64Array(3 * count);
  for (let node = count - 1; node >= 0; node -= 1) {
    const held = nodes[2 * node + 1]!;
    for (let k = 0; k < 3; k += 1) {
      let a = Infinity;
      let b = -Infinity;
      if (held > 0) {
        const first = 3 * nodes[2 * node]!;
        for (let i = first; i < first + 3 * held; i += 1) {
          const x = corners[3 * triangles[i]! + k]!;
          if (x < a) a = x;
          if (x > b) b = x;
        }
      } else {
        const left = 3 * (node + 1) + k;
        const right = 3 * nodes[2 * node]! + k;
        a = Math.min(low[left]!, low[right]!);
        b = Math.max(high[left]!, high[right]!);
      }
      low[3 * node + k] = a;
      high[3 * node + k] = b;
    }
  }
  const boxes = new Float64Array(6 * count);
  for (let node = 0; node < count; node += 1) {
    for (let k = 0; k < 3; k += 1) {
      const a = low[3 * node + k]!;
      const b = high[3 * node + k]!;
      const centre = a + (b - a) / 2;
      boxes[6 * node + k] = centre;
      // whichever side is farther after rounding
      boxes[6 * node + 3 + k] = Math.max(b - centre, centre - a);
    }
  }
  return boxes;
}

/**
 * Builds the tree of a mesh.
 * @param corners three numbers a corner, any unit
 * @param triangles three corner numbers a triangle; left as they are
 */
export function buildTree(corners: Float64Array, triangles: Uint32Array): Tree {
  const raw = divide(corners, triangles);
  const list = copyNodes(raw);
  const nodes = list.data.slice(0, 2 * list.count);
  return { triangles: raw.index, nodes, boxes: fitBoxes(corners, raw.index, nodes) };
}

/** The same tree with every length multiplied by `scale` (above 0). */
export function scaleTree(tree: Tree, scale: number): Tree {
  return scale === 1 ? tree : { ...tree, boxes: tree.boxes.map((x) => x * scale) };
}
