// The few words that the demo's scenes are written in.
import { newPart, type Params } from '#shared/parts';
import {
  defaultTolerance,
  newScene,
  type Category,
  type Component,
  type PairRule,
  type Pose,
  type Scene,
  type Shape,
  type Solid,
  type Source,
  type Vec3,
} from '#shared/scene';

export interface Place {
  readonly at?: Vec3;
  readonly turn?: Vec3;
  readonly group?: string;
  readonly source?: Source;
}

/** A ready-made part with measurements of this car. */
export function readyMade(kind: string, id: string, name: string, params: Params, place: Place = {}): Component {
  const { group, source = 'measured', at, turn } = place;
  const made = newPart(kind, params, { id, name, source });
  if (!made.ok) throw new Error(`${name}: ${made.faults.map((f) => f.message).join(' ')}`);
  const pose: Pose = { ...(at === undefined ? {} : { at }), ...(turn === undefined ? {} : { turn }) };
  return { ...made.component, pose, ...(group === undefined ? {} : { group }) };
}

/** A part of plain solids. */
export function plainPart(
  id: string,
  name: string,
  category: Category,
  solids: readonly Solid[],
  place: Place & Partial<Pick<Component, 'motions' | 'note'>> = {},
): Component {
  const { group, source = 'measured', at, turn, motions = [], note } = place;
  return {
    id,
    name,
    category,
    pose: { ...(at === undefined ? {} : { at }), ...(turn === undefined ? {} : { turn }) },
    ...(group === undefined ? {} : { group }),
    tolerance: defaultTolerance(source, category),
    source,
    ...(note === undefined ? {} : { note }),
    solids,
    motions,
    holes: [],
  };
}

const solid = (id: string, name: string, shape: Shape, at: Vec3, turn: Vec3 = [0, 0, 0]): Solid => ({
  id,
  name,
  shape,
  pose: { ...(at.some((x) => x !== 0) ? { at } : {}), ...(turn.some((x) => x !== 0) ? { turn } : {}) },
});
export const block = (id: string, name: string, size: Vec3, at: Vec3, turn?: Vec3): Solid =>
  solid(id, name, { kind: 'box', size }, at, turn);
export const drum = (id: string, name: string, diameter: number, length: number, at: Vec3, turn?: Vec3): Solid =>
  solid(id, name, { kind: 'cylinder', diameter, length }, at, turn);
export const scanned = (id: string, name: string, mesh: string, scale = 1, at: Vec3 = [0, 0, 0], turn?: Vec3): Solid =>
  solid(id, name, { kind: 'mesh', mesh, scale }, at, turn);

/** The part with its zero point at a place of the car; its solids, written in the car, stay where they are. */
export function zeroedAt(part: Component, zero: Vec3): Component {
  const tidy = (x: number): number => Math.round(x * 1000) / 1000;
  return {
    ...part,
    pose: { at: zero },
    solids: part.solids.map((s) => {
      const at = s.pose?.at ?? [0, 0, 0];
      return { ...s, pose: { ...s.pose, at: [tidy(at[0] - zero[0]), tidy(at[1] - zero[1]), tidy(at[2] - zero[2])] } };
    }),
  };
}

/** Parts that are bolted, welded or hinged together. */
export const joint = (a: string, b: string, allow = 1): PairRule => ({
  between: [{ component: a }, { component: b }],
  joint: { allow },
});

export function sceneOf(
  name: string,
  parts: { readonly groups: Scene['groups']; readonly components: readonly Component[] },
  rules: readonly PairRule[],
  lasers: Scene['lasers'],
): Scene {
  const start = newScene(name, 'in');
  const present = new Set(parts.components.map((c) => c.id));
  const holds = (rule: PairRule): boolean =>
    rule.between.every((side) => !('component' in side) || present.has(side.component));
  return {
    ...start,
    lasers: [...lasers, ...start.lasers],
    groups: parts.groups,
    components: parts.components,
    rules: { ...start.rules, pairs: [...start.rules.pairs, ...rules.filter(holds)] },
  };
}
