// A scene as text: one text for one scene, which the product hashes, and the text that a person's file holds.
import type { Scene } from './types';

function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted);
  if (typeof value !== 'object' || value === null) return value === 0 ? 0 : value;
  const entries = Object.entries(value).filter(([, v]) => v !== undefined);
  entries.sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
  return Object.fromEntries(entries.map(([k, v]) => [k, sorted(v)]));
}

/** The scene as JSON with its keys in order, defaults written out, no blanks. Equal scenes give equal texts. */
export function canonicalSceneText(scene: Scene): string {
  return JSON.stringify(sorted(scene));
}

/**
 * The scene as a file to take away: indented, keys in the schema's order, each mesh under the path that it has beside the
 * document instead of the name by which the product keeps it.
 * @param paths path in the bundle by the mesh's name in `scene`; a mesh that is not in it keeps its name
 */
export function sceneForExport(scene: Scene, paths: ReadonlyMap<string, string> = new Map()): string {
  const components = scene.components.map((c) => ({
    ...c,
    solids: c.solids.map((s) =>
      s.shape.kind === 'mesh' ? { ...s, shape: { ...s.shape, mesh: paths.get(s.shape.mesh) ?? s.shape.mesh } } : s,
    ),
  }));
  return `${JSON.stringify({ ...scene, components }, null, 2)}\n`;
}
