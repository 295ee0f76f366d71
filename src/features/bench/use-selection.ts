// What is selected, and what moves with it.
import { useMemo } from 'react';
import type { Component, Scene } from '#shared/scene';
import { useOpen, useSession } from './bench-model';
import type { Reach } from './session';

export interface Selection {
  /** Ids in the order in which they were selected, those that are still there. */
  readonly ids: readonly string[];
  /** The part that the tape is for. */
  readonly main: Component | null;
  /** The group that is meant, if the reach is the group. */
  readonly group: string | null;
  /** All that a move takes along. */
  readonly moving: ReadonlySet<string>;
}

export function selectionOf(scene: Scene, selected: readonly string[], reach: Reach): Selection {
  const ids = selected.filter((id) => scene.components.some((c) => c.id === id));
  const main = scene.components.find((c) => c.id === ids.at(-1)) ?? null;
  const isOne = ids.every((id) => scene.components.find((c) => c.id === id)?.group === main?.group);
  const group = reach === 'group' && isOne ? (main?.group ?? null) : null;
  const members = group === null ? [] : scene.components.filter((c) => c.group === group).map((c) => c.id);
  return { ids, main, group, moving: new Set([...ids, ...members]) };
}

export function useSelection(): Selection {
  const scene = useOpen((open) => open.scene);
  const selected = useSession((s) => s.selected);
  const reach = useSession((s) => s.reach);
  return useMemo(() => selectionOf(scene, selected, reach), [scene, selected, reach]);
}
