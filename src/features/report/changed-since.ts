// Whether the scene still is what was checked, and what differs if not.
import { diffScenes, loadScene, touchedComponents, type Scene } from '#shared/scene';

export interface ChangedSince {
  /** Names of the parts that differ, those that are gone included. */
  readonly parts: readonly string[];
}

/** Null: nothing that a check depends on differs. */
export function changedSince(checked: Scene, document: unknown): ChangedSince | null {
  const loaded = loadScene(document);
  if (!loaded.ok) return { parts: [] };
  const now = loaded.scene;
  const touched = touchedComponents(diffScenes(checked, now), now);
  if (touched.size === 0) return null;
  const nameOf = (id: string): string =>
    now.components.find((c) => c.id === id)?.name ?? checked.components.find((c) => c.id === id)?.name ?? id;
  return { parts: [...touched].map(nameOf) };
}
