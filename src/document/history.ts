// What was done and can be undone: each edit as its difference, under the edit's label. Undo applies the difference turned
// round, so that it still works after somebody else's changes have come in, and touches nothing of theirs.
import { applyDifference, diffScenes, invertDifference, isEmptyDifference, loadScene } from '#shared/scene';
import type { Difference, Scene } from '#shared/scene';

export interface Deed {
  readonly label: string;
  readonly difference: Difference;
}

export interface History {
  /** Latest last. */
  readonly done: readonly Deed[];
  /** Next to be redone last. */
  readonly undone: readonly Deed[];
}

export const NO_HISTORY: History = { done: [], undone: [] };

/** More than a day at the bench; the oldest go first. */
const MOST_DEEDS = 1000;

/** Notes an edit that turned `before` into `after`. An edit that changed nothing leaves no step. */
export function noted(history: History, label: string, before: Scene, after: Scene): History {
  const difference = diffScenes(before, after);
  if (isEmptyDifference(difference)) return history;
  return { done: [...history.done, { label, difference }].slice(-MOST_DEEDS), undone: [] };
}

export interface Step {
  readonly history: History;
  readonly scene: Scene;
}

/** The scene with the difference, if it still fits and leaves a document that loads. */
function changed(scene: Scene, difference: Difference): Scene | null {
  const applied = applyDifference(scene, difference);
  return applied.ok && loadScene(applied.scene).ok ? applied.scene : null;
}

export function undone(history: History, scene: Scene): Step | null {
  const deed = history.done.at(-1);
  if (deed === undefined) return null;
  const before = changed(scene, invertDifference(deed.difference));
  if (before === null) return null;
  return { scene: before, history: { done: history.done.slice(0, -1), undone: [...history.undone, deed] } };
}

export function redone(history: History, scene: Scene): Step | null {
  const deed = history.undone.at(-1);
  if (deed === undefined) return null;
  const after = changed(scene, deed.difference);
  if (after === null) return null;
  return { scene: after, history: { done: [...history.done, deed], undone: history.undone.slice(0, -1) } };
}

/**
 * The steps that still can be taken from `scene` on, one after another, after somebody else's changes came in. A step over a
 * record that they changed is left out: undoing it would undo theirs.
 */
export function reconciled(history: History, scene: Scene): History {
  const walk = (deeds: readonly Deed[], turn: (d: Difference) => Difference): Deed[] => {
    const kept: Deed[] = [];
    let at = scene;
    for (const deed of deeds.toReversed()) {
      const next = changed(at, turn(deed.difference));
      if (next === null) continue;
      at = next;
      kept.push(deed);
    }
    return kept.reverse();
  };
  return { done: walk(history.done, invertDifference), undone: walk(history.undone, (d) => d) };
}
