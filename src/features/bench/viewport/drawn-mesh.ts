// A mesh as it is drawn: smooth where it is round, sharp where it has an edge, its edges and outline scribed.
import type { DisplayMesh } from '#shared/api';
import type { Drawn, Scribe, Surface } from './drawn';

/** Faces that meet at less than this are one rounded surface: cosine of 32 degrees. */
const SMOOTH = Math.cos((32 * Math.PI) / 180);
/** Above this many triangles only edges are scribed, no outline: every line of a dense scan would have to be looked at. */
const MOST_FOR_OUTLINE = 30_000;
/** A scan whose every second line is an edge is noise, not edges. */
const MOST_EDGES = 0.18;

const kept = new WeakMap<DisplayMesh, Map<number, Drawn>>();

/** @param scale mm per unit of the file */
export function drawnMesh(mesh: DisplayMesh, scale: number): Drawn {
  const byScale = kept.get(mesh) ?? new Map<number, Drawn>();
  kept.set(mesh, byScale);
  let drawn = byScale.get(scale);
  if (drawn === undefined) {
    drawn = draw(mesh, scale);
    byScale.set(scale, drawn);
  }
  return drawn;
}

function draw(mesh: DisplayMesh, scale: number): Drawn {
  const points = mesh.positions.map((x) => x * scale);
  const faces = faceNormals(points, mesh.index);
  const edges = edgesOf(mesh.index, points.length / 3);
  return {
    surface: surfaceOf(points, mesh.index, faces),
    scribe: scribeOf(points, faces, edges, mesh.index.length / 3),
    closed: edges.open.length === 0,
  };
}

function faceNormals(p: Float32Array, index: Uint32Array): Float32Array {
  const out = new Float32Array(index.length);
  for (let t = 0; t < index.length; t += 3) {
    const [a, b, c] = [3 * index[t]!, 3 * index[t + 1]!, 3 * index[t + 2]!];
    const [ux, uy, uz] = [p[b]! - p[a]!, p[b + 1]! - p[a + 1]!, p[b + 2]! - p[a + 2]!];
    const [vx, vy, vz] = [p[c]! - p[a]!, p[c + 1]! - p[a + 1]!, p[c + 2]! - p[a + 2]!];
    const [x, y, z] = [uy * vz - uz * vy, uz * vx - ux * vz, ux * vy - uy * vx];
    const size = Math.hypot(x, y, z) || 1;
    out[t] = x / size;
    out[t + 1] = y / size;
    out[t + 2] = z / size;
  }
  return out;
}

/** Every corner of every triangle gets the mean of the faces around it that lie nearly as its own does. */
function surfaceOf(points: Float32Array, index: Uint32Array, faces: Float32Array): Surface {
  const corners = points.length / 3;
  const starts = new Uint32Array(corners + 1);
  for (const corner of index) starts[corner + 1]! += 1;
  for (let i = 0; i < corners; i += 1) starts[i + 1]! += starts[i]!;
  const around = new Uint32Array(index.length);
  const filled = starts.slice(0, corners);
  for (let k = 0; k < index.length; k += 1) {
    const corner = index[k]!;
    around[filled[corner]!] = Math.floor(k / 3) * 3;
    filled[corner]! += 1;
  }
  const positions = new Float32Array(index.length * 3);
  const normals = new Float32Array(index.length * 3);
  for (let k = 0; k < index.length; k += 1) {
    const corner = index[k]!;
    const own = Math.floor(k / 3) * 3;
    let [x, y, z] = [0, 0, 0];
    for (let i = starts[corner]!; i < starts[corner + 1]!; i += 1) {
      const f = around[i]!;
      const alike = faces[f]! * faces[own]! + faces[f + 1]! * faces[own + 1]! + faces[f + 2]! * faces[own + 2]!;
      if (alike < SMOOTH) continue;
      x += faces[f]!;
      y += faces[f + 1]!;
      z += faces[f + 2]!;
    }
    const size = Math.hypot(x, y, z) || 1;
    normals.set([x / size, y / size, z / size], 3 * k);
    positions.set([points[3 * corner]!, points[3 * corner + 1]!, points[3 * corner + 2]!], 3 * k);
  }
  return { positions, normals, index: Uint32Array.from({ length: index.length }, (_, i) => i) };
}

interface Edges {
  /** Corner, corner, face, face (places of their normals), four numbers an edge. */
  readonly shared: readonly number[];
  /** Corner, corner. */
  readonly open: readonly number[];
}

function edgesOf(index: Uint32Array, corners: number): Edges {
  const first = new Map<number, number>();
  const shared: number[] = [];
  for (let t = 0; t < index.length; t += 3) {
    for (let k = 0; k < 3; k += 1) {
      const a = index[t + k]!;
      const b = index[t + ((k + 1) % 3)]!;
      const key = a < b ? a * corners + b : b * corners + a;
      const other = first.get(key);
      if (other === undefined) {
        first.set(key, t);
      } else {
        first.delete(key);
        shared.push(a, b, other, t);
      }
    }
  }
  return { shared, open: [...first.keys()].flatMap((key) => [Math.floor(key / corners), key % corners]) };
}

function scribeOf(p: Float32Array, faces: Float32Array, edges: Edges, triangles: number): Scribe {
  const alike = (i: number): number => {
    const [f, g] = [edges.shared[i + 2]!, edges.shared[i + 3]!];
    return faces[f]! * faces[g]! + faces[f + 1]! * faces[g + 1]! + faces[f + 2]! * faces[g + 2]!;
  };
  const count = edges.shared.length / 4;
  let sharpest = SMOOTH;
  for (const limit of [SMOOTH, Math.cos((50 * Math.PI) / 180), -2]) {
    sharpest = limit;
    let sharp = 0;
    for (let i = 0; i < edges.shared.length; i += 4) if (alike(i) < limit) sharp += 1;
    if (sharp <= Math.max(200, count * MOST_EDGES)) break;
  }
  const withOutline = triangles <= MOST_FOR_OUTLINE;
  const ends: number[] = [];
  const normals: number[] = [];
  const line = (a: number, b: number): void => {
    ends.push(p[3 * a]!, p[3 * a + 1]!, p[3 * a + 2]!, p[3 * b]!, p[3 * b + 1]!, p[3 * b + 2]!);
  };
  for (let i = 0; i < edges.shared.length; i += 4) {
    const isSharp = alike(i) < sharpest;
    if (!isSharp && !withOutline) continue;
    line(edges.shared[i]!, edges.shared[i + 1]!);
    const [f, g] = [edges.shared[i + 2]!, edges.shared[i + 3]!];
    if (isSharp) normals.push(0, 0, 0, 0, 0, 0);
    else normals.push(faces[f]!, faces[f + 1]!, faces[f + 2]!, faces[g]!, faces[g + 1]!, faces[g + 2]!);
  }
  for (let i = 0; i < edges.open.length; i += 2) {
    line(edges.open[i]!, edges.open[i + 1]!);
    normals.push(0, 0, 0, 0, 0, 0);
  }
  return {
    ends: Float32Array.from(ends),
    normals: Float32Array.from(normals),
    extents: new Float32Array(ends.length / 6).fill(reachOf(p)),
  };
}

/** The longest side of the box around all points. */
function reachOf(p: Float32Array): number {
  let reach = 0;
  for (let k = 0; k < 3; k += 1) {
    let [low, high] = [Infinity, -Infinity];
    for (let i = k; i < p.length; i += 3) {
      low = Math.min(low, p[i]!);
      high = Math.max(high, p[i]!);
    }
    reach = Math.max(reach, high - low);
  }
  return reach;
}
