// Edits of the rules and of the document's head.
import type { PairRule, Rules, Scene, Side } from './types';

export function patchRules(scene: Scene, patch: Partial<Rules>): Scene {
  return { ...scene, rules: { ...scene.rules, ...patch } };
}

export function patchHead(scene: Scene, patch: Partial<Pick<Scene, 'name' | 'display' | 'accuracy'>>): Scene {
  return { ...scene, ...patch };
}

const names = (side: Side, id: string): boolean => 'component' in side && side.component === id;

function sameSide(a: Side, b: Side): boolean {
  if ('component' in a) return 'component' in b && a.component === b.component;
  if ('group' in a) return 'group' in b && a.group === b.group;
  return 'category' in b && a.category === b.category;
}

/** True if a rule is about these two sides, whichever way round. */
export function isBetween(rule: PairRule, a: Side, b: Side): boolean {
  const [x, y] = rule.between;
  return (sameSide(x, a) && sameSide(y, b)) || (sameSide(x, b) && sameSide(y, a));
}

function isThere(scene: Scene, side: Side): boolean {
  if ('component' in side) return scene.components.some((c) => c.id === side.component);
  return 'category' in side || scene.groups.some((g) => g.id === side.group);
}

/** Sets the gap between two sides, mm, in place of the one that is there. */
export function setPairGap(scene: Scene, a: Side, b: Side, gap: number): Scene {
  const isOneComponent = 'component' in a && sameSide(a, b);
  if (isOneComponent || !isThere(scene, a) || !isThere(scene, b)) return scene;
  return replaceRule(scene, { between: [a, b], gap }, (r) => r.joint === undefined && isBetween(r, a, b));
}

/** Joins two components, which may then overlap at rest by `allow` mm; null parts them. */
export function setJoint(scene: Scene, a: string, b: string, allow: number | null): Scene {
  const sides = [{ component: a }, { component: b }] as const;
  const isThis = (r: PairRule): boolean => r.joint !== undefined && isBetween(r, ...sides);
  if (allow === null) return withoutRules(scene, isThis);
  if (a === b || !isThere(scene, sides[0]) || !isThere(scene, sides[1])) return scene;
  return replaceRule(scene, { between: sides, joint: { allow } }, isThis);
}

/** One rule in the place of all the old ones: repeats would go on deciding, as the larger wins. */
function replaceRule(scene: Scene, rule: PairRule, isOld: (r: PairRule) => boolean): Scene {
  const { pairs } = scene.rules;
  const at = pairs.findIndex(isOld);
  if (at < 0) return patchRules(scene, { pairs: [...pairs, rule] });
  return patchRules(scene, { pairs: pairs.flatMap((r, i) => (i === at ? [rule] : isOld(r) ? [] : [r])) });
}

function withoutRules(scene: Scene, isGone: (r: PairRule, index: number) => boolean): Scene {
  const pairs = scene.rules.pairs.filter((r, i) => !isGone(r, i));
  return pairs.length === scene.rules.pairs.length ? scene : patchRules(scene, { pairs });
}

/** Takes out one rule, by its place. */
export function removeRule(scene: Scene, index: number): Scene {
  return withoutRules(scene, (_, i) => i === index);
}

/** The components that a component is jointed to. */
export function jointsOf(scene: Scene, id: string): { readonly other: string; readonly allow: number }[] {
  return scene.rules.pairs.flatMap((rule) => {
    if (rule.joint === undefined) return [];
    const [a, b] = rule.between;
    if (!names(a, id) && !names(b, id)) return [];
    const other = names(a, id) ? b : a;
    return 'component' in other ? [{ other: other.component, allow: rule.joint.allow }] : [];
  });
}
