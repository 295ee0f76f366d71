// A triangle whose corners all but stand in a line once had a plane of pure rounding, which other edges then "crossed".
import { expect, test } from 'vitest';
import { triangleDistance } from '#shared/geometry';

test('a needle is its edges', () => {
  const out = new Float64Array(7);
  const needle = Float64Array.of(0, 0, 100_000, 1.5717435021376502e-167, 0, 1, 0, 0, 1);
  const other = Float64Array.of(-1.5717435021376502e-167, 0, 1e-300, 0, 1, 0, 0, 100_000, 0);
  // the needle's end is 1 above a line that runs along y
  expect(triangleDistance(needle, other, out)).toBeCloseTo(1, 12);
  expect(Math.hypot(out[1]! - out[4]!, out[2]! - out[5]!, out[3]! - out[6]!)).toBeCloseTo(1, 12);
});
