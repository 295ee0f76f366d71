// The answer's positions and points were once taken before the search had run: on a stroke whose least gap lies between its
// middle and its ends they belonged to another place, with a larger gap than the one beside them.
import { expect, test } from 'vitest';
import { findingOf, motion, part, reportOf, rod, sceneOf, swing } from '../fixtures/scenes';

test('a pin passed at 12 of 40 degrees: place and points have the gap that is written', () => {
  const angle = (12 * Math.PI) / 180;
  const pin = part('pin', [rod(10, 20, { at: [-330 * Math.sin(angle), 0, -330 * Math.cos(angle)], turn: [90, 0, 0] })]);
  const tip = part('tip', [rod(10, 20, { at: [0, 0, -300], turn: [90, 0, 0] })], { motions: [motion([swing(40)])] });
  const f = findingOf(reportOf(sceneOf([pin, tip])), 'pin', 'tip', ['tip']);
  expect(f.gap).toBeLessThan(20 + 0.05);
  // within the accuracy the gap grows by no more than 0.05: so far from 12 degrees
  expect(Math.abs(f.at.positions[0]! * 40 - 12)).toBeLessThan(1);
  const [p, q] = f.at.points;
  expect(Math.hypot(p[0] - q[0], p[1] - q[1], p[2] - q[2])).toBeCloseTo(f.gap, 9);
  for (const [x, , z] of [p, q]) expect(Math.atan2(-x, -z) * (180 / Math.PI)).toBeCloseTo(12, 0);
});
