// Whole motions against closed forms on a dense grid: one side moving, both in every combination, service motions, several
// steps; blocks, rods and meshes.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Finding } from '#shared/check';
import { reportOf, sceneOf } from '../../fixtures/scenes';
import { boxSoup, type Soup } from '../../fixtures/soups';
import { asPart, planeGap, type PlanePart, type PlaneSolid, type PlaneStep } from './plane-oracle';

type Point = [number, number];
const ACCURACY = 0.05;
const TOUCH = 0.01;
const LENGTH = 40;

const near = (m: number): fc.Arbitrary<number> => fc.double({ min: -m, max: m, noNaN: true });
const point = (m: number): fc.Arbitrary<Point> => fc.tuple(near(m), near(m));
const size = fc.double({ min: 2, max: 30, noNaN: true });
const solid: fc.Arbitrary<PlaneSolid> = fc.record({
  kind: fc.constantFrom('circle', 'rectangle', 'meshRectangle'),
  centre: point(120),
  turn: near(90),
  half: fc.tuple(size, size),
});
const swingStep: fc.Arbitrary<PlaneStep> = fc.record({
  kind: fc.constant('swing' as const),
  at: point(100),
  from: fc.constant(0),
  to: near(200),
});
const slideStep: fc.Arbitrary<PlaneStep> = fc.record({
  kind: fc.constant('slide' as const),
  at: point(1).filter(([x, z]) => Math.hypot(x, z) > 0.01),
  from: fc.constant(0),
  to: near(150),
});
const steps = fc
  .array(fc.oneof(swingStep, slideStep), { minLength: 1, maxLength: 3 })
  .chain((list) => near(30).map((from) => list.map((s, i) => (i === 0 ? { ...s, from } : s))));
const still: fc.Arbitrary<PlanePart> = solid.map((s) => ({ solid: s, steps: [] }));
const moving: fc.Arbitrary<PlanePart> = fc.record({ solid, steps });

const soupOf = ({ solid: s }: PlanePart): Soup => boxSoup(2 * s.half[0], LENGTH, 2 * s.half[1]);

function findingsOf(a: PlanePart, b: PlanePart, use: string): readonly Finding[] {
  const document = sceneOf([asPart('a', a, LENGTH, use), asPart('b', b, LENGTH, use)], {
    accuracy: ACCURACY,
    rules: { gap: 6, movingGap: 10, touch: TOUCH },
  });
  return reportOf(document, { 'a.stl': soupOf(a), 'b.stl': soupOf(b) }).findings;
}

/** All that holds for any finding, and that its place really has its gap. */
function expectSound(f: Finding, at: (positions: readonly number[]) => number): void {
  expect(f.gap).toBeGreaterThanOrEqual(f.gapAtLeast);
  expect(f.gap - f.gapAtLeast).toBeLessThanOrEqual(ACCURACY);
  // the search ends within the accuracy: at its place the two may be closer than what it measured, by as much
  const there = at(f.at.positions);
  expect(there).toBeLessThanOrEqual(f.gap + (f.gap === 0 ? TOUCH : 1e-6));
  expect(there).toBeGreaterThanOrEqual(f.gapAtLeast - 1e-9);
  const [p, q] = f.at.points;
  if (f.verdict !== 'hits')
    expect(Math.abs(Math.hypot(p[0] - q[0], p[1] - q[1], p[2] - q[2]) - f.gap)).toBeLessThan(1e-9);
  expect(f.verdict).toBe(f.gapAtLeast < TOUCH ? 'hits' : f.margin < -TOUCH / 10 ? 'tight' : 'clears');
  expect(f.margin).toBeCloseTo(f.gapAtLeast - f.required, 12);
}

const travelOf = (p: PlanePart): number =>
  p.steps.reduce((sum, s, i) => {
    const span = Math.abs(s.to - s.from);
    if (s.kind === 'slide') return sum + span;
    // at the most: the centre's way so far, and the corner
    const before = p.steps.slice(0, i).reduce((r, t) => r + Math.abs(t.to) + 300, 0);
    return sum + ((span * Math.PI) / 180) * (Math.hypot(...p.solid.centre) + Math.hypot(...s.at) + 45 + before);
  }, 0);

/** Checks spans of positions with a gap below `limit` against samples. */
function expectSpans(spans: Finding['hitSpans'], gapAt: (p: number) => number, limit: number, travel: number): void {
  const list = spans ?? [];
  const slack = (2 * ACCURACY) / Math.max(travel, 1e-9);
  let last = -1;
  for (const [from, to] of list) {
    expect(from).toBeGreaterThan(last);
    expect(to).toBeGreaterThanOrEqual(from);
    last = to;
  }
  for (let i = 0; i <= 1000; i += 1) {
    const p = i / 1000;
    const gap = gapAt(p);
    const isIn = list.some(([from, to]) => p >= from && p <= to);
    const isNear = list.some(([from, to]) => p >= from - slack && p <= to + slack);
    // within the accuracy of travel of an end either may be said; the gap changes by no more than the travel
    if (gap < limit - TOUCH / 10 - 1e-6) expect(isNear, `${gap} at ${p} is below ${limit}`).toBe(true);
    if (gap > limit + 2 * ACCURACY) expect(isIn, `${gap} at ${p} is above ${limit}`).toBe(false);
  }
}

describe.each([
  ['operating', 701],
  ['service', 702],
])('one side moving (%s)', (use, seed) => {
  test(`holds what a grid of 1,001 closed forms says (seed ${seed})`, () => {
    fc.assert(
      fc.property(moving, still, (a, b) => {
        const f = findingsOf(a, b, use).find((x) => x.motions.length === 1)!;
        const gapAt = (p: number): number => planeGap(a, b, p, 0);
        expectSound(f, ([p]) => gapAt(p!));
        let least = Infinity;
        for (let i = 0; i <= 1000; i += 1) least = Math.min(least, gapAt(i / 1000));
        expect(f.gapAtLeast).toBeLessThanOrEqual(least + 1e-9);
        expect(f.gap).toBeLessThanOrEqual(least + ACCURACY);
        const travel = travelOf(a);
        expectSpans(f.hitSpans, gapAt, f.verdict === 'hits' ? TOUCH : -1, travel);
        expectSpans(f.tightSpans, gapAt, f.verdict === 'clears' ? -1 : 10, travel);
        if (f.verdict === 'hits') expect(f.hitSpans!.length).toBeGreaterThan(0);
      }),
      { seed, numRuns: 70 },
    );
  });
});

test('both sides moving: every combination on a grid of 101 x 101 closed forms (seed 703)', () => {
  fc.assert(
    fc.property(moving, moving, (a, b) => {
      const all = findingsOf(a, b, 'operating');
      // all solids of either side move: nothing is left to be compared at rest but the pair itself
      expect(all.map((f) => f.motions.length).sort()).toEqual([0, 2]);
      const f = all.find((x) => x.motions.length === 2)!;
      expect(f.motions.map((m) => m.component)).toEqual(['a', 'b']);
      expectSound(f, ([p, q]) => planeGap(a, b, p!, q!));
      let least = Infinity;
      for (let i = 0; i <= 100; i += 1) {
        for (let j = 0; j <= 100; j += 1) least = Math.min(least, planeGap(a, b, i / 100, j / 100));
      }
      expect(f.gapAtLeast).toBeLessThanOrEqual(least + 1e-9);
      expect(f.hitSpans).toEqual(f.verdict === 'hits' ? null : []);
      expect(f.tightSpans).toEqual(f.verdict === 'clears' ? [] : null);
    }),
    { seed: 703, numRuns: 40 },
  );
});

test('two service motions are each checked alone, with all else at rest (seed 704)', () => {
  fc.assert(
    fc.property(moving, moving, (a, b) => {
      const all = findingsOf(a, b, 'service');
      expect(all.map((f) => f.motions.map((m) => m.component).join()).sort()).toEqual(['', 'a', 'b']);
      for (const f of all) {
        const who = f.motions[0]?.component;
        const resting = (p: PlanePart): PlanePart => ({ ...p, steps: [] });
        const [x, y] = [who === 'a' ? a : resting(a), who === 'b' ? b : resting(b)];
        expectSound(f, ([p]) => planeGap(x, y, p ?? 0, p ?? 0));
      }
    }),
    { seed: 704, numRuns: 40 },
  );
});
