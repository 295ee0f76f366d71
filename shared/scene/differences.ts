// The difference of two documents, record by record: what autosave sends, what undo turns round, what is replayed on a newer
// document. A record is the head, the rules' head, one laser, group, component or pair rule, or the order of a list.
import { z } from 'zod';
import { headSchema, recordSchemas, ruleHeadSchema } from './schema';
import type { PairRule, Scene, Side } from './types';

/** One record before and after; null where it is not there. */
export interface RecordChange<T> {
  readonly before: T | null;
  readonly after: T | null;
}
type Changes<T> = Readonly<Record<string, RecordChange<T>>>;

type Head = Pick<Scene, 'name' | 'display' | 'accuracy'>;
type RuleHead = Pick<Scene['rules'], 'gap' | 'movingGap' | 'touch'>;
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

interface KeyedList {
  readonly keys: readonly string[];
  readonly byKey: ReadonlyMap<string, unknown>;
}

function keyedList(scene: Scene, list: ListName): KeyedList {
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
  return keys.every((k) => sameValue((a as Record<string, unknown>)[k], (b as Record<string, unknown>)[k]));
}

const headOf = ({ name, display, accuracy }: Scene): Head => ({ name, display, accuracy });
const ruleHeadOf = ({ rules: { gap, movingGap, touch } }: Scene): RuleHead => ({ gap, movingGap, touch });

function listChanges(before: KeyedList, after: KeyedList): Record<string, RecordChange<unknown>> | undefined {
  const changes: Record<string, RecordChange<unknown>> = {};
  for (const key of new Set([...before.keys, ...after.keys])) {
    const a = before.byKey.get(key);
    const b = after.byKey.get(key);
    if (a !== b && !sameValue(a, b)) changes[key] = { before: a ?? null, after: b ?? null };
  }
  return Object.keys(changes).length === 0 ? undefined : changes;
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
    Object.entries(d).map(([part, value]) => [
      part,
      part === 'head' || part === 'ruleHead' ? turned(value) : turnedAll(value as object),
    ]),
  );
}

export function isEmptyDifference(d: Difference): boolean {
  return Object.keys(d).length === 0;
}

export type ApplyResult =
  | { readonly ok: true; readonly scene: Scene }
  /** Records that stand otherwise than the difference expects, as a person would name them. */
  | { readonly ok: false; readonly conflicts: readonly string[] };

/** Field by field where a head allows it: two people may change name and accuracy at once. */
function mergeHead<T extends object>(now: T, change: RecordChange<T>): T | null {
  const { before, after } = change;
  if (before === null || after === null) return null;
  const merged = { ...now };
  for (const key of Object.keys(after) as (keyof T)[]) {
    if (sameValue(before[key], after[key])) continue;
    if (!sameValue(now[key], before[key]) && !sameValue(now[key], after[key])) return null;
    merged[key] = after[key];
  }
  return merged;
}

/** Puts records in the order that `after` wants, keeping those that it does not know next to their neighbours. */
function ordered(present: readonly string[], wanted: readonly string[]): string[] {
  const there = new Set(present);
  const result = wanted.filter((key) => there.has(key));
  const placed = new Set(result);
  for (const [i, key] of present.entries()) {
    if (placed.has(key)) continue;
    const neighbour = present.slice(0, i).findLast((k) => placed.has(k));
    result.splice(neighbour === undefined ? 0 : result.indexOf(neighbour) + 1, 0, key);
    placed.add(key);
  }
  return result;
}

function applyList(scene: Scene, list: ListName, d: Difference, conflicts: string[]): unknown[] {
  const now = keyedList(scene, list);
  const records = new Map(now.byKey);
  const keys = [...now.keys];
  for (const [key, change] of Object.entries((d[list] ?? {}) as Changes<unknown>)) {
    const current = records.get(key) ?? null;
    if (sameValue(current, change.after)) continue;
    if (!sameValue(current, change.before)) {
      conflicts.push(`${list}: ${key}`);
      continue;
    }
    if (change.after === null) records.delete(key);
    else {
      if (!records.has(key)) keys.push(key);
      records.set(key, change.after);
    }
  }
  const present = keys.filter((key) => records.has(key));
  const wanted = d.order?.[list]?.after;
  return (wanted === undefined ? present : ordered(present, wanted)).map((key) => records.get(key));
}

/** Applies a difference to a document that may have moved on. Nothing is applied if any record is in conflict. */
export function applyDifference(scene: Scene, d: Difference): ApplyResult {
  const conflicts: string[] = [];
  const head = d.head === undefined ? headOf(scene) : mergeHead(headOf(scene), d.head);
  if (head === null) conflicts.push('name, unit and accuracy');
  const ruleHead = d.ruleHead === undefined ? ruleHeadOf(scene) : mergeHead(ruleHeadOf(scene), d.ruleHead);
  if (ruleHead === null) conflicts.push('general gaps');
  const [lasers, groups, components, pairs] = LISTS.map((list) => applyList(scene, list, d, conflicts));
  if (conflicts.length > 0 || head === null || ruleHead === null) return { ok: false, conflicts };
  const lists = { lasers, groups, components } as Pick<Scene, 'lasers' | 'groups' | 'components'>;
  return {
    ok: true,
    scene: { ...scene, ...head, ...lists, rules: { ...ruleHead, pairs: pairs as PairRule[] } },
  };
}

/** Components that a difference changes, or whose group or rules it changes. */
export function touchedComponents(d: Difference, scene: Scene): Set<string> {
  const touched = new Set(Object.keys(d.components ?? {}));
  const all = d.ruleHead !== undefined || d.head !== undefined;
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

const key = z.string().min(1).max(400);
const changeOf = <T extends z.ZodType>(record: T) =>
  z.strictObject({ before: record.nullable(), after: record.nullable() });
const changesOf = <T extends z.ZodType>(record: T) => z.record(key, changeOf(record));
const keys = z.array(key).max(10_000);

/** A difference as it comes over the wire. */
export const differenceSchema = z.strictObject({
  head: changeOf(headSchema).optional(),
  ruleHead: changeOf(ruleHeadSchema).optional(),
  lasers: changesOf(recordSchemas.laser).optional(),
  groups: changesOf(recordSchemas.group).optional(),
  components: changesOf(recordSchemas.component).optional(),
  pairs: changesOf(recordSchemas.pair).optional(),
  order: z
    .strictObject(
      Object.fromEntries(LISTS.map((list) => [list, z.strictObject({ before: keys, after: keys }).optional()])),
    )
    .optional(),
}) as unknown as z.ZodType<Difference>;
