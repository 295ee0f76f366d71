import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  applyRigid,
  composeRigid,
  identityRigid,
  invertRigid,
  rigidFromPose,
  rigidFromSlide,
  rigidFromSwing,
  turnByRigid,
  type Rigid,
} from '#shared/units';

const length = fc.double({ min: -1000, max: 1000, noNaN: true });
const angle = fc.double({ min: -720, max: 720, noNaN: true });
const point = fc.tuple(length, length, length);
const rigid = fc.tuple(point, fc.tuple(angle, angle, angle)).map(([at, turn]) => rigidFromPose(at, turn));

const near = (a: ArrayLike<number>, b: ArrayLike<number>, by = 1e-9): void => {
  expect(a.length).toBe(b.length);
  for (let i = 0; i < a.length; i += 1) expect(Math.abs(a[i]! - b[i]!)).toBeLessThan(by);
};

describe('poses', () => {
  it('turns about z first, then y, then x, then moves: Rx·Ry·Rz', () => {
    // a right-handed quarter turn: +90 about z takes x to y, about y takes z to x, about x takes y to z
    near(applyRigid(rigidFromPose([0, 0, 0], [0, 0, 90]), [1, 0, 0]), [0, 1, 0]);
    near(applyRigid(rigidFromPose([0, 0, 0], [0, 90, 0]), [0, 0, 1]), [1, 0, 0]);
    near(applyRigid(rigidFromPose([0, 0, 0], [90, 0, 0]), [0, 1, 0]), [0, 0, 1]);
    // x -> (z turn) y -> (y turn) y -> (x turn) z -> moved
    near(applyRigid(rigidFromPose([10, 20, 30], [90, 90, 90]), [1, 0, 0]), [10, 20, 31]);
  });

  it('is the product of its three turns', () => {
    fc.assert(
      fc.property(point, angle, angle, angle, (at, rx, ry, rz) => {
        const product = [rigidFromPose(at), rigidFromPose([0, 0, 0], [rx, 0, 0]), rigidFromPose([0, 0, 0], [0, ry, 0])];
        const all = [...product, rigidFromPose([0, 0, 0], [0, 0, rz])].reduce((a, b) => composeRigid(a, b));
        near(all, rigidFromPose(at, [rx, ry, rz]));
      }),
    );
  });

  it('is undone by its inverse, and keeps lengths', () => {
    fc.assert(
      fc.property(rigid, point, point, (m, p, q) => {
        near(composeRigid(m, invertRigid(m)), identityRigid());
        near(applyRigid(invertRigid(m), applyRigid(m, p)), p, 1e-8);
        const [a, b] = [applyRigid(m, p), applyRigid(m, q)];
        const d = (u: readonly number[], v: readonly number[]): number => Math.hypot(...u.map((x, i) => x - v[i]!));
        expect(Math.abs(d(a, b) - d(p, q))).toBeLessThan(1e-8);
        near(
          turnByRigid(m, p),
          applyRigid(m, p).map((x, i) => x - m[i * 4 + 3]!),
          1e-8,
        );
      }),
    );
  });

  it('composes to doing one after the other', () => {
    fc.assert(
      fc.property(rigid, rigid, point, (a, b, p) => {
        near(applyRigid(composeRigid(a, b), p), applyRigid(a, applyRigid(b, p)), 1e-8);
      }),
    );
  });
});

describe('steps', () => {
  it('swings about a line by the right-hand rule and leaves the line where it is', () => {
    near(applyRigid(rigidFromSwing([10, 0, 0], [0, 1, 0], 90), [10, 5, 2]), [12, 5, 0]);
    fc.assert(
      fc.property(point, angle, length, (p, degrees, along) => {
        const axis = [2 / 3, -1 / 3, 2 / 3] as const;
        const onLine = p.map((x, i) => x + along * axis[i]!) as [number, number, number];
        near(applyRigid(rigidFromSwing(p, axis, degrees), onLine), onLine, 1e-8);
      }),
    );
  });

  it('is the pose of one turn where the axis is one of the frame', () => {
    fc.assert(
      fc.property(angle, (degrees) => {
        const at = (turn: [number, number, number]): Rigid => rigidFromPose([0, 0, 0], turn);
        near(rigidFromSwing([0, 0, 0], [1, 0, 0], degrees), at([degrees, 0, 0]), 1e-14);
        near(rigidFromSwing([0, 0, 0], [0, 1, 0], degrees), at([0, degrees, 0]), 1e-14);
        near(rigidFromSwing([0, 0, 0], [0, 0, 1], degrees), at([0, 0, degrees]), 1e-14);
      }),
    );
  });

  it('slides along a direction', () => {
    near(applyRigid(rigidFromSlide([0, 0, -1], 12), [1, 2, 3]), [1, 2, -9]);
  });
});
