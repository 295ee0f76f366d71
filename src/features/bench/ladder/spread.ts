// Puts labels beside a rule, each as near to where it belongs as it can be without touching another.

export interface Wanted {
  /** Where its middle belongs, px from the top. */
  readonly at: number;
  readonly height: number;
}

interface Pool {
  /** Middle of the first of the pool, so that all of them lie as near as they can. */
  start: number;
  readonly wanted: number[];
  readonly from: number;
  to: number;
}

/**
 * Middles for labels that are given from top to bottom: least total shift, no overlap, inside 0 to `room` as far as there is
 * room (pooling of adjacent violators).
 */
export function spreadLabels(labels: readonly Wanted[], room: number): number[] {
  // distance of each label's middle from the first one's, if all lay close together
  const stacked: number[] = [];
  labels.forEach((label, i) => {
    const before = labels[i - 1];
    stacked.push(before === undefined ? 0 : stacked[i - 1]! + (before.height + label.height) / 2);
  });
  const pools: Pool[] = [];
  labels.forEach((label, i) => {
    let pool: Pool = { start: label.at - stacked[i]!, wanted: [label.at - stacked[i]!], from: i, to: i };
    for (let last = pools.at(-1); last !== undefined && last.start > pool.start; last = pools.at(-1)) {
      pools.pop();
      const wanted = [...last.wanted, ...pool.wanted];
      pool = { start: wanted.reduce((a, b) => a + b, 0) / wanted.length, wanted, from: last.from, to: pool.to };
    }
    pools.push(pool);
  });
  const least = (labels[0]?.height ?? 0) / 2;
  const last = labels.at(-1);
  const most = last === undefined ? 0 : room - last.height / 2 - stacked.at(-1)!;
  return pools.flatMap((pool) => {
    const start = Math.max(least, Math.min(Math.max(most, least), pool.start));
    return Array.from({ length: pool.to - pool.from + 1 }, (_, k) => start + stacked[pool.from + k]!);
  });
}
