// A translation in the shop's words: rearward or forward, right or left, up or down (vehicle axes, +X rearward, +Y right,
// +Z up).

export interface Move {
  /** mm, above 0. */
  readonly distance: number;
  readonly direction: 'rearward' | 'forward' | 'right' | 'left' | 'up' | 'down';
}

const WORDS = [
  ['rearward', 'forward'],
  ['right', 'left'],
  ['up', 'down'],
] as const;

/**
 * The parts of a translation worth saying, largest first. Parts below `least` mm are left out, unless nothing else is
 * left. Distances are not rounded: whoever prints them rounds up, so that the move still frees.
 */
export function movesOf(vector: readonly [number, number, number], least: number): Move[] {
  const moves = vector
    .map((x, k): Move => ({ distance: Math.abs(x), direction: WORDS[k]![x < 0 ? 1 : 0] }))
    .filter((m) => m.distance > 0)
    .sort((a, b) => b.distance - a.distance);
  const worth = moves.filter((m) => m.distance >= least);
  return worth.length > 0 ? worth : moves.slice(0, 1);
}
