// What has to be compared: one task for each finding that the report will hold, so that tasks can be shared out to workers
// and done again one by one.
import { decide, type Decision } from './rules';
import type { Prepared, PreparedComponent, PreparedMotion } from './prepare';

export interface TaskSide {
  readonly component: PreparedComponent;
  /** Places in the component's list of solids. */
  readonly solids: readonly number[];
  readonly motion: PreparedMotion | null;
}

export interface Task {
  /** Sides in the order of their ids. */
  readonly a: TaskSide;
  readonly b: TaskSide;
  readonly decision: Decision;
}

export interface Plan {
  readonly tasks: readonly Task[];
  /** Jointed pairs, by id; they are not checked in motion. */
  readonly unchecked: readonly (readonly [string, string])[];
}

const all = (c: PreparedComponent): TaskSide => ({ component: c, solids: c.solids.map((_, i) => i), motion: null });
const fixed = (c: PreparedComponent): TaskSide => ({ component: c, solids: c.fixed, motion: null });
const moved = (c: PreparedComponent, m: PreparedMotion): TaskSide => ({ component: c, solids: m.solids, motion: m });

function pairTasks(prepared: Prepared, a: PreparedComponent, b: PreparedComponent): Task[] {
  const { rules } = prepared.scene;
  const resting = decide(rules, a.component, b.component, false);
  const tasks: Task[] = [];
  const add = (x: TaskSide, y: TaskSide, decision: Decision): void => {
    if (x.solids.length > 0 && y.solids.length > 0) tasks.push({ a: x, b: y, decision });
  };
  add(all(a), all(b), resting);
  if (resting.allow !== null) return tasks;
  const moving = decide(rules, a.component, b.component, true);
  for (const m of a.operating) for (const n of b.operating) add(moved(a, m), moved(b, n), moving);
  for (const m of a.operating) add(moved(a, m), fixed(b), moving);
  for (const n of b.operating) add(fixed(a), moved(b, n), moving);
  for (const m of a.service) add(moved(a, m), all(b), moving);
  for (const n of b.service) add(all(a), moved(b, n), moving);
  return tasks;
}

/** Ids in the order of their characters' code units, the same in every locale. */
export const byId = (x: string, y: string): number => (x < y ? -1 : x > y ? 1 : 0);

/**
 * All comparisons of a scene.
 * @param touching if given, only pairs with one of these components
 */
export function planCheck(prepared: Prepared, touching?: ReadonlySet<string>): Plan {
  const sorted = [...prepared.components].sort((x, y) => byId(x.component.id, y.component.id));
  const tasks: Task[] = [];
  const unchecked: [string, string][] = [];
  for (const [i, a] of sorted.entries()) {
    for (const b of sorted.slice(i + 1)) {
      if (decide(prepared.scene.rules, a.component, b.component, false).allow !== null) {
        unchecked.push([a.component.id, b.component.id]);
      }
      if (touching === undefined || touching.has(a.component.id) || touching.has(b.component.id)) {
        tasks.push(...pairTasks(prepared, a, b));
      }
    }
  }
  return { tasks, unchecked };
}
