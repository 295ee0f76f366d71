// Published and closed-form distances at rest. The source stands beside each.
import { describe, expect, test } from 'vitest';
import { segmentDistance, triangleDistance } from '#shared/geometry';
import { block, findingOf, mesh, part, reportOf, rod, sceneOf } from '../fixtures/scenes';
import { torusSoup, type Soup } from '../fixtures/soups';

type Json = Readonly<Record<string, unknown>>;
const R2 = Math.SQRT2;
const R3 = Math.sqrt(3);

function gapOf(a: Json, b: Json, meshes: Readonly<Record<string, Soup>> = {}): number {
  const f = findingOf(reportOf(sceneOf([part('a', [a]), part('b', [b])], { accuracy: 0.0001 }), meshes), 'a', 'b');
  expect(f.gap - f.gapAtLeast).toBeLessThanOrEqual(0.0001);
  expect(f.gapAtLeast).toBeGreaterThanOrEqual(0);
  return f.gap;
}

describe('segments: Ericson, Real-Time Collision Detection (2005) 5.1.9, and Eberly, robust segment distance; closed form', () => {
  test.each([
    [[0, 0, 0, 10, 0, 0], [5, -5, 7, 5, 5, 7], 7],
    [[0, 0, 0, 1, 0, 0], [2, 1, 1, 2, 5, 1], R3],
    [[0, 0, 0, 10, 0, 0], [2, 3, 4, 8, 3, 4], 5],
    [[0, 0, 0, 10, 0, 0], [12, 3, 4, 20, 3, 4], 5.385164807],
    [[0, 0, 0, 2, 2, 0], [0, 2, 1, 2, 0, 1], 1],
    [[1, 1, 1, 4, 5, 6], [7, 0, 0, 3, 8, 2], 3.585999713],
    [[0, 0, 0, 100, 0, 0], [50, 30, -20, 80, -40, 60], 9.407208684],
  ])('%j and %j', (p, q, distance) => {
    const out = new Float64Array(7);
    expect(segmentDistance(Float64Array.from(p), Float64Array.from(q), out)).toBeCloseTo(distance, 8);
    expect(segmentDistance(Float64Array.from(q), Float64Array.from(p), out)).toBeCloseTo(distance, 8);
  });
});

describe('point and triangle, every region: Ericson (2005) 5.1.5; closed form', () => {
  test.each([
    [[2, 2, 5], 5],
    [[-3, -4, 0], 5],
    [[13, -4, 0], 5],
    [[-3, 14, 0], 5],
    [[5, -2, 0], 2],
    [[-2, 5, 0], 2],
    [[8, 8, 0], 3 * R2],
    [[8, 8, 1], 4.358898944],
    [[12, 4, 3], Math.sqrt(27)],
  ])('%j', (p, distance) => {
    const triangle = Float64Array.of(0, 0, 0, 10, 0, 0, 0, 10, 0);
    const point = Float64Array.from([...p, ...p, ...p]);
    const out = new Float64Array(7);
    expect(triangleDistance(triangle, point, out)).toBeCloseTo(distance, 8);
    expect(triangleDistance(point, triangle, out)).toBeCloseTo(distance, 8);
  });
});

describe('boxes; closed form', () => {
  test('blocks 3, 4 and 0 apart along the axes: 5', () => {
    expect(gapOf(block([10, 10, 10], { at: [5, 5, 5] }), block([7, 6, 10], { at: [16.5, 17, 5] }))).toBeCloseTo(5, 8);
  });
  test('a cube and one turned 45 degrees: 3 - 1 - √2', () => {
    const turned = block([2, 2, 2], { at: [3, 0, 0], turn: [0, 0, 45] });
    expect(gapOf(block([2, 2, 2]), turned)).toBeCloseTo(3 - 1 - R2, 8);
  });
  test('edge to edge: 4 - 2√2', () => {
    const a = block([2, 2, 2], { turn: [0, 0, 45] });
    expect(gapOf(a, block([2, 2, 2], { at: [4, 0, 0], turn: [0, 45, 0] }))).toBeCloseTo(4 - 2 * R2, 8);
  });
  test('corner to plane: 3 - √3', () => {
    // Ry(b) Rz(45) brings the corner (1, -1, 1) of the cube onto the x axis where tan b = 1/√2
    const tilt = (Math.atan(1 / R2) * 180) / Math.PI;
    const cube = block([2, 2, 2], { turn: [0, tilt, 45] });
    expect(gapOf(cube, block([10, 100, 100], { at: [8, 0, 0] }))).toBeCloseTo(3 - R3, 7);
  });
});

describe('a capsule against a box: test suite of the Flexible Collision Library (test_fcl_capsule_box)', () => {
  // A capsule is not one of our shapes. Its distance to a box is that of its axis, a cylinder of no thickness, less its
  // radius; the axis is 4 long, r 2, the box 1 x 2 x 4.
  const thin = 1e-4;
  const axis = (pose: Json): Json => rod(thin, 4, pose);
  test.each([
    [{ at: [3, 0, 0] }, 0.5],
    [{ at: [0, 0, 8] }, 2.0],
    [{ at: [-10, 0, 0], turn: [0, 90, 0] }, 5.5],
    [{ at: [-10, 0.8, 1.5], turn: [0, 90, 0] }, 5.5],
  ])('%j: %d', (pose, distance) => {
    expect(Math.abs(gapOf(axis(pose), block([1, 2, 4])) - 2 - distance)).toBeLessThan(2e-4);
  });
});

describe('cylinders; closed form', () => {
  test('parallel axes 40 apart, radii 10 and 15: 15', () => {
    expect(gapOf(rod(20, 100), rod(30, 80, { at: [40, 0, 5] }))).toBeCloseTo(15, 7);
  });
  test('long ones crossing at right angles, axes 60 apart, radii 20 and 10: 30', () => {
    expect(gapOf(rod(40, 400), rod(20, 400, { at: [0, 60, 0], turn: [0, 90, 0] }))).toBeCloseTo(30, 7);
  });
  test('a flat end that faces a tube: 30, where a rounded one would give 20', () => {
    const b = rod(20, 100, { at: [100, 0, 50], turn: [0, 90, 0] });
    expect(gapOf(rod(40, 100, { at: [0, 0, 50] }), b)).toBeCloseTo(30, 7);
  });
  test('rims: radii 20, axes 50 apart, ends 30 apart: √(30² + 10²)', () => {
    expect(gapOf(rod(40, 100), rod(40, 100, { at: [50, 0, 130] }))).toBeCloseTo(31.622776602, 7);
  });
});

describe('two interlocked tori of 5,000 triangles: demo of the Proximity Query Package 1.3; distances computed from its set-up', () => {
  const torus = torusSoup(1, 0.2, 50, 50);
  // the first is turned by [[1,0,0],[0,0,-1],[0,1,0]], a quarter about x, and moved; file unit and mm are the same here
  const first = (x: number, turn = [90, 0, 0]): Json => mesh('torus', { at: [x, 0, 0], turn });
  test('a unit aside: 0.597639055, closer than the smooth tori', () => {
    expect(torus.length).toBe(9 * 5000);
    expect(gapOf(first(1), mesh('torus'), { torus })).toBeCloseTo(0.597639055, 8);
  });
  test('1.5999 aside: 9.96065e-5, no contact', () => {
    expect(gapOf(first(1.5999), mesh('torus'), { torus })).toBeCloseTo(9.96065e-5, 8);
  });
  test('a unit aside without the turn: they overlap', () => {
    expect(gapOf(first(1, [0, 0, 0]), mesh('torus'), { torus })).toBe(0);
  });
});
