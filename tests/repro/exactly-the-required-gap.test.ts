// A tube turning about its own axis keeps exactly the gap that is required. Rounding left it a hair below, and the search
// ended there with a wide interval: the verdict was tight, with dozens of stretches of no length.
import { expect, test } from 'vitest';
import { findingOf, motion, part, reportOf, rod, sceneOf, swing } from '../fixtures/scenes';

const turning = (gap: number, rules: Readonly<Record<string, unknown>> = {}): ReturnType<typeof findingOf> => {
  const turn = motion([swing(360, { axis: [0, 0, 1] })]);
  const parts = [part('a', [rod(80, 200)], { motions: [turn] }), part('b', [rod(20, 200, { at: [50 + gap, 0, 0] })])];
  return findingOf(reportOf(sceneOf(parts, { rules })), 'a', 'b', ['a']);
};

test('10 where 10 is required clears', () => {
  const f = turning(10);
  expect([f.verdict, f.tightSpans]).toEqual(['clears', []]);
  expect(f.margin).toBeGreaterThanOrEqual(-0.001);
});

test('a little less is tight all the way round', () => {
  const f = turning(9.99);
  expect([f.verdict, f.tightSpans]).toEqual(['tight', [[0, 1]]]);
});

test('a gap of exactly `touch` beside a hit elsewhere does not break into pieces', () => {
  const f = turning(0.01, { touch: 0.01 });
  expect(f.hitSpans!.length).toBeLessThanOrEqual(1);
});
