// A difference applied to a document that may have moved on since it was made.
import { headOf, keyedList, LISTS, ruleHeadOf, sameValue } from './differences';
import type { Changes, Difference, ListName, RecordChange } from './differences';
import type { PairRule, Scene } from './types';

export type ApplyResult =
  | { readonly ok: true; readonly scene: Scene }
  /**
   * Records that stand otherwise than the difference expects, or that would name something that is gone: `components: arm`,
   * `pairs: category pedal | component arm | gap`, `name, unit and accuracy`, `general gaps`.
   */
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

/**
 * Puts records in the order that `wanted` has, keeping those that it does not know behind their neighbours. Two people who
 * each add a part, or each move one in the order, are no conflict: the later order wins for what it knows.
 */
function ordered(present: readonly string[], wanted: readonly string[]): string[] {
  const there = new Set(present);
  const result = [...new Set(wanted)].filter((key) => there.has(key));
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

/** Records that name a group or a component which is not there: one person took it out while another used it. */
function danglingRecords(scene: Scene): string[] {
  const components = new Set(scene.components.map((c) => c.id));
  const groups = new Set(scene.groups.map((g) => g.id));
  const left = scene.components.filter((c) => c.group !== undefined && !groups.has(c.group));
  const { keys } = keyedList(scene, 'pairs');
  const rules = keys.filter((_, i) =>
    scene.rules.pairs[i]!.between.some(
      (side) =>
        ('component' in side && !components.has(side.component)) || ('group' in side && !groups.has(side.group)),
    ),
  );
  return [...left.map((c) => `components: ${c.id}`), ...rules.map((key) => `pairs: ${key}`)];
}

/**
 * Applies a difference to a document that may have moved on. A record that stands as the difference leaves it is fine too,
 * so that a repeated save does no harm. Nothing is applied if any record is in conflict.
 */
export function applyDifference(scene: Scene, d: Difference): ApplyResult {
  const conflicts: string[] = [];
  const head = d.head === undefined ? headOf(scene) : mergeHead(headOf(scene), d.head);
  if (head === null) conflicts.push('name, unit and accuracy');
  const ruleHead = d.ruleHead === undefined ? ruleHeadOf(scene) : mergeHead(ruleHeadOf(scene), d.ruleHead);
  if (ruleHead === null) conflicts.push('general gaps');
  const [lasers, groups, components, pairs] = LISTS.map((list) => applyList(scene, list, d, conflicts));
  if (conflicts.length > 0 || head === null || ruleHead === null) return { ok: false, conflicts };
  const lists = { lasers, groups, components } as Pick<Scene, 'lasers' | 'groups' | 'components'>;
  const next = { ...scene, ...head, ...lists, rules: { ...ruleHead, pairs: pairs as PairRule[] } };
  const dangling = danglingRecords(next);
  return dangling.length > 0 ? { ok: false, conflicts: dangling } : { ok: true, scene: next };
}
