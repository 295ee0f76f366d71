// A mesh as the kernel knows it: welded, judged (body or sheet) and counted. File units and the file's own frame.
import { readStl } from './stl';
import type { TriangleSoup } from './triangle-soup';
import { hashNumbers, tableSize, weld } from './weld';

export interface Mesh {
  /** Corners, three numbers each, file units. */
  readonly corners: Float64Array;
  /** Corner numbers, three a triangle. */
  readonly triangles: Uint32Array;
  /**
   * `body`: every edge is shared by exactly two triangles, once in each direction, so there is an inside.
   * `sheet`: anything else; only its surface counts.
   */
  readonly kind: 'body' | 'sheet';
  /** Edges that are not shared by exactly two triangles, once in each direction. */
  readonly badEdges: number;
  /** One corner number for each connected piece. */
  readonly shellCorners: Uint32Array;
  readonly droppedDegenerate: number;
  readonly droppedRepeats: number;
}

export type MeshResult = { readonly ok: true; readonly mesh: Mesh } | { readonly ok: false; readonly reason: string };

/** Counts the edges that break the rule of a body. */
function countBadEdges(triangles: Uint32Array): number {
  const mask = tableSize(triangles.length) - 1;
  const slots = new Int32Array(mask + 1).fill(-1);
  const low = new Uint32Array(triangles.length);
  const high = new Uint32Array(triangles.length);
  // uses in rising direction in the low 16 bits, in falling direction above; capped so that neither can spill over
  const uses = new Uint32Array(triangles.length);
  let n = 0;
  for (let k = 0; k < triangles.length; k += 1) {
    const from = triangles[k]!;
    const to = triangles[k % 3 === 2 ? k - 2 : k + 1]!;
    const a = from < to ? from : to;
    const b = from < to ? to : from;
    let slot = hashNumbers(a, b, 0) & mask;
    let edge = slots[slot]!;
    while (edge >= 0 && (low[edge] !== a || high[edge] !== b)) {
      slot = (slot + 1) & mask;
      edge = slots[slot]!;
    }
    if (edge < 0) {
      edge = n;
      n += 1;
      slots[slot] = edge;
      low[edge] = a;
      high[edge] = b;
    }
    const u = uses[edge]!;
    if (from < to) {
      if ((u & 0xffff) < 3) uses[edge] = u + 1;
    } else if (u >>> 16 < 3) uses[edge] = u + 0x10000;
  }
  let bad = 0;
  for (let e = 0; e < n; e += 1) if (uses[e] !== 0x10001) bad += 1;
  return bad;
}

/** One corner of each connected piece, by union of the corners that share a triangle. */
function findShells(corners: number, triangles: Uint32Array): Uint32Array {
  const parent = new Int32Array(corners);
  for (let i = 0; i < corners; i += 1) parent[i] = i;
  const root = (i: number): number => {
    let r = i;
    while (parent[r] !== r) {
      parent[r] = parent[parent[r]!]!;
      r = parent[r]!;
    }
    return r;
  };
  for (let k = 0; k < triangles.length; k += 3) {
    for (let j = 1; j < 3; j += 1) {
      const a = root(triangles[k]!);
      const b = root(triangles[k + j]!);
      // the smaller number leads, so that the result does not depend on the order of joining
      if (a < b) parent[b] = a;
      else if (b < a) parent[a] = b;
    }
  }
  const shells: number[] = [];
  for (let i = 0; i < corners; i += 1) if (root(i) === i) shells.push(i);
  return Uint32Array.from(shells);
}

/** Welds and judges loose triangles. Refused if nothing remains once degenerate ones and repeats are dropped. */
export function meshFromSoup(soup: TriangleSoup): MeshResult {
  const welded = weld(soup);
  if (welded.triangles.length === 0) {
    return { ok: false, reason: 'no triangle is left: all have fewer than three different corners' };
  }
  const badEdges = countBadEdges(welded.triangles);
  return {
    ok: true,
    mesh: {
      ...welded,
      kind: badEdges === 0 ? 'body' : 'sheet',
      badEdges,
      shellCorners: findShells(welded.corners.length / 3, welded.triangles),
    },
  };
}

/** Reads, welds and judges an STL file. */
export function meshFromStl(bytes: Uint8Array): MeshResult {
  const read = readStl(bytes);
  return read.ok ? meshFromSoup(read.soup) : read;
}

/** The mesh's extent in file units: lowest and highest coordinate along each axis. */
export function meshExtent(mesh: Mesh): { low: [number, number, number]; high: [number, number, number] } {
  const low: [number, number, number] = [Infinity, Infinity, Infinity];
  const high: [number, number, number] = [-Infinity, -Infinity, -Infinity];
  const { corners } = mesh;
  for (let i = 0; i < corners.length; i += 3) {
    for (let k = 0; k < 3; k += 1) {
      const x = corners[i + k]!;
      if (x < low[k]!) low[k] = x;
      if (x > high[k]!) high[k] = x;
    }
  }
  return { low, high };
}
