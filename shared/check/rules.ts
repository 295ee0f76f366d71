// Which rule decides a pair: the most specific that fits, alone.
import type { Component, PairRule, Rules, Side } from '#shared/scene';
import type { RuleKind } from './report';

export interface Decision {
  readonly kind: RuleKind;
  /** Required gap, mm; 0 for a joint. */
  readonly required: number;
  /** Set for a joint: the overlap it may have at rest, mm. */
  readonly allow: number | null;
}

/** Most specific first; a rule's place in it is how its two sides are named. */
const ORDER = [
  'component-component',
  'component-group',
  'component-category',
  'group-group',
  'group-category',
  'category-category',
] as const;
type PairKind = (typeof ORDER)[number];

type SideKind = 'component' | 'group' | 'category';
const sideKind = (side: Side): SideKind => ('component' in side ? 'component' : 'group' in side ? 'group' : 'category');

function pairKind(rule: PairRule): PairKind {
  const [a, b] = rule.between.map(sideKind) as [SideKind, SideKind];
  const found = ORDER.find((kind) => kind === `${a}-${b}` || kind === `${b}-${a}`);
  if (found === undefined) throw new Error(`no rule kind for ${a} and ${b}`);
  return found;
}

function fits(side: Side, c: Component): boolean {
  if ('component' in side) return side.component === c.id;
  return 'group' in side ? c.group !== undefined && side.group === c.group : side.category === c.category;
}

function fitsPair(rule: PairRule, a: Component, b: Component): boolean {
  const [x, y] = rule.between;
  return (fits(x, a) && fits(y, b)) || (fits(x, b) && fits(y, a));
}

/** What decides a pair; `moving` says whether either side moves in the configuration. */
export function decide(rules: Rules, a: Component, b: Component, moving: boolean): Decision {
  let best: PairRule | null = null;
  let bestRank: number = ORDER.length;
  for (const rule of rules.pairs) {
    if (!fitsPair(rule, a, b)) continue;
    const rank = ORDER.indexOf(pairKind(rule));
    if (rank < bestRank || (rank === bestRank && best !== null && outweighs(rule, best))) {
      best = rule;
      bestRank = rank;
    }
  }
  if (best === null) {
    return moving
      ? { kind: 'movingGap', required: rules.movingGap, allow: null }
      : { kind: 'gap', required: rules.gap, allow: null };
  }
  if (best.joint !== undefined) return { kind: 'joint', required: 0, allow: best.joint.allow };
  return { kind: pairKind(best), required: best.gap ?? 0, allow: null };
}

/** Of two equally specific rules a joint wins over a gap, the larger gap and the larger allowance win. */
function outweighs(rule: PairRule, best: PairRule): boolean {
  if (rule.joint !== undefined) return best.joint === undefined || rule.joint.allow > best.joint.allow;
  return best.joint === undefined && (rule.gap ?? 0) > (best.gap ?? 0);
}
