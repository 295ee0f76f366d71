// The tags of the rail in the fitting order, those that are clamped together side by side.
import { isBodyPanel, type Component, type Scene } from '#shared/scene';

export interface Cluster {
  readonly key: string;
  readonly label: string;
  /** The group's id; null for parts on their own. */
  readonly group: string | null;
  readonly parts: readonly Component[];
}

/** A group stands where its first part does. Parts on their own that follow one another make one cluster. */
export function clustersOf(scene: Scene): Cluster[] {
  const clusters: { key: string; label: string; group: string | null; parts: Component[] }[] = [];
  for (const part of scene.components) {
    const group = scene.groups.find((g) => g.id === part.group) ?? null;
    if (group !== null) {
      const there = clusters.find((c) => c.group === group.id);
      if (there === undefined) clusters.push({ key: group.id, label: group.name, group: group.id, parts: [part] });
      else there.parts.push(part);
      continue;
    }
    const label = isBodyPanel(part.category) ? 'Body' : 'Single parts';
    const last = clusters.at(-1);
    if (last !== undefined && last.group === null && last.label === label) last.parts.push(part);
    else clusters.push({ key: `at ${part.id}`, label, group: null, parts: [part] });
  }
  return clusters;
}

export const orderOf = (clusters: readonly Cluster[]): string[] => clusters.flatMap((c) => c.parts.map((p) => p.id));

/** The order with one part moved to a place among the others; places are counted without it. */
export function movedTo(order: readonly string[], id: string, place: number): string[] {
  const rest = order.filter((x) => x !== id);
  rest.splice(Math.max(0, Math.min(rest.length, place)), 0, id);
  return rest;
}
