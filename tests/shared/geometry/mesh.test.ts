// Welding, judging and containment: what is a body, what is a sheet, and what lies inside.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { indexMesh, isInside, meshExtent, meshFromSoup, meshShape, windingNumber, type Mesh } from '#shared/geometry';
import {
  angleSoup,
  blockSoup,
  boxSoup,
  invertedSoup,
  movedSoup,
  squareSoup,
  torusSoup,
  tubeSoup,
  type Soup,
} from '../../fixtures/soups';

function meshOf(soup: Soup): Mesh {
  const made = meshFromSoup(Float64Array.from(soup, (x) => x + 0));
  if (!made.ok) throw new Error(made.reason);
  return made.mesh;
}
const shapeOf = (soup: Soup, scale = 1): ReturnType<typeof meshShape> => meshShape(indexMesh(meshOf(soup)), scale);

describe('welding', () => {
  test('a block of 36 corners becomes one of 8', () => {
    const mesh = meshOf(boxSoup(2, 3, 4));
    expect([mesh.corners.length / 3, mesh.triangles.length / 3, mesh.kind, mesh.badEdges]).toEqual([8, 12, 'body', 0]);
    expect(meshExtent(mesh)).toEqual({ low: [-1, -1.5, -2], high: [1, 1.5, 2] });
  });

  test('negative zero is zero once read', () => {
    const soup = blockSoup([0, 0, 0], [1, 1, 1]).map((x, k) => (x === 0 && k % 2 === 0 ? -0 : x));
    expect(meshOf(soup).kind).toBe('body');
  });

  test('corners that differ in the last bit are not one', () => {
    const soup = boxSoup(2, 2, 2);
    soup[0] = -1 - Number.EPSILON;
    const mesh = meshOf(soup);
    expect([mesh.corners.length / 3, mesh.kind]).toEqual([9, 'sheet']);
  });

  test('triangles with fewer than three different corners and exact repeats are dropped', () => {
    const soup = boxSoup(2, 2, 2);
    const repeat = [...soup.slice(3, 9), ...soup.slice(0, 3)];
    const mesh = meshOf([...soup, ...repeat, 1, 1, 1, 1, 1, 1, -1, 1, 1, 0, 0, 0, 0, 0, 0, 0, 0, 0]);
    expect([mesh.droppedRepeats, mesh.droppedDegenerate, mesh.kind, mesh.corners.length / 3]).toEqual([
      1,
      2,
      'body',
      8,
    ]);
  });

  test('the same triangle turned the other way is no repeat', () => {
    const mesh = meshOf([...squareSoup(2, 2), ...invertedSoup(squareSoup(2, 2))]);
    // each edge of the square once in each direction, the diagonal twice in each
    expect([mesh.droppedRepeats, mesh.kind, mesh.badEdges]).toEqual([0, 'sheet', 1]);
  });

  test('flat but not degenerate: corners in a line are three different corners', () => {
    expect(meshOf([0, 0, 0, 1, 0, 0, 2, 0, 0]).triangles.length).toBe(3);
  });

  test('nothing left is refused', () => {
    const made = meshFromSoup(Float64Array.from([1, 1, 1, 1, 1, 1, 2, 2, 2]));
    expect(made).toEqual({ ok: false, reason: expect.stringMatching(/no triangle is left/) as string });
  });
});

describe('body or sheet', () => {
  test.each([
    ['a block', boxSoup(1, 2, 3), 'body', 0, 1],
    ['an inverted block', invertedSoup(boxSoup(1, 2, 3)), 'body', 0, 1],
    ['an angle bracket', angleSoup(30, 5, 20), 'body', 0, 1],
    ['a torus', torusSoup(10, 3, 24, 12), 'body', 0, 1],
    ['two blocks in one file', [...boxSoup(1, 1, 1), ...movedSoup(boxSoup(1, 1, 1), [5, 0, 0])], 'body', 0, 2],
    ['a square', squareSoup(1, 1), 'sheet', 4, 1],
    ['a block without one triangle', boxSoup(1, 1, 1).slice(9), 'sheet', 3, 1],
    [
      'a block with one triangle turned',
      [...invertedSoup(boxSoup(1, 1, 1).slice(0, 9)), ...boxSoup(1, 1, 1).slice(9)],
      'sheet',
      3,
      1,
    ],
    [
      'two blocks that share an edge',
      [...blockSoup([0, 0, 0], [1, 1, 1]), ...blockSoup([1, 1, 0], [2, 2, 1])],
      'sheet',
      1,
      1,
    ],
    [
      'two blocks that share a corner',
      [...blockSoup([0, 0, 0], [1, 1, 1]), ...blockSoup([1, 1, 1], [2, 2, 2])],
      'body',
      0,
      1,
    ],
    ['a block and a square', [...boxSoup(1, 1, 1), ...movedSoup(squareSoup(1, 1), [9, 9, 9])], 'sheet', 4, 2],
  ] as const)('%s', (_, soup, kind, badEdges, shells) => {
    const mesh = meshOf([...soup]);
    expect([mesh.kind, mesh.badEdges, mesh.shellCorners.length]).toEqual([kind, badEdges, shells]);
  });

  test('the verdict does not hang on the order of triangles or where each begins (seed 41)', () => {
    const soup = [...angleSoup(30, 5, 20), ...movedSoup(boxSoup(1, 1, 1).slice(9), [100, 0, 0])];
    const plain = meshOf(soup);
    const count = soup.length / 9;
    fc.assert(
      fc.property(
        fc.shuffledSubarray(
          Array.from({ length: count }, (_, i) => i),
          { minLength: count, maxLength: count },
        ),
        fc.array(fc.integer({ min: 0, max: 2 }), { minLength: count, maxLength: count }),
        (order, turns) => {
          const mixed = order.flatMap((t, i) => {
            const c = [0, 1, 2].map((k) => soup.slice(9 * t + 3 * k, 9 * t + 3 * k + 3));
            return [0, 1, 2].flatMap((k) => c[(k + turns[i]!) % 3]!);
          });
          const mesh = meshOf(mixed);
          expect([mesh.kind, mesh.badEdges, mesh.corners.length, mesh.shellCorners.length]).toEqual([
            plain.kind,
            plain.badEdges,
            plain.corners.length,
            plain.shellCorners.length,
          ]);
        },
      ),
      { seed: 41, numRuns: 100 },
    );
  });
});

describe('inside', () => {
  const wall = [...boxSoup(20, 20, 20), ...invertedSoup(boxSoup(10, 10, 10))];
  const double = [...boxSoup(20, 20, 20), ...boxSoup(10, 10, 10)];
  test.each([
    ['a block', boxSoup(20, 20, 20), [true, true, false]],
    ['an inverted block', invertedSoup(boxSoup(20, 20, 20)), [true, true, false]],
    ['a hollow block: its inner shell turned inward', wall, [false, true, false]],
    ['two nested shells turned alike', double, [true, true, false]],
    ['three nested shells', [...wall, ...boxSoup(2, 2, 2)], [true, true, false]],
    ['an open block has no inside', boxSoup(20, 20, 20).slice(9), [false, false, false]],
  ] as const)('%s: in the middle, in the outer wall, outside', (_, soup, expected) => {
    const shape = shapeOf([...soup]);
    expect([isInside(shape, [0.3, 0.2, 0.1]), isInside(shape, [7.3, 0.2, 0.1]), isInside(shape, [11, 0, 0])]).toEqual(
      expected,
    );
  });

  test('a torus: in the tube, in its hole, outside; at any scale', () => {
    for (const scale of [1, 25.4, 1000]) {
      const shape = shapeOf(torusSoup(10, 3, 48, 24), scale);
      expect(isInside(shape, [10 * scale, 0, 0])).toBe(true);
      expect(isInside(shape, [0, 0, 0])).toBe(false);
      expect(isInside(shape, [10 * scale, 0, 3.1 * scale])).toBe(false);
    }
  });

  test('the winding number counts how often a body goes round (seed 42)', () => {
    const block = shapeOf(boxSoup(2, 4, 6));
    const inverted = shapeOf(invertedSoup(boxSoup(2, 4, 6)));
    const c = fc.double({ min: -5, max: 5, noNaN: true });
    fc.assert(
      fc.property(c, c, c, (x, y, z) => {
        const d = Math.max(Math.abs(x) - 1, Math.abs(y) - 2, Math.abs(z) - 3);
        fc.pre(Math.abs(d) > 1e-6);
        expect(windingNumber(block, [x, y, z])).toBeCloseTo(d < 0 ? 1 : 0, 9);
        expect(windingNumber(inverted, [x, y, z])).toBeCloseTo(d < 0 ? -1 : 0, 9);
      }),
      { seed: 42, numRuns: 500 },
    );
  });

  test('the solid angle of a square seen from above its middle, by its closed form', () => {
    // 4 asin(1 / (1 + h²/a²)) for half side a at height h, divided by 4 pi
    const square = shapeOf(squareSoup(2, 2));
    for (const h of [0.1, 0.5, 1, 3]) {
      expect(Math.abs(windingNumber(square, [0, 0, h]))).toBeCloseTo(Math.asin(1 / (1 + h * h)) / Math.PI, 12);
    }
  });

  test('a tube of 4,000 facets is a body and knows its inside', () => {
    const shape = shapeOf(tubeSoup(50, 100, 4000));
    expect(shape.body).toBe(true);
    expect([isInside(shape, [49.9, 0, 49.9]), isInside(shape, [50.1, 0, 0]), isInside(shape, [0, 0, 50.1])]).toEqual([
      true,
      false,
      false,
    ]);
  });
});
