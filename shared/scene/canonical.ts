// One text for one scene: what the product stores the hash of.
import type { Scene } from './types';

function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted);
  if (typeof value !== 'object' || value === null) return value === 0 ? 0 : value;
  const entries = Object.entries(value).filter(([, v]) => v !== undefined);
  entries.sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
  return Object.fromEntries(entries.map(([k, v]) => [k, sorted(v)]));
}

/** The scene as JSON with its keys in order, defaults written out, no blanks. */
export function canonicalSceneText(scene: Scene): string {
  return JSON.stringify(sorted(scene));
}
