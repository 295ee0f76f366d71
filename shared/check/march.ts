// Walking along a hit in short paces. Stretches that lie closer together than the accuracy are one stretch, so a hit that is
// met again at every pace, each shorter than the accuracy, is one hit. The pair of faces that hit at one place mostly hits at
// the next one too: asking that pair alone is thousands of times cheaper than searching anew.
import type { Gap, GapMeter, Range, Side, Witness } from '#shared/geometry';

export interface MarchGround {
  readonly meter: GapMeter;
  readonly a: Side;
  readonly b: Side;
  readonly moving: 'a' | 'b';
  /** Gaps below this are hit, mm. */
  readonly limit: number;
  /** Gaps proven to be at least this may count as clear, mm. */
  readonly clearFrom: number;
}

const WHOLE: Range = { from: 0, to: 1 };

/** The gap over a range of the moving side's positions, as far as `limit` matters. */
export function gapOver(g: MarchGround, range: Range): Gap {
  const { a, b, limit, clearFrom } = g;
  return g.meter.measure(
    a,
    b,
    (lower, upper) => upper < limit || lower >= clearFrom,
    g.moving === 'a' ? range : WHOLE,
    g.moving === 'b' ? range : WHOLE,
    limit,
  );
}

/** How many paces of what is left lie inside the other part all along; tried in halves. */
function paceInside(g: MarchGround, at: (pace: number) => number, pace: number, last: number): number {
  const way = last > pace ? 1 : -1;
  for (let leap = Math.abs(last - pace); leap > 1; leap >>= 1) {
    const [p, q] = [at(pace), at(pace + way * leap)];
    if (gapOver(g, { from: Math.min(p, q), to: Math.max(p, q) }).containedThroughout) return pace + way * leap;
  }
  return pace;
}

/**
 * Walks from a hit at `position` to `end` in paces of even length.
 * @param paces how many
 * @param witness a pair of faces that hit at `position`
 * @returns the last pace up to which it hit at every pace: 0 at `position`, `paces` at `end`
 */
export function march(g: MarchGround, position: number, end: number, paces: number, witness: Witness | null): number {
  const at = (pace: number): number => (pace === paces ? end : position + (pace / paces) * (end - position));
  let known = witness;
  let pace = 0;
  while (pace < paces) {
    const next = at(pace + 1);
    const positions = g.moving === 'a' ? ([next, 0] as const) : ([0, next] as const);
    if (known !== null && g.meter.distanceOf(g.a, g.b, known, positions) < g.limit) {
      pace += 1;
      continue;
    }
    const near = gapOver(g, { from: next, to: next });
    if (near.upper >= g.limit) return pace;
    known = near.witness;
    // no faces to follow: one part lies inside the other here
    pace = known === null ? paceInside(g, at, pace + 1, paces) : pace + 1;
  }
  return pace;
}
