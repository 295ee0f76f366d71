// What is different about a record in one version of a scene, in words.
import type { Component, Scene } from '#shared/scene';
import { formatAngle, formatLength, type LengthDisplay } from '#shared/units';

type At = readonly [number, number, number];

const place = (at: At | undefined, display: LengthDisplay): string =>
  (at ?? [0, 0, 0]).map((mm) => formatLength(mm, display, { denominator: 64 })).join(', ');

/** The parts of a component that differ from the other version's. */
function differences(c: Component, other: Component, display: LengthDisplay): string[] {
  const out: string[] = [];
  const differs = (a: unknown, b: unknown): boolean => JSON.stringify(a) !== JSON.stringify(b);
  if (c.name !== other.name) out.push(`called ${c.name}`);
  if (differs(c.pose.at, other.pose.at)) out.push(`at ${place(c.pose.at, display)}`);
  if (differs(c.pose.turn, other.pose.turn))
    out.push(`turned ${(c.pose.turn ?? [0, 0, 0]).map((d) => formatAngle(d)).join(', ')}`);
  if (differs(c.solids, other.solids)) out.push(`${c.solids.length === 1 ? 'its size' : 'its solids'}`);
  if (differs(c.motions, other.motions)) out.push(c.motions.map((m) => m.name).join(', ') || 'no motion');
  if (c.tolerance !== other.tolerance) out.push(`tolerance ${formatLength(c.tolerance, display, { denominator: 64 })}`);
  if (c.category !== other.category) out.push(`a ${c.category.replaceAll('-', ' ')}`);
  if (c.group !== other.group) out.push(c.group === undefined ? 'in no group' : `in ${c.group}`);
  if (c.note !== other.note) out.push(c.note === undefined ? 'no note' : `note: ${c.note.slice(0, 60)}`);
  return out;
}

/** `record` is a kind and a key, as the save state names them: "components brake-pedal". */
export function sayRecord(record: string, scene: Scene, other: Scene, display: LengthDisplay): string {
  const at = record.indexOf(' ');
  const [kind, id] = at < 0 ? [record, ''] : [record.slice(0, at), record.slice(at + 1)];
  const component = scene.components.find((c) => c.id === id);
  if (component !== undefined) {
    const there = other.components.find((c) => c.id === id);
    if (there === undefined) return `still there, at ${place(component.pose.at, display)}`;
    return differences(component, there, display).join('; ') || 'the same';
  }
  if (other.components.some((c) => c.id === id)) return 'deleted';
  if (kind.startsWith('head') || kind.startsWith('name')) return scene.name;
  const group = scene.groups.find((g) => g.id === id);
  if (group !== undefined) return `${group.name}, at ${place(group.pose.at, display)}`;
  const laser = scene.lasers.find((l) => l.id === id);
  if (laser !== undefined) return `${laser.name}, through ${place(laser.point, display)}`;
  return 'changed';
}
