// Two people's changes of one document put together. What touches different records is in both; what both changed is
// disputed, and comes out as two whole documents to choose from: with my version of the disputed records, and with theirs.
import { applyDifference, diffScenes, loadScene, poseFromRigid, worldPose } from '#shared/scene';
import type { Component, Difference, PairRule, Scene, Side } from '#shared/scene';

export type Merged =
  | { readonly kind: 'merged'; readonly scene: Scene }
  | {
      readonly kind: 'conflict';
      readonly mine: Scene;
      readonly theirs: Scene;
      /** As applyDifference names them. */
      readonly records: readonly string[];
    };

const LISTS = ['lasers', 'groups', 'components', 'pairs'] as const;
const HEAD = 'name, unit and accuracy';
const RULE_HEAD = 'general gaps';

/** The part of a difference whose records are, or are not, among `names`. The order of lists goes with what is not. */
function part(d: Difference, names: ReadonlySet<string>, wanted: boolean): Difference {
  const out: Record<string, unknown> = {};
  if (d.head !== undefined && names.has(HEAD) === wanted) out['head'] = d.head;
  if (d.ruleHead !== undefined && names.has(RULE_HEAD) === wanted) out['ruleHead'] = d.ruleHead;
  for (const list of LISTS) {
    const changes = Object.entries(d[list] ?? {}).filter(([key]) => names.has(`${list}: ${key}`) === wanted);
    if (changes.length > 0) out[list] = Object.fromEntries(changes);
  }
  if (d.order !== undefined && !wanted) out['order'] = d.order;
  return out;
}

const idOf = (side: Side): string | null =>
  'component' in side ? `components: ${side.component}` : 'group' in side ? `groups: ${side.group}` : null;

const refsOfRule = (rule: PairRule): string[] => rule.between.flatMap((side) => idOf(side) ?? []);
const refsOfComponent = (c: Component): string[] => (c.group === undefined ? [] : [`groups: ${c.group}`]);

/** A record that names something gone is disputed together with whoever took that away. */
function withRemovals(d: Difference, theirs: Scene, conflict: string): string[] {
  const at = conflict.indexOf(': ');
  const list = conflict.slice(0, at);
  const key = conflict.slice(at + 2);
  const refs =
    list === 'components'
      ? [d.components?.[key]?.after, theirs.components.find((c) => c.id === key)].flatMap((c) =>
          c === undefined || c === null ? [] : refsOfComponent(c),
        )
      : list === 'pairs'
        ? [d.pairs?.[key]?.after, ...theirs.rules.pairs].flatMap((r) =>
            r === undefined || r === null ? [] : refsOfRule(r),
          )
        : [];
  const removed = refs.filter((ref) => {
    const [where, id] = ref.split(': ') as ['components' | 'groups', string];
    return d[where]?.[id]?.after === null;
  });
  return [conflict, ...removed];
}

/** My change with as much left out as theirs demands. */
function cleanPart(d: Difference, theirs: Scene): { scene: Scene; disputed: Set<string> } {
  const disputed = new Set<string>();
  for (;;) {
    const applied = applyDifference(theirs, part(d, disputed, false));
    if (applied.ok) return { scene: applied.scene, disputed };
    const before = disputed.size;
    for (const conflict of applied.conflicts) for (const name of withRemovals(d, theirs, conflict)) disputed.add(name);
    // nothing new to leave out, and still no fit: all of it is disputed
    if (disputed.size === before) return { scene: theirs, disputed: new Set([...disputed, ...namesOf(d)]) };
  }
}

function namesOf(d: Difference): string[] {
  return [
    ...(d.head === undefined ? [] : [HEAD]),
    ...(d.ruleHead === undefined ? [] : [RULE_HEAD]),
    ...LISTS.flatMap((list) => Object.keys(d[list] ?? {}).map((key) => `${list}: ${key}`)),
  ];
}

/** Puts my version of the disputed records over theirs, and what mine needs with it. */
function forced(clean: Scene, disputed: Difference, mine: Scene): Scene {
  let next: Scene = {
    ...clean,
    ...changedFields(disputed.head),
    lasers: overlaid(clean.lasers, disputed.lasers),
    groups: overlaid(clean.groups, disputed.groups),
    components: overlaid(clean.components, disputed.components),
    rules: { ...clean.rules, ...changedFields(disputed.ruleHead), pairs: overlaidRules(clean, disputed) },
  };
  // a rule that mine makes, or a part that mine puts into a group, brings back what it names
  const named = new Set(
    Object.values(disputed.pairs ?? {}).flatMap((c) => (c.after === null ? [] : refsOfRule(c.after))),
  );
  const missing = mine.components.filter(
    (c) => named.has(`components: ${c.id}`) && !next.components.some((other) => other.id === c.id),
  );
  next = { ...next, components: [...next.components, ...missing] };
  const needed = new Set([...named, ...next.components.flatMap(refsOfComponent)]);
  const groups = mine.groups.filter(
    (g) => needed.has(`groups: ${g.id}`) && !next.groups.some((other) => other.id === g.id),
  );
  next = { ...next, groups: [...next.groups, ...groups] };
  const there = new Set(next.groups.map((g) => g.id));
  const components = next.components.map((c) => {
    if (c.group === undefined || there.has(c.group)) return c;
    // I took the group apart: the part stays where it stands in the car
    const { group: _gone, ...alone } = c;
    return { ...alone, pose: poseFromRigid(worldPose(clean, c)) };
  });
  next = { ...next, components };
  const has = (ref: string): boolean => {
    const [list, id] = ref.split(': ') as ['components' | 'groups', string];
    return next[list].some((record: { readonly id: string }) => record.id === id);
  };
  return { ...next, rules: { ...next.rules, pairs: next.rules.pairs.filter((r) => refsOfRule(r).every(has)) } };
}

function changedFields<T extends object>(change: { readonly before: T | null; readonly after: T | null } | undefined) {
  if (change?.after == null) return {};
  const { before, after } = change;
  return Object.fromEntries(
    Object.entries(after).filter(([key, value]) => before === null || before[key as keyof T] !== value),
  ) as Partial<T>;
}

function overlaid<T extends { readonly id: string }>(
  list: readonly T[],
  changes: Readonly<Record<string, { readonly after: T | null }>> | undefined,
): T[] {
  const rest = new Map(Object.entries(changes ?? {}));
  const kept = list.flatMap((record) => {
    const change = rest.get(record.id);
    rest.delete(record.id);
    return change === undefined ? [record] : change.after === null ? [] : [change.after];
  });
  return [...kept, ...[...rest.values()].flatMap((change) => change.after ?? [])];
}

function overlaidRules(clean: Scene, disputed: Difference): PairRule[] {
  const changes = disputed.pairs ?? {};
  if (Object.keys(changes).length === 0) return [...clean.rules.pairs];
  const bare: Scene = { ...clean, rules: { ...clean.rules, pairs: [] } };
  const keyed = Object.entries(diffScenes(bare, clean).pairs ?? {}).map(
    ([key, change]) => [key, change.after] as const,
  );
  const rules = new Map(keyed);
  for (const [key, { after }] of Object.entries(changes)) {
    if (after === null) rules.delete(key);
    else rules.set(key, after);
  }
  return [...rules.values()].flatMap((rule) => rule ?? []);
}

/** Puts my changes since `base` on top of theirs. */
export function merge(base: Scene, mine: Scene, theirs: Scene): Merged {
  const difference = diffScenes(base, mine);
  const { scene, disputed } = cleanPart(difference, theirs);
  const isSound = loadScene(scene).ok;
  if (disputed.size === 0 && isSound) return { kind: 'merged', scene };
  const clean = isSound ? scene : theirs;
  const own = forced(clean, isSound ? part(difference, disputed, true) : difference, mine);
  return {
    kind: 'conflict',
    mine: loadScene(own).ok ? own : mine,
    theirs: clean,
    records: [...(isSound ? disputed : namesOf(difference))],
  };
}
