// Gaps of exact shapes by closed forms, in whole numbers (where faces lie in one plane and edges in one line) and in frames
// that hide it; and how far the two ends of an answer are apart where shapes are thin and long.
import fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  boxShape,
  cylinderShape,
  displacementAt,
  GapMeter,
  indexMesh,
  meshFromSoup,
  meshShape,
  pathOf,
  STILL,
  type Path,
  type Shape,
  type Side,
} from '#shared/geometry';
import { composeRigid, rigidFromPose, type Rigid } from '#shared/units';
import { boxSoup } from '../../fixtures/soups';

type Triple = readonly [number, number, number];
const meter = new GapMeter();
const side = (shape: Shape, pose: Rigid, path: Path = STILL): Side => ({ solids: [{ shape, pose }], path });
const fine = (lower: number, upper: number): boolean => upper - lower < 1e-9;

const whole = (low: number, high: number): fc.Arbitrary<number> => fc.integer({ min: low, max: high });
const triple = (c: fc.Arbitrary<number>): fc.Arbitrary<Triple> => fc.tuple(c, c, c);
const frames = fc.oneof(
  fc.constant(rigidFromPose()),
  fc
    .tuple(
      triple(fc.double({ min: -3000, max: 3000, noNaN: true })),
      triple(fc.double({ min: -180, max: 180, noNaN: true })),
    )
    .map(([at, turn]) => rigidFromPose(at, turn)),
);
function boxMesh(size: Triple): Shape {
  const made = meshFromSoup(Float64Array.from(boxSoup(...size)));
  if (!made.ok) throw new Error(made.reason);
  return meshShape(indexMesh(made.mesh), 1);
}

test('blocks along the axes, as boxes and as meshes, in any frame (seed 61)', () => {
  fc.assert(
    fc.property(
      triple(whole(1, 20)),
      triple(whole(1, 20)),
      triple(whole(-30, 30)),
      frames,
      whole(0, 3),
      (s, t, p, frame, kinds) => {
        const d = p.map((x, k) => Math.max(0, Math.abs(x) - (s[k]! + t[k]!) / 2));
        const exact = Math.hypot(...d);
        const a = side(kinds & 1 ? boxMesh(s) : boxShape(...s), frame);
        const b = side(kinds & 2 ? boxMesh(t) : boxShape(...t), composeRigid(frame, rigidFromPose(p)));
        const gap = meter.measure(a, b, fine);
        expect(Math.abs(gap.upper - exact)).toBeLessThan(1e-6);
        expect(gap.lower).toBeLessThanOrEqual(exact + 1e-9);
        if (exact > 0) expect(gap.lower).toBeGreaterThan(exact - 1e-6);
      },
    ),
    { seed: 61, numRuns: 3000 },
  );
});

test('parallel rods, in any frame (seed 62)', () => {
  const even = whole(1, 10).map((x) => 2 * x);
  fc.assert(
    fc.property(even, even, even, even, triple(whole(-30, 30)), frames, (d1, d2, l1, l2, p, frame) => {
      const exact = Math.hypot(
        Math.max(0, Math.hypot(p[0], p[1]) - (d1 + d2) / 2),
        Math.max(0, Math.abs(p[2]) - (l1 + l2) / 2),
      );
      const a = side(cylinderShape(d1, l1), frame);
      const gap = meter.measure(a, side(cylinderShape(d2, l2), composeRigid(frame, rigidFromPose(p))), fine);
      expect(Math.abs(gap.upper - exact)).toBeLessThan(1e-5);
      expect(gap.lower).toBeLessThanOrEqual(exact + 1e-9);
    }),
    { seed: 62, numRuns: 3000 },
  );
});

test('thin panels and long thin rods: both ends of the answer meet, and its points have its distance (seed 63)', () => {
  const thin = fc.constantFrom(0.1, 0.9, 3, 40, 900, 2000);
  const shape = fc.oneof(
    fc.tuple(thin, thin, thin).map((s): Shape => boxShape(...s)),
    fc.tuple(thin, thin).map(([d, l]): Shape => cylinderShape(d, l)),
  );
  const turn = triple(
    fc.oneof(fc.constantFrom(0, 90, 45, 1e-5, 89.99999), fc.double({ min: -180, max: 180, noNaN: true })),
  );
  const place = triple(fc.double({ min: -1500, max: 1500, noNaN: true }));
  fc.assert(
    fc.property(shape, shape, turn, turn, place, (x, y, r, s, at) => {
      const gap = meter.measure(side(x, rigidFromPose([0, 0, 0], r)), side(y, rigidFromPose(at, s)), fine);
      expect(gap.upper - gap.lower).toBeLessThan(1e-4);
      const [p, q] = gap.points;
      expect(Math.abs(Math.hypot(p[0] - q[0], p[1] - q[1], p[2] - q[2]) - gap.upper)).toBeLessThan(1e-9);
    }),
    { seed: 63, numRuns: 3000 },
  );
});

test('a stroke that comes closest at its very end is seen there', () => {
  const path = pathOf([{ kind: 'slide', along: [1, 0, 0], from: 0, to: 37 }]);
  const a = side(boxShape(10, 10, 10), rigidFromPose(), path);
  const gap = meter.measure(a, side(boxShape(10, 10, 10), rigidFromPose([50, 0, 0])), (l, u) => u - l < 0.05);
  expect([gap.upper, gap.positions[0]]).toEqual([3, 1]);
});

test('steps follow one another, each about its own place in the car (seed 64)', () => {
  const swing = { kind: 'swing', point: [5, 0, 0], axis: [0, 0, 1], from: -30, to: 90 } as const;
  const slide = { kind: 'slide', along: [0, 1, 0], from: 0, to: 20 } as const;
  const back = { kind: 'swing', point: [0, 0, 0], axis: [0, 0, 1], from: 0, to: -90 } as const;
  const path = pathOf([swing, slide, back]);
  const at = (p: number): number[] => {
    const m = displacementAt(path, p);
    return [m[0]! * 15 + m[3]!, m[4]! * 15 + m[7]!].map((x) => Math.round(1e9 * x) / 1e9 + 0);
  };
  // (15, 0) about (5, 0): at -30 to begin with, then at 90, up by 20, and back about the origin
  expect(at(0)).toEqual([5 + 10 * Math.cos(Math.PI / 6), -5].map((x) => Math.round(1e9 * x) / 1e9));
  expect(at(1 / 3)).toEqual([5, 10]);
  expect(at(2 / 3)).toEqual([5, 30]);
  expect(at(1)).toEqual([30, -5]);
  // nothing jumps where one step ends and the next begins
  fc.assert(
    fc.property(fc.constantFrom(1 / 3, 2 / 3), fc.double({ min: 1e-9, max: 1e-6, noNaN: true }), (p, d) => {
      const [a, b] = [displacementAt(path, p - d), displacementAt(path, p + d)];
      a.forEach((x, k) => expect(Math.abs(x - b[k]!)).toBeLessThan(1e-3));
    }),
    { seed: 64 },
  );
});
