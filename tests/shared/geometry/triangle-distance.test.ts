// Triangle against triangle: an oracle that shares nothing with the kernel. The squared distance of two convex
// combinations is a quadratic; at its minimum some corners of each have weight and the rest have none. The oracle tries all
// 7 x 7 choices of corners, solves each by elimination, and takes the least of those whose weights are not negative.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { segmentDistance, triangleDistance } from '#shared/geometry';

type Row = number[];

/** Solves by elimination with pivoting; null where the matrix is singular. */
function solve(matrix: readonly Row[], right: Row): Row | null {
  const n = right.length;
  const m = matrix.map((row, i) => [...row, right[i]!]);
  const largest = Math.max(...m.flat().map(Math.abs));
  for (let col = 0; col < n; col += 1) {
    let pivot = col;
    for (let row = col + 1; row < n; row += 1) if (Math.abs(m[row]![col]!) > Math.abs(m[pivot]![col]!)) pivot = row;
    if (Math.abs(m[pivot]![col]!) < 1e-12 * largest) return null;
    [m[col], m[pivot]] = [m[pivot]!, m[col]!];
    for (let row = 0; row < n; row += 1) {
      if (row === col) continue;
      const k = m[row]![col]! / m[col]![col]!;
      for (let c = col; c <= n; c += 1) m[row]![c]! -= k * m[col]![c]!;
    }
  }
  return m.map((row, i) => row[n]! / row[i]!);
}

const corner = (t: Float64Array, i: number): Row => [t[3 * i]!, t[3 * i + 1]!, t[3 * i + 2]!];
const minus = (a: Row, b: Row): Row => a.map((x, k) => x - b[k]!);
const dot = (a: Row, b: Row): number => a.reduce((sum, x, k) => sum + x * b[k]!, 0);

/** Least distance of two hulls of corners: over all choices of corners that may have weight. */
function oracle(P: readonly Row[], Q: readonly Row[]): number {
  let best = Infinity;
  for (let s = 1; s < 1 << P.length; s += 1) {
    for (let t = 1; t < 1 << Q.length; t += 1) {
      const p = P.filter((_, i) => s & (1 << i));
      const q = Q.filter((_, i) => t & (1 << i));
      // p0 + sum u (pi - p0) - q0 - sum v (qi - q0): least squares in u and v
      const columns = [...p.slice(1).map((x) => minus(x, p[0]!)), ...q.slice(1).map((x) => minus(q[0]!, x))];
      const start = minus(p[0]!, q[0]!);
      const weights =
        columns.length === 0
          ? []
          : solve(
              columns.map((a) => columns.map((b) => dot(a, b))),
              columns.map((a) => -dot(a, start)),
            );
      if (weights === null) continue;
      const u = weights.slice(0, p.length - 1);
      const v = weights.slice(p.length - 1);
      const isIn = (w: Row): boolean => w.every((x) => x >= -1e-9) && w.reduce((sum, x) => sum + x, 0) <= 1 + 1e-9;
      if (!isIn(u) || !isIn(v)) continue;
      const rest = start.map((x, k) => x + columns.reduce((sum, c, i) => sum + weights[i]! * c[k]!, 0));
      best = Math.min(best, Math.sqrt(dot(rest, rest)));
    }
  }
  return best;
}

const out = new Float64Array(7);
const gap = (a: readonly number[]): number => Math.hypot(a[1]! - a[4]!, a[2]! - a[5]!, a[3]! - a[6]!);
const rows = (t: Float64Array): Row[] => [corner(t, 0), corner(t, 1), corner(t, 2)];
const onTriangle = (p: Row, t: Float64Array): number => oracle([p], rows(t));

const real = fc.double({ min: -10, max: 10, noNaN: true });
/** Small whole numbers make parallel edges, shared planes, corners and degenerate triangles common. */
const whole = fc.integer({ min: -2, max: 2 });
const triangle = (c: fc.Arbitrary<number>): fc.Arbitrary<Float64Array> =>
  fc.array(c, { minLength: 9, maxLength: 9 }).map((x) => Float64Array.from(x));

describe.each([
  ['random', real, 1500, 51],
  ['on a coarse grid', whole, 4000, 52],
] as const)('two triangles, %s', (name, coordinate, numRuns, seed) => {
  test(`agree with the oracle, and the points have the distance (seed ${seed}, ${name})`, () => {
    fc.assert(
      fc.property(triangle(coordinate), triangle(coordinate), (P, Q) => {
        const d = triangleDistance(P, Q, out);
        const found = [...out];
        expect(Math.abs(d - oracle(rows(P), rows(Q)))).toBeLessThan(1e-6);
        expect(Math.abs(gap(found) - d)).toBeLessThan(1e-12);
        expect(onTriangle(found.slice(1, 4), P)).toBeLessThan(1e-6);
        expect(onTriangle(found.slice(4, 7), Q)).toBeLessThan(1e-6);
        expect(Math.abs(triangleDistance(Q, P, out) - d)).toBeLessThan(1e-9);
      }),
      { seed, numRuns },
    );
  });
});

test('two segments agree with the oracle (seed 53)', () => {
  const segment = (c: fc.Arbitrary<number>): fc.Arbitrary<Float64Array> =>
    fc.array(c, { minLength: 6, maxLength: 6 }).map((x) => Float64Array.from(x));
  const any = fc.oneof(segment(real), segment(whole));
  fc.assert(
    fc.property(any, any, (P, Q) => {
      const d = segmentDistance(P, Q, out);
      expect(Math.abs(d - oracle([corner(P, 0), corner(P, 1)], [corner(Q, 0), corner(Q, 1)]))).toBeLessThan(1e-6);
    }),
    { seed: 53, numRuns: 4000 },
  );
});

test('needles, slivers and huge or tiny coordinates never give a NaN or a distance that no points have (seed 54)', () => {
  const odd = fc.oneof(real, whole, fc.constantFrom(1e5, -1e5, 1e-7, 1e-160, 1e-300, 0));
  fc.assert(
    fc.property(triangle(odd), triangle(odd), (P, Q) => {
      const d = triangleDistance(P, Q, out);
      expect(Number.isFinite(d) && out.every(Number.isFinite)).toBe(true);
      expect(Math.abs(gap([...out]) - d)).toBeLessThan(1e-9);
      for (let i = 0; i < 9; i += 3) {
        for (let j = 0; j < 9; j += 3) {
          expect(d).toBeLessThanOrEqual(Math.hypot(P[i]! - Q[j]!, P[i + 1]! - Q[j + 1]!, P[i + 2]! - Q[j + 2]!) + 1e-9);
        }
      }
    }),
    { seed: 54, numRuns: 3000 },
  );
});
