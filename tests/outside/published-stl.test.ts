// Files that others wrote, from packages on npm (stl-models 0.12.0, stl 1.1.1, bunny 1.0.1, teapot 1.0.0), against the
// figures counted from their bytes. Layout: 80 bytes of header, uint32 count, 50 bytes a facet.
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import { loadedMesh, prepareScene } from '#shared/check';
import { loadScene, type Scene } from '#shared/scene';
import { meshExtent, meshFromSoup, meshFromStl, type Mesh } from '#shared/geometry';

const MODULES = path.resolve(import.meta.dirname, '../../node_modules');
const read = (file: string): ReturnType<typeof meshFromStl> => meshFromStl(readFileSync(path.join(MODULES, file)));
function meshOf(file: string): Mesh {
  const result = read(file);
  if (!result.ok) throw new Error(result.reason);
  return result.mesh;
}

/** Volume by the divergence theorem, and area. */
function measures({ corners, triangles }: Mesh): { volume: number; area: number } {
  let volume = 0;
  let area = 0;
  for (let k = 0; k < triangles.length; k += 3) {
    const [a, b, c] = [0, 1, 2].map((i) => [...corners.subarray(3 * triangles[k + i]!, 3 * triangles[k + i]! + 3)]) as [
      number[],
      number[],
      number[],
    ];
    const cross = (p: number[], q: number[]): number[] => [
      p[1]! * q[2]! - p[2]! * q[1]!,
      p[2]! * q[0]! - p[0]! * q[2]!,
      p[0]! * q[1]! - p[1]! * q[0]!,
    ];
    const minus = (p: number[], q: number[]): number[] => p.map((x, i) => x - q[i]!);
    volume += cross(b, c).reduce((sum, x, i) => sum + x * a[i]!, 0) / 6;
    area += Math.hypot(...cross(minus(b, a), minus(c, a))) / 2;
  }
  return { volume, area };
}

/** Edges that one triangle alone has. */
function openEdges({ triangles }: Pick<Mesh, 'triangles'>): number {
  const uses = new Map<string, number>();
  for (let k = 0; k < triangles.length; k += 1) {
    const [a, b] = [triangles[k]!, triangles[k % 3 === 2 ? k - 2 : k + 1]!];
    const key = `${Math.min(a, b)} ${Math.max(a, b)}`;
    uses.set(key, (uses.get(key) ?? 0) + 1);
  }
  return [...uses.values()].filter((n) => n === 1).length;
}

const size = (mesh: Mesh): number[] => {
  const { low, high } = meshExtent(mesh);
  return high.map((x, k) => x - low[k]!);
};

describe('good files', () => {
  test.each([
    ['stl-models/polytopes/cube.bin.stl', 12, 8, [2, 2, 2], 8],
    ['stl-models/polytopes/unitCube.binary.stl', 12, 8, [1, 1, 1], 1],
    ['stl-models/polytopes/cubeLarge.ascii.stl', 12, 8, [100, 100, 100], 1_000_000],
    ['stl-models/polytopes/tetrahedron.ascii.stl', 4, 4, [1, 1, 1], 1 / 6],
    ['stl-models/polytopes/tetrahedron.bin.stl', 4, 4, [1, 1, 1], 1 / 6],
    ['stl-models/polytopes/tetrahedronIrregular.bin.stl', 4, 4, [3, 2, 1], 1],
    // binary although its header begins with "solid"
    ['stl-models/broken/wrongHeader.bin.stl', 12, 8, [100, 100, 100], 1_000_000],
    ['stl/test/binary/cube-20mm-with-hole.stl', 32, 16, [20, 20, 10], 3000],
  ])('%s', (file, triangles, corners, extent, volume) => {
    const mesh = meshOf(file);
    expect([mesh.triangles.length / 3, mesh.corners.length / 3, mesh.kind, mesh.badEdges]).toEqual([
      triangles,
      corners,
      'body',
      0,
    ]);
    size(mesh).forEach((x, k) => expect(x).toBeCloseTo(extent[k]!, 5));
    expect(measures(mesh).volume / volume).toBeCloseTo(1, 5);
  });

  test('areas', () => {
    expect(measures(meshOf('stl-models/polytopes/tetrahedron.bin.stl')).area).toBeCloseTo(2.366025, 5);
    expect(measures(meshOf('stl-models/polytopes/tetrahedronIrregular.bin.stl')).area).toBeCloseTo(9, 5);
    expect(measures(meshOf('stl/test/binary/cube-20mm-with-hole.stl')).area).toBeCloseTo(1800, 3);
  });

  test('a gearwheel: closed, one hole, 2,444 triangles on 1,222 corners, 8,922.637', () => {
    const mesh = meshOf('stl-models/objects/gearwheel.bin.stl');
    expect([mesh.triangles.length / 3, mesh.corners.length / 3, mesh.kind]).toEqual([2444, 1222, 'body']);
    expect(measures(mesh).volume).toBeCloseTo(8922.637, 2);
  });

  test('a scan of 69,451 triangles with 223 open edges is a sheet', () => {
    const mesh = meshOf('stl-models/objects/bunny.bin.stl');
    expect([mesh.triangles.length / 3, mesh.corners.length / 3, mesh.kind]).toEqual([69_451, 34_834, 'sheet']);
    expect(mesh.badEdges).toBe(223);
  });

  test('text with a blank before "solid", text with CRLF, an inverted open mesh', () => {
    expect(meshOf('stl/test/ascii/teapot.stl').kind).toBe('sheet');
    const base = meshOf('stl/test/ascii/effector_base.stl');
    expect([base.triangles.length / 3, base.corners.length / 3, base.badEdges]).toEqual([796, 383, 6]);
    expect(measures(base).volume).toBeCloseTo(33_646.1, 0);
    const shark = meshOf('stl/test/binary/shark.stl');
    expect([shark.triangles.length / 3, shark.corners.length / 3, openEdges(shark)]).toEqual([1699, 900, 97]);
    // edges used more than twice, or twice in one direction, are bad as well
    expect(shark.badEdges).toBeGreaterThanOrEqual(97);
    expect(measures(shark).volume).toBeLessThan(0);
  });

  test.each([
    'broken/notANumberNormal.ascii.stl',
    'broken/missingNormal.ascii.stl',
    'broken/wrongNormal.ascii.stl',
    'broken/wrongNormals.ascii.stl',
    'broken/solidNameMismatch.ascii.stl',
  ])('%s: normals and names may be wrong', (file) => {
    const mesh = meshOf(`stl-models/${file}`);
    expect([mesh.triangles.length / 3, mesh.kind]).toEqual([4, 'body']);
  });
});

describe('bad files', () => {
  test.each([
    ['broken/fourVertices.ascii.stl', /exactly three corners/],
    ['broken/quad.ascii.stl', /exactly three corners/],
    ['broken/twoVertices.ascii.stl', /exactly three corners/],
    ['broken/missingEndsolid.ascii.stl', /endsolid/],
    ['broken/incorrectFaceCounter.bin.stl', /truncated/],
    ['broken/empty.stl', /./],
    ['misc/faceless.ascii.stl', /no triangle/],
  ])('%s is refused', (file, reason) => {
    const result = read(`stl-models/${file}`);
    expect(result.ok).toBe(false);
    if (!result.ok) expect(result.reason).toMatch(reason);
  });
});

test('a binary file that was corrupted as text has corners 1e29 away: refused by the limit of 100 m', () => {
  const mesh = meshOf('stl-models/misc/multiWordName.bin.stl');
  const { scene } = loadScene({
    format: 'gapwright-scene',
    version: 1,
    name: 'Corrupted',
    components: [
      {
        id: 'part',
        name: 'Part',
        category: 'other',
        solids: [{ id: 'scan', shape: { kind: 'mesh', mesh: 'a.stl', scale: 1 } }],
      },
    ],
  }) as { scene: Scene };
  const prepared = prepareScene(scene, new Map([['a.stl', loadedMesh(mesh, '')]]));
  expect(prepared).toEqual({
    ok: false,
    refusal: {
      path: 'components[0].solids[0].shape',
      reason: 'a corner lies more than 100 m from the origin of its own frame',
    },
  });
});

describe('meshes from arrays', () => {
  const load = createRequire(import.meta.url);
  const soupOf = (name: string): Float64Array => {
    const { positions, cells } = load(name) as { positions: number[][]; cells: number[][] };
    return Float64Array.from(
      cells.flat().flatMap((i) => positions[i]!),
      (x) => x + 0,
    );
  };
  test('a closed scan: 3,674 triangles, 1,839 corners, volume 194.288', () => {
    const made = meshFromSoup(soupOf('bunny'));
    if (!made.ok) throw new Error(made.reason);
    expect([made.mesh.triangles.length / 3, made.mesh.corners.length / 3, made.mesh.kind]).toEqual([
      3674,
      1839,
      'body',
    ]);
    expect(Math.abs(measures(made.mesh).volume)).toBeCloseTo(194.288, 2);
  });
  test('an open one: 992 triangles; its arrays count 528 open edges, welding closes most of them', () => {
    const { cells } = load('teapot') as { cells: number[][] };
    const made = meshFromSoup(soupOf('teapot'));
    if (!made.ok) throw new Error(made.reason);
    expect(openEdges({ triangles: Uint32Array.from(cells.flat()) })).toBe(528);
    expect([made.mesh.triangles.length / 3, made.mesh.kind]).toEqual([992, 'sheet']);
    expect(openEdges(made.mesh)).toBeLessThan(528);
  });
});
