// The gap ladder as figures: which pairs stand on it, how high, and how the rule is divided.
import { findingKey, VERDICTS, type Finding } from '#shared/check';
import { MM_PER_INCH, type LengthDisplay } from '#shared/units';
import { heightOf } from '../../../lib/finding-words';

export interface Rung {
  readonly key: string;
  /** The worst finding of its pair. */
  readonly finding: Finding;
  /** mm over the zero line. */
  readonly height: number;
  /** Further findings of the pair. */
  readonly others: number;
}

export interface Ladder {
  /** Worst first, then from low to high. */
  readonly rungs: readonly Rung[];
  /** Pairs with more room than the rule is high. */
  readonly above: readonly Rung[];
  /** Joints: they are meant to touch, so how much room they have says nothing. */
  readonly seated: readonly Rung[];
  readonly loose: readonly Rung[];
}

/** What the rule shows, mm. */
export interface Span {
  readonly top: number;
  readonly bottom: number;
}

const worse = (a: Finding, b: Finding): number =>
  VERDICTS.indexOf(a.verdict) - VERDICTS.indexOf(b.verdict) || heightOf(a) - heightOf(b);

/** One rung for each pair, in the order in which they stand from below. */
export function pairRungs(findings: readonly Finding[]): Rung[] {
  const pairs = new Map<string, Finding[]>();
  for (const f of findings) {
    const key = f.between.join('|');
    pairs.set(key, [...(pairs.get(key) ?? []), f]);
  }
  return [...pairs.values()]
    .map((found): Rung => {
      const finding = found.reduce((w, f) => (worse(f, w) < 0 ? f : w));
      return { key: findingKey(finding), finding, height: heightOf(finding), others: found.length - 1 };
    })
    .sort((a, b) => a.height - b.height || (a.key < b.key ? -1 : 1));
}

const TOPS_IN = [1.5, 1, 0.75, 0.5, 0.25] as const;
const TOPS_MM = [40, 25, 20, 15, 10, 5] as const;
const BOTTOMS_IN = [0.25, 0.5, 0.75, 1, 1.5] as const;
const BOTTOMS_MM = [5, 10, 15, 25, 40] as const;

export const isJoint = ({ finding }: Rung): boolean => finding.verdict === 'seated' || finding.verdict === 'loose';

/**
 * The height of the rule: as much as can be labelled, at most 1 1/2 in or 40 mm; its foot reaches the deepest hit.
 * @param fits whether the labels of these rungs fit beside the rule
 */
export function spanOf(
  rungs: readonly Rung[],
  display: LengthDisplay,
  fits: (shown: readonly Rung[]) => boolean,
): Span {
  const inch = display === 'mm' ? 1 : MM_PER_INCH;
  const tops = (display === 'mm' ? TOPS_MM : TOPS_IN).map((t) => t * inch);
  const bottoms = (display === 'mm' ? BOTTOMS_MM : BOTTOMS_IN).map((b) => b * inch);
  const onRule = rungs.filter((r) => !isJoint(r));
  const top = tops.find((t) => fits(onRule.filter((r) => r.height <= t))) ?? tops.at(-1)!;
  const deepest = -Math.min(0, ...onRule.map((r) => r.height));
  const bottom = bottoms.find((b) => b >= deepest) ?? bottoms.at(-1)!;
  // a shallow foot under a high rule would leave the bad ones no room
  return { top, bottom: -Math.max(bottom, bottoms.find((b) => b >= top / 4) ?? bottom) };
}

export function ladderOf(rungs: readonly Rung[], span: Span): Ladder {
  const of = (verdict: string): Rung[] => rungs.filter((r) => r.finding.verdict === verdict);
  const rest = rungs.filter((r) => !isJoint(r));
  return {
    // what is wrong stays on the rule however much room it has
    rungs: rest.filter((r) => r.height <= span.top || r.finding.verdict !== 'clears'),
    above: rest.filter((r) => r.height > span.top && r.finding.verdict === 'clears'),
    seated: of('seated'),
    loose: of('loose'),
  };
}

/** The rungs that get a label where not all can: what is worst by its verdict first; in the order in which they stand. */
export function labelledOf(rungs: readonly Rung[], heightOf: (rung: Rung) => number, room: number): Rung[] {
  const chosen = new Set<Rung>();
  let used = 0;
  for (const rung of [...rungs].sort((a, b) => worse(a.finding, b.finding))) {
    used += heightOf(rung);
    if (used > room) break;
    chosen.add(rung);
  }
  return rungs.filter((r) => chosen.has(r));
}

export interface Tick {
  /** mm over the zero line. */
  readonly at: number;
  /** 0: the shortest. */
  readonly rank: 0 | 1 | 2 | 3;
}

/** Ticks of the rule, as fine as they can be told apart. @param perMm CSS px a mm */
export function ticksOf(span: Span, display: LengthDisplay, perMm: number): Tick[] {
  const isMm = display === 'mm';
  const steps = isMm ? [0.5, 1, 5, 10] : [MM_PER_INCH / 32, MM_PER_INCH / 16, MM_PER_INCH / 8, MM_PER_INCH / 4];
  const step = steps.find((s) => s * perMm >= 5) ?? steps.at(-1)!;
  const ranks = isMm ? [1, 5, 10] : [MM_PER_INCH / 8, MM_PER_INCH / 4, MM_PER_INCH / 2];
  const ticks: Tick[] = [];
  for (let i = Math.ceil(span.bottom / step - 1e-9); i * step <= span.top + 1e-9; i += 1) {
    const at = i * step + 0;
    const rank = ranks.filter((r) => Math.abs(at / r - Math.round(at / r)) < 1e-6).length;
    ticks.push({ at, rank: rank as Tick['rank'] });
  }
  return ticks;
}
