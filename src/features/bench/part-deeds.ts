// What can be done with selected parts, by key, menu or button alike.
import { duplicateComponents, edits, removeComponents, type Scene } from '#shared/scene';
import type { Bench } from './bench-model';
import { checked, labelOf, shift, turn, zeroPoint, type Moved } from './edits';
import { selectionOf, type Selection } from './use-selection';
import { centreOf, type Triple } from './viewport/vectors';
import { sceneBox } from './viewport/extent';

type Stores = Pick<Bench, 'open' | 'session' | 'meshes'>;

export function selectionNow({ open, session }: Pick<Bench, 'open' | 'session'>): Selection {
  const { selected, reach } = session.getState();
  return selectionOf(open.getState().scene, selected, reach);
}

export function movedNow(stores: Pick<Bench, 'open' | 'session'>): Moved {
  const { ids, group } = selectionNow(stores);
  return { parts: ids, group };
}

const mayEdit = ({ open }: Pick<Bench, 'open'>): boolean => open.getState().canEdit;

/** @param by mm in the car */
export function nudge(stores: Stores, by: Triple): void {
  const moved = movedNow(stores);
  if (!mayEdit(stores) || moved.parts.length === 0) return;
  const { scene, apply } = stores.open.getState();
  apply(checked(labelOf('Move', scene, moved), (s) => shift(s, moved, by)));
}

/** Turns in place, about the zero point of what is selected. */
export function turnBy(stores: Stores, axis: Triple, degrees: number): void {
  const moved = movedNow(stores);
  if (!mayEdit(stores) || moved.parts.length === 0) return;
  const { scene, apply } = stores.open.getState();
  apply(checked(labelOf('Turn', scene, moved), (s) => turn(s, moved, zeroPoint(s, moved), axis, degrees)));
}

/** How far a copy stands beside its original, mm: to the right, so that both can be seen. */
const BESIDE: Triple = [0, 50, 0];

export function duplicate(stores: Stores): void {
  const { ids, moving, group } = selectionNow(stores);
  if (!mayEdit(stores) || ids.length === 0) return;
  const all = group === null ? ids : [...moving];
  const { scene, apply } = stores.open.getState();
  const copied = duplicateComponents(scene, all, BESIDE).ids;
  apply(edits.duplicateComponents(scene, all, BESIDE));
  stores.session.getState().select(copied);
}

export interface Removed {
  readonly names: readonly string[];
  /** Brings them back, as long as nothing else was done since. */
  readonly undo: () => void;
}

/** Takes parts out of the document; undo brings them back. */
export function remove(stores: Stores): Removed | null {
  const { moving } = selectionNow(stores);
  if (!mayEdit(stores) || moving.size === 0) return null;
  const { scene, apply } = stores.open.getState();
  const ids = [...moving];
  const names = ids.map((id) => scene.components.find((c) => c.id === id)?.name ?? id);
  const label = labelOf('Delete', scene, { parts: ids, group: null });
  apply(checked(label, (s) => withoutEmptyGroups(removeComponents(s, ids))));
  stores.session.getState().select([]);
  const after = stores.open.getState().scene;
  const undo = (): void => {
    const { scene: now, undo: takeBack } = stores.open.getState();
    if (now === after) takeBack();
  };
  return { names, undo };
}

export const sayRemoved = (names: readonly string[]): string =>
  `Deleted ${names.length === 1 ? names[0] : `${names.length} parts`}.`;

function withoutEmptyGroups(scene: Scene): Scene {
  const empty = scene.groups.filter((g) => !scene.components.some((c) => c.group === g.id));
  return empty.reduce((s, g) => edits.partAgain(s, g.id).edit(s), scene);
}

/** Clamps the selected parts together; the group's zero point is the middle of them, on whole millimetres. */
export function clamp(stores: Stores): void {
  const { ids, moving } = selectionNow(stores);
  if (!mayEdit(stores) || ids.length < 2) return;
  const { scene, apply } = stores.open.getState();
  const box = sceneBox(scene, stores.meshes, moving);
  const at = box === null ? ([0, 0, 0] as const) : (centreOf(box).map(Math.round) as unknown as Triple);
  const name = freshName(scene, 'Group');
  apply(edits.clampTogether(scene, ids, name, at));
  stores.session.getState().set({ reach: 'group' });
}

function freshName(scene: Scene, name: string): string {
  const taken = new Set(scene.groups.map((g) => g.name));
  for (let n = 1; ; n += 1) if (!taken.has(`${name} ${n}`)) return `${name} ${n}`;
}

export function partGroup(stores: Stores): void {
  const { main } = selectionNow(stores);
  if (!mayEdit(stores) || main?.group === undefined) return;
  const { scene, apply } = stores.open.getState();
  apply(edits.partAgain(scene, main.group));
  stores.session.getState().set({ reach: 'part' });
}

export function takeOutOfGroup(stores: Stores): void {
  const { main } = selectionNow(stores);
  if (!mayEdit(stores) || main?.group === undefined) return;
  const { scene, apply } = stores.open.getState();
  apply(edits.moveToGroup(scene, main.id, undefined));
}
