// Where the gap of a finding comes from, in words.
import type { Finding } from '#shared/check';
import { DEFAULT_GENERAL, ruleOrigin, type PairRule, type Scene, type Side } from '#shared/scene';
import { categoryLabel, type WordChoice } from './part-words';

export function sideWords(scene: Scene, side: Side, words: WordChoice): string {
  if ('component' in side) return scene.components.find((c) => c.id === side.component)?.name ?? side.component;
  if ('group' in side) return `any of ${scene.groups.find((g) => g.id === side.group)?.name ?? side.group}`;
  return `any ${categoryLabel(side.category, words)}`;
}

/** "common practice, no source: a finger's width", or "yours". */
export const originOf = (rule: PairRule): string => ruleOrigin(rule) ?? 'yours';

export function generalOrigin(scene: Scene, which: 'gap' | 'movingGap'): string {
  return scene.rules[which] === DEFAULT_GENERAL[which].value ? DEFAULT_GENERAL[which].origin : 'yours';
}

const fits = (scene: Scene, side: Side, id: string): boolean => {
  const component = scene.components.find((c) => c.id === id);
  if (component === undefined) return false;
  if ('component' in side) return side.component === id;
  return 'group' in side ? component.group === side.group : component.category === side.category;
};

/** The kinds of the two sides of a rule, as the report names them. */
function kindOf({ between }: PairRule): string {
  const order = ['component', 'group', 'category'];
  return between
    .map((side) => Object.keys(side)[0]!)
    .sort((a, b) => order.indexOf(a) - order.indexOf(b))
    .join('-');
}

/** The row of the table that decided a finding. */
export function decidingRule(scene: Scene, finding: Finding): PairRule | null {
  const [a, b] = finding.between;
  const found = scene.rules.pairs.filter((rule) => {
    const isJoint = rule.joint !== undefined;
    if (isJoint !== (finding.rule === 'joint') || (!isJoint && kindOf(rule) !== finding.rule)) return false;
    const [x, y] = rule.between;
    return (fits(scene, x, a) && fits(scene, y, b)) || (fits(scene, x, b) && fits(scene, y, a));
  });
  return found.find((rule) => rule.joint !== undefined || rule.gap === finding.required) ?? found[0] ?? null;
}

export function ruleWords(scene: Scene, finding: Finding): string {
  if (finding.rule === 'joint') return 'a joint: they are meant to touch';
  if (finding.rule === 'gap' || finding.rule === 'movingGap') return generalOrigin(scene, finding.rule);
  const rule = decidingRule(scene, finding);
  return rule === null ? 'a rule of this scene' : originOf(rule);
}

/** The row of the table that decided a finding, as a person would read it out: "any pedal to any steering column". */
export function ruleName(scene: Scene, finding: Finding, words: WordChoice): string {
  if (finding.rule === 'joint') return 'joint';
  if (finding.rule === 'movingGap') return 'the general gap of moving parts';
  if (finding.rule === 'gap') return 'the general gap of fixed parts';
  const rule = decidingRule(scene, finding);
  if (rule === null) return 'a rule of this scene';
  const [a, b] = rule.between.map((side) => sideWords(scene, side, words));
  return `${a} to ${b}`;
}
