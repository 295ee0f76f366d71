// What must not change a gap, and what may change it one way only.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Finding } from '#shared/check';
import { block, findingOf, mesh, motion, part, reportOf, rod, sceneOf, swing } from '../../fixtures/scenes';
import { angleSoup, boxSoup, torusSoup } from '../../fixtures/soups';

type Json = Readonly<Record<string, unknown>>;
const ACCURACY = 0.01;
const SOUPS = { ring: torusSoup(30, 8, 20, 10), angle: angleSoup(40, 5, 30), block: boxSoup(30, 20, 10) };

const turn = fc.double({ min: -180, max: 180, noNaN: true });
const place = (m: number): fc.Arbitrary<number> => fc.double({ min: -m, max: m, noNaN: true });
const triple = (m: number): fc.Arbitrary<[number, number, number]> => fc.tuple(place(m), place(m), place(m));
const pose = (m: number): fc.Arbitrary<Json> => fc.record({ at: triple(m), turn: fc.tuple(turn, turn, turn) });
const solid = fc
  .tuple(fc.constantFrom('box', 'rod', 'ring', 'angle'), pose(60))
  .map(([kind, p]) => (kind === 'box' ? block([30, 20, 10], p) : kind === 'rod' ? rod(16, 50, p) : mesh(kind, p)));
const axis = triple(1).filter((v) => Math.hypot(...v) > 0.1);
const stroke = fc.record({ point: triple(80), axis, to: place(60) });
type Stroke = typeof stroke extends fc.Arbitrary<infer T> ? T : never;

const moved = (s: Stroke, share = 1): Json => motion([swing(s.to * share, { point: s.point, axis: s.axis })]);
const measured = (parts: readonly Json[], motions: readonly string[] = [], more: Json = {}): Finding =>
  findingOf(reportOf(sceneOf(parts, { accuracy: ACCURACY, ...more }), SOUPS), 'a', 'b', motions);

/** Two proven intervals of one gap must meet. */
function expectSame(f: Finding, g: Finding): void {
  const noise = 1e-6;
  expect(f.gapAtLeast).toBeLessThanOrEqual(g.gap + noise);
  expect(g.gapAtLeast).toBeLessThanOrEqual(f.gap + noise);
}

test('the sides may be swapped (seed 901)', () => {
  fc.assert(
    fc.property(solid, solid, stroke, (x, y, s) => {
      const f = measured([part('a', [x], { motions: [moved(s)] }), part('b', [y])], ['a']);
      const g = measured([part('a', [y]), part('b', [x], { motions: [moved(s)] })], ['b']);
      expectSame(f, g);
      expect(f.verdict).toBe(g.verdict);
    }),
    { seed: 901, numRuns: 60 },
  );
});

test('a rigid motion of the whole scene changes nothing (seed 902)', () => {
  fc.assert(
    fc.property(solid, solid, stroke, pose(5000), (x, y, s, whole) => {
      const at = (pose: Json): Finding =>
        measured([part('a', [x], { pose, motions: [moved(s)] }), part('b', [y], { pose })], ['a']);
      expectSame(at({}), at(whole));
    }),
    { seed: 902, numRuns: 60 },
  );
});

test('a box, and the same box as a mesh, have the same gap to anything (seed 903)', () => {
  fc.assert(
    fc.property(pose(40), solid, stroke, (p, y, s) => {
      const of = (x: Json): Finding => measured([part('a', [x], { motions: [moved(s)] }), part('b', [y])], ['a']);
      expectSame(of(block([30, 20, 10], p)), of(mesh('block', p)));
    }),
    { seed: 903, numRuns: 60 },
  );
});

test('a shorter stroke, a single solid of two, or one of two motions never bring them closer (seed 904)', () => {
  fc.assert(
    fc.property(
      solid,
      solid,
      solid,
      stroke,
      stroke,
      fc.double({ min: 0, max: 1, noNaN: true }),
      (x, y, z, s, t, share) => {
        const b = part('b', [y]);
        const f = measured([part('a', [x], { motions: [moved(s)] }), b], ['a']);
        const shorter = measured([part('a', [x], { motions: [moved(s, share)] }), b], ['a']);
        expect(shorter.gap).toBeGreaterThanOrEqual(f.gapAtLeast - 1e-6);
        const both = measured([part('a', [x, { ...z, id: 'more' }], { motions: [moved(s)] }), b], ['a']);
        expect(both.gapAtLeast).toBeLessThanOrEqual(f.gap + 1e-6);
        const two = measured(
          [part('a', [x], { motions: [moved(s)] }), part('b', [y], { motions: [moved(t)] })],
          ['a', 'b'],
        );
        expect(two.gapAtLeast).toBeLessThanOrEqual(f.gap + 1e-6);
      },
    ),
    { seed: 904, numRuns: 40 },
  );
});

test('more tolerance never makes a verdict better, and the margin falls by as much (seed 905)', () => {
  const rank = ['hits', 'tight', 'clears'];
  fc.assert(
    fc.property(solid, solid, fc.double({ min: 0, max: 20, noNaN: true }), (x, y, tolerance) => {
      const of = (t: number): Finding => measured([part('a', [x], { tolerance: t }), part('b', [y])]);
      const [f, g] = [of(0), of(tolerance)];
      expect(rank.indexOf(g.verdict)).toBeLessThanOrEqual(rank.indexOf(f.verdict));
      expect(Math.abs(f.margin - g.margin - tolerance)).toBeLessThanOrEqual(ACCURACY + 1e-9);
    }),
    { seed: 905, numRuns: 60 },
  );
});

describe('no figure of a report is ever other than a number', () => {
  test.each([0.0001, 0.05, 10])('accuracy %d: any scene of three parts (seed 906)', (accuracy) => {
    fc.assert(
      fc.property(solid, solid, solid, stroke, stroke, (x, y, z, s, t) => {
        const parts = [
          part('a', [x], { motions: [moved(s)] }),
          part('b', [y], { motions: [{ ...moved(t), use: 'service' }] }),
          part('c', [z]),
        ];
        const report = reportOf(sceneOf(parts, { accuracy }), SOUPS);
        // NaN and Infinity would be written as null
        JSON.stringify(report, (_, value: unknown) => {
          if (typeof value === 'number') expect(Number.isFinite(value)).toBe(true);
          return value;
        });
        for (const f of report.findings) expect(f.gap - f.gapAtLeast).toBeLessThanOrEqual(accuracy);
      }),
      { seed: 906, numRuns: accuracy < 0.001 ? 5 : 25 },
    );
  });
});
