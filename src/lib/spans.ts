// Where on its stroke a motion hits or is tight, over all that it meets.
import type { Finding, Span } from '#shared/check';

const covers = (f: Finding, component: string, motion: string): number =>
  f.motions.findIndex((m) => m.component === component && m.motion === motion);

/** Stretches in order, those that touch or overlap made one. */
export function joinSpans(spans: readonly Span[]): Span[] {
  const out: [number, number][] = [];
  for (const [from, to] of [...spans].sort((a, b) => a[0] - b[0])) {
    const last = out.at(-1);
    if (last !== undefined && from <= last[1] + 1e-9) last[1] = Math.max(last[1], to);
    else out.push([from, to]);
  }
  return out;
}

/**
 * All stretches of one motion. Where it was checked against another motion the report has no stretches; there the place of
 * the finding itself stands for them.
 */
export function spansOf(
  findings: readonly Finding[],
  component: string,
  motion: string,
): { readonly hits: Span[]; readonly tight: Span[] } {
  const hits: Span[] = [];
  const tight: Span[] = [];
  for (const f of findings) {
    const i = covers(f, component, motion);
    if (i < 0) continue;
    const at = f.at.positions[i] ?? 0;
    if (f.verdict === 'hits') hits.push(...(f.hitSpans ?? [[at, at]]));
    if (f.verdict === 'hits' || f.verdict === 'tight') tight.push(...(f.tightSpans ?? [[at, at]]));
  }
  return { hits: joinSpans(hits), tight: joinSpans(tight) };
}
