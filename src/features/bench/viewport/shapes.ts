// What a solid looks like: a surface to fill and lines to scribe, in the solid's own frame, mm.
import type { Solid } from '#shared/scene';
import type { Rigid } from '#shared/units';
import type { Drawn, Scribe, Surface } from './drawn';
import { drawnMesh } from './drawn-mesh';
import type { MeshSource } from './mesh-source';
import { add, centreOf, scale, sizeOf, type Triple } from './vectors';

/** A mesh that is not there yet shows as its box; null where not even that is known. */
export function drawnSolid(solid: Solid, meshes: MeshSource): Drawn | null {
  const { shape } = solid;
  if (shape.kind === 'box') return drawnBox(shape.size);
  if (shape.kind === 'cylinder') return drawnCylinder(shape.diameter / 2, shape.length);
  const found = meshes.get(shape.mesh);
  if (found?.state === 'ready') return drawnMesh(found.mesh, shape.scale);
  const box = found?.box;
  if (box === undefined || box === null) return null;
  return drawnBox(scale(sizeOf(box), shape.scale), scale(centreOf(box), shape.scale));
}

const FACES: readonly (readonly [number, number, number])[] = [
  [1, 0, 0],
  [-1, 0, 0],
  [0, 1, 0],
  [0, -1, 0],
  [0, 0, 1],
  [0, 0, -1],
];

export function drawnBox(size: Triple, centre: Triple = [0, 0, 0]): Drawn {
  const half = scale(size, 0.5);
  const positions: number[] = [];
  const normals: number[] = [];
  const index: number[] = [];
  for (const n of FACES) {
    const axis = n.findIndex((x) => x !== 0);
    const sign = n[axis]!;
    const [u, v] = [(axis + 1) % 3, (axis + 2) % 3];
    const at = positions.length / 3;
    for (const [a, b] of [
      [-1, -1],
      [1, -1],
      [1, 1],
      [-1, 1],
    ] as const) {
      const p: [number, number, number] = [0, 0, 0];
      p[axis] = sign * half[axis]!;
      // the way round follows the sign, so that every face looks outwards
      p[u] = a * sign * half[u]!;
      p[v] = b * half[v]!;
      positions.push(...add(p, centre));
      normals.push(...n);
    }
    index.push(at, at + 1, at + 2, at, at + 2, at + 3);
  }
  return { surface: surfaceOf(positions, normals, index), scribe: boxScribe(half, centre), closed: true };
}

function boxScribe(half: Triple, centre: Triple): Scribe {
  const ends: number[] = [];
  for (let axis = 0; axis < 3; axis += 1) {
    const [u, v] = [(axis + 1) % 3, (axis + 2) % 3];
    for (const a of [-1, 1]) {
      for (const b of [-1, 1]) {
        for (const along of [-1, 1]) {
          const p: [number, number, number] = [0, 0, 0];
          p[axis] = along * half[axis]!;
          p[u] = a * half[u]!;
          p[v] = b * half[v]!;
          ends.push(...add(p, centre));
        }
      }
    }
  }
  const extents = new Float32Array(ends.length / 6).fill(2 * Math.max(...half));
  return { ends: Float32Array.from(ends), normals: new Float32Array(ends.length), extents };
}

/** Enough facets that none is seen, whatever the size. */
const facetsOf = (radius: number): number => Math.min(128, Math.max(32, 8 * Math.ceil(Math.sqrt(radius) * 1.1)));

export function drawnCylinder(radius: number, length: number): Drawn {
  const n = facetsOf(radius);
  const positions: number[] = [];
  const normals: number[] = [];
  const index: number[] = [];
  const ends: number[] = [];
  const beside: number[] = [];
  const h = length / 2;
  const turn = (i: number): readonly [number, number] => [
    Math.cos((2 * Math.PI * i) / n),
    Math.sin((2 * Math.PI * i) / n),
  ];
  for (let i = 0; i < n; i += 1) {
    const [c, s] = turn(i);
    positions.push(c * radius, s * radius, -h, c * radius, s * radius, h);
    normals.push(c, s, 0, c, s, 0);
    const a = 2 * i;
    const b = 2 * ((i + 1) % n);
    index.push(a, b, a + 1, b, b + 1, a + 1);
    // the side's lines stand for the outline; the two rims are always there
    const [before, after] = [turn(i - 0.5), turn(i + 0.5)];
    ends.push(c * radius, s * radius, -h, c * radius, s * radius, h);
    beside.push(...before, 0, ...after, 0);
  }
  for (const end of [-1, 1]) {
    const at = positions.length / 3;
    positions.push(0, 0, end * h);
    normals.push(0, 0, end);
    for (let i = 0; i < n; i += 1) {
      const [c, s] = turn(i);
      positions.push(c * radius, s * radius, end * h);
      normals.push(0, 0, end);
      const [a, b] = [at + 1 + i, at + 1 + ((i + 1) % n)];
      if (end > 0) index.push(at, a, b);
      else index.push(at, b, a);
      const [c2, s2] = turn(i + 1);
      ends.push(c * radius, s * radius, end * h, c2 * radius, s2 * radius, end * h);
      beside.push(0, 0, 0, 0, 0, 0);
    }
  }
  return {
    surface: surfaceOf(positions, normals, index),
    scribe: {
      ends: Float32Array.from(ends),
      normals: Float32Array.from(beside),
      extents: new Float32Array(ends.length / 6).fill(Math.max(2 * radius, length)),
    },
    closed: true,
  };
}

const surfaceOf = (positions: number[], normals: number[], index: number[]): Surface => ({
  positions: Float32Array.from(positions),
  normals: Float32Array.from(normals),
  index: Uint32Array.from(index),
});

/** Puts several solids, each placed in one frame, into one drawing. */
export function mergeDrawn(parts: readonly { readonly drawn: Drawn; readonly pose: Rigid }[]): Drawn {
  const total = (of: (d: Drawn) => number): number => parts.reduce((sum, p) => sum + of(p.drawn), 0);
  const positions = new Float32Array(total((d) => d.surface.positions.length));
  const normals = new Float32Array(positions.length);
  const index = new Uint32Array(total((d) => d.surface.index.length));
  const ends = new Float32Array(total((d) => d.scribe.ends.length));
  const beside = new Float32Array(ends.length);
  const extents = new Float32Array(ends.length / 6);
  let corner = 0;
  let triangle = 0;
  let line = 0;
  for (const { drawn, pose } of parts) {
    const { surface, scribe } = drawn;
    place(surface.positions, pose, 1, positions, corner);
    place(surface.normals, pose, 0, normals, corner);
    for (let i = 0; i < surface.index.length; i += 1) index[triangle + i] = surface.index[i]! + corner / 3;
    place(scribe.ends, pose, 1, ends, line);
    place(scribe.normals, pose, 0, beside, line);
    extents.set(scribe.extents, line / 6);
    corner += surface.positions.length;
    triangle += surface.index.length;
    line += scribe.ends.length;
  }
  return {
    surface: { positions, normals, index },
    scribe: { ends, normals: beside, extents },
    closed: parts.every((p) => p.drawn.closed),
  };
}

/** `w` 1 for points, 0 for directions. */
function place(from: Float32Array, m: Rigid, w: 0 | 1, to: Float32Array, at: number): void {
  for (let i = 0; i < from.length; i += 3) {
    const [x, y, z] = [from[i]!, from[i + 1]!, from[i + 2]!];
    to[at + i] = m[0]! * x + m[1]! * y + m[2]! * z + w * m[3]!;
    to[at + i + 1] = m[4]! * x + m[5]! * y + m[6]! * z + w * m[7]!;
    to[at + i + 2] = m[8]! * x + m[9]! * y + m[10]! * z + w * m[11]!;
  }
}
