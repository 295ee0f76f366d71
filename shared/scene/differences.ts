// The difference of two documents, record by record: what autosave sends, what undo turns round, what is replayed on a newer
// document. A record is the head, the rules' head, one laser, group, component or pair rule, or the order of a list.
import type { PairRule, Scene, Side } from './types';

/** One record before and after; null where it is not there. */
export interface RecordChange<T> {
  readonly before: T | null;
  readonly after: T | null;
}
export type Changes<T> = Readonly<Record<string, RecordChange<T>>>;

export type Head = Pick<Scene, 'name' | 'display' | 'accuracy'>;
export type RuleHead = Pick<Scene['rules'], 'gap' | 'movingGap' | 'touch'>;
export const LISTS = ['lasers', 'groups', 'components', 'pairs'] as const;
export type ListName = (typeof LISTS)[number];

export interface Difference {
  readonly head?: RecordChange<Head>;
  readonly ruleHead?: RecordChange<RuleHead>;
  readonly lasers?: Changes<Scene['lasers'][number]>;
  readonly groups?: Changes<Scene['groups'][number]>;
  readonly components?: Changes<Scene['components'][number]>;
  /** Keyed by pairKey. */
  readonly pairs?: Changes<PairRule>;
  /** The keys of a list in order, before and after, where order or membership changed. */
  readonly order?: Readonly<
    Partial<Record<ListName, { readonly before: readonly string[]; readonly after: readonly string[] }>>
  >;
}

function sideKey(side: Side): string {
  if ('component' in side) return `component ${side.component}`;
  return 'group' in side ? `group ${side.group}` : `category ${side.category}`;
}

/** Names a pair rule: its two sides, whichever way round, and whether it is a gap or a joint. */
export function pairKey(rule: PairRule): string {
  const [a, b] = rule.between.map(sideKey).sort() as [string, string];
  return `${a} | ${b} | ${rule.joint === undefined ? 'gap' : 'joint'}`;
}

/** Repeats of a pair get a number, so that every rule has a key of its own. */
function pairKeys(pairs: readonly PairRule[]): string[] {
  const seen = new Map<string, number>();
  return pairs.map((rule) => {
    const key = pairKey(rule);
    const count = (seen.get(key) ?? 0) + 1;
    seen.set(key, count);
    return count === 1 ? key : `${key} #${count}`;
  });
}

export interface KeyedList {
  readonly keys: readonly string[];
  readonly byKey: ReadonlyMap<string, unknown>;
}

/** The records of one list under their keys. */
export function keyedList(scene: Scene, list: ListName): KeyedList {
  const records: readonly unknown[] = list === 'pairs' ? scene.rules.pairs : scene[list];
  const keys = list === 'pairs' ? pairKeys(scene.rules.pairs) : scene[list].map((r) => r.id);
  return { keys, byKey: new Map(keys.map((key, i) => [key, records[i]])) };
}

/** Equal as JSON, whatever the order of keys; undefined counts as left out. */
export function sameValue(a: unknown, b: unknown): boolean {
  if (Object.is(a, b) || (a === 0 && b === 0)) return true;
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return false;
  if (Array.isArray(a) !== Array.isArray(b)) return false;
  const keysOf = (o: object): string[] => Object.keys(o).filter((k) => (o as Record<string, unknown>)[k] !== undefined);
  const keys = keysOf(a);
  if (keys.length !== keysOf(b).length) return false;
  return keys.every(
    (k) => Object.hasOwn(b, k) && sameValue((a as Record<string, unknown>)[k], (b as Record<string, unknown>)[k]),
  );
}

export const headOf = ({ name, display, accuracy }: Scene): Head => ({ name, display, accuracy });
export const ruleHeadOf = ({ rules: { gap, movingGap, touch } }: Scene): RuleHead => ({ gap, movingGap, touch });

function listChanges(before: KeyedList, after: KeyedList): Record<string, RecordChange<unknown>> | undefined {
  const changes: [string, RecordChange<unknown>][] = [];
  for (const key of new Set([...before.keys, ...after.keys])) {
    const a = before.byKey.get(key);
    const b = after.byKey.get(key);
    if (a !== b && !sameValue(a, b)) changes.push([key, { before: a ?? null, after: b ?? null }]);
  }
  return changes.length === 0 ? undefined : Object.fromEntries(changes);
}

/** What turns `before` into `after`. */
export function diffScenes(before: Scene, after: Scene): Difference {
  const difference: Record<string, unknown> = {};
  if (!sameValue(headOf(before), headOf(after))) difference['head'] = { before: headOf(before), after: headOf(after) };
  if (!sameValue(ruleHeadOf(before), ruleHeadOf(after))) {
    difference['ruleHead'] = { before: ruleHeadOf(before), after: ruleHeadOf(after) };
  }
  const order: Record<string, unknown> = {};
  for (const list of LISTS) {
    const a = keyedList(before, list);
    const b = keyedList(after, list);
    const changes = listChanges(a, b);
    if (changes !== undefined) difference[list] = changes;
    if (!sameValue(a.keys, b.keys)) order[list] = { before: a.keys, after: b.keys };
  }
  if (Object.keys(order).length > 0) difference['order'] = order;
  return difference;
}

/** The difference that undoes another. */
export function invertDifference(d: Difference): Difference {
  const turned = (value: unknown): unknown => {
    const { before, after } = value as RecordChange<unknown>;
    return { before: after, after: before };
  };
  const turnedAll = (values: object): unknown =>
    Object.fromEntries(Object.entries(values).map(([key, value]) => [key, turned(value)]));
  return Object.fromEntries(
    Object.entries(d)
      .filter(([, value]) => value !== undefined)
      .map(([part, value]) => [
        part,
        part === 'head' || part === 'ruleHead' ? turned(value) : turnedAll(value as object),
      ]),
  );
}

export function isEmptyDifference(d: Difference): boolean {
  return Object.values(d).every((part) => part === undefined || Object.keys(part as object).length === 0);
}

/**
 * Components whose findings a difference may change: those it changes, and those whose group, category or general rules it
 * changes. `scene` is the document after it.
 */
export function touchedComponents(d: Difference, scene: Scene): Set<string> {
  const touched = new Set(Object.keys(d.components ?? {}));
  // the name and the unit of a scene decide nothing
  const all = d.ruleHead !== undefined || d.head?.before?.accuracy !== d.head?.after?.accuracy;
  const groups = new Set(Object.keys(d.groups ?? {}));
  const categories = new Set<string>();
  for (const change of Object.values(d.pairs ?? {})) {
    for (const side of [...(change.before?.between ?? []), ...(change.after?.between ?? [])]) {
      if ('component' in side) touched.add(side.component);
      else if ('group' in side) groups.add(side.group);
      else categories.add(side.category);
    }
  }
  for (const c of scene.components) {
    if (all || (c.group !== undefined && groups.has(c.group)) || categories.has(c.category)) touched.add(c.id);
  }
  return touched;
}
