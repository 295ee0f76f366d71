// The depth that proves a whole stretch to hit: never more than what there is, and near it in plain cases.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { boxShape, cylinderShape, type Placed } from '#shared/geometry';
import { rigidFromPose, type Rigid } from '#shared/units';
import { overlapAtLeast } from '../../../shared/check/deep';

const at = (shape: Placed['shape'], pose: Rigid): Placed => ({ shape, pose });
const FAR = 1e9;

describe('a depth of overlap', () => {
  test('two boxes overlapping by 6 mm in one direction, wide in the others', () => {
    const a = at(boxShape(100, 100, 20), rigidFromPose([0, 0, 0]));
    const b = at(boxShape(100, 100, 20), rigidFromPose([0, 0, 14]));
    // a point 3 mm inside both
    expect(overlapAtLeast([a], [b], FAR)).toBeCloseTo(6, 0);
    expect(overlapAtLeast([a], [b], FAR)).toBeLessThanOrEqual(6 + 1e-9);
  });

  test('a pin through a plate: its radius and half the plate', () => {
    const plate = at(boxShape(200, 200, 4), rigidFromPose([0, 0, 0]));
    const pin = at(cylinderShape(10, 100), rigidFromPose([0, 0, 0]));
    const depth = overlapAtLeast([plate], [pin], FAR);
    expect(depth).toBeGreaterThan(3.9);
    expect(depth).toBeLessThanOrEqual(7 + 1e-9);
  });

  test('bodies that are apart have none', () => {
    const a = at(boxShape(10, 10, 10), rigidFromPose([0, 0, 0]));
    const b = at(cylinderShape(10, 10), rigidFromPose([12.2, 0, 0], [20, 30, 40]));
    expect(overlapAtLeast([a], [b], FAR)).toBe(0);
  });

  test('no translation shorter than the depth takes two turned boxes apart (seed 4711)', () => {
    const small = fc.double({ min: -30, max: 30, noNaN: true });
    const turn = fc.tuple(small, small, small).map(([x, y, z]): [number, number, number] => [x * 6, y * 6, z * 6]);
    fc.assert(
      fc.property(fc.tuple(small, small, small), turn, fc.tuple(small, small, small), (place, turned, way) => {
        const a = at(boxShape(60, 40, 30), rigidFromPose([0, 0, 0]));
        const pose = rigidFromPose(place, turned);
        const depth = overlapAtLeast([a], [at(boxShape(50, 30, 20), pose)], FAR);
        const length = Math.hypot(...way);
        fc.pre(depth > 0.5 && length > 1);
        const moved = pose.slice();
        for (let k = 0; k < 3; k += 1) moved[4 * k + 3]! += (0.98 * depth * way[k]!) / length;
        // still some overlap, if only a little: the proof says so
        expect(boxesMeet(moved)).toBe(true);
      }),
      { seed: 4711, numRuns: 400 },
    );

    /** Separating axes of the two boxes, after the second was moved. */
    function boxesMeet(m: Rigid): boolean {
      const half = [30, 20, 15];
      const other = [25, 15, 10];
      const axes: number[][] = [];
      for (let k = 0; k < 3; k += 1) {
        axes.push([k === 0 ? 1 : 0, k === 1 ? 1 : 0, k === 2 ? 1 : 0]);
        axes.push([m[k]!, m[4 + k]!, m[8 + k]!]);
      }
      for (let i = 0; i < 3; i += 1) {
        for (let j = 0; j < 3; j += 1) {
          const u = axes[2 * i]!;
          const v = axes[2 * j + 1]!;
          axes.push([u[1]! * v[2]! - u[2]! * v[1]!, u[2]! * v[0]! - u[0]! * v[2]!, u[0]! * v[1]! - u[1]! * v[0]!]);
        }
      }
      return axes.every(([x = 0, y = 0, z = 0]) => {
        if (Math.hypot(x, y, z) < 1e-9) return true;
        const mid = Math.abs(x * m[3]! + y * m[7]! + z * m[11]!);
        const ra = half[0]! * Math.abs(x) + half[1]! * Math.abs(y) + half[2]! * Math.abs(z);
        const rb = other.reduce((sum, h, k) => sum + h * Math.abs(x * m[k]! + y * m[4 + k]! + z * m[8 + k]!), 0);
        return mid <= ra + rb;
      });
    }
  });
});
