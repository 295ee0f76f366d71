// Named edits: small pure changes of a document. An edit of something that is not there changes nothing.
import { composeRigid, invertRigid } from '#shared/units';
import { poseFromRigid, rigidOf } from './pose';
import type { Component, Group, Laser, PairRule, Pose, Rules, Scene, Side, Vec3 } from './types';

/** An id that the list does not have yet, made from a name. */
export function freshId(list: readonly { readonly id: string }[], name: string): string {
  const base =
    name
      .toLowerCase()
      .replace(/[^a-z0-9]+/g, '-')
      .replace(/^-+|-+$/g, '')
      .slice(0, 56) || 'part';
  const taken = new Set(list.map((x) => x.id));
  if (!taken.has(base)) return base;
  for (let n = 2; ; n += 1) if (!taken.has(`${base}-${n}`)) return `${base}-${n}`;
}

export function changeComponent(scene: Scene, id: string, change: (c: Component) => Component): Scene {
  return { ...scene, components: scene.components.map((c) => (c.id === id ? change(c) : c)) };
}

export function patchComponent(scene: Scene, id: string, patch: Partial<Omit<Component, 'id'>>): Scene {
  return changeComponent(scene, id, (c) => ({ ...c, ...patch }));
}

/** Adds a component at the end of the fitting order, or after another. */
export function addComponent(scene: Scene, component: Component, after?: string): Scene {
  const at = scene.components.findIndex((c) => c.id === after);
  const components = [...scene.components];
  components.splice(at < 0 ? components.length : at + 1, 0, component);
  return { ...scene, components };
}

const names = (side: Side, id: string): boolean => 'component' in side && side.component === id;

/** Takes components out, with the rules that name them. */
export function removeComponents(scene: Scene, ids: readonly string[]): Scene {
  const gone = new Set(ids);
  return {
    ...scene,
    components: scene.components.filter((c) => !gone.has(c.id)),
    rules: {
      ...scene.rules,
      pairs: scene.rules.pairs.filter((r) => !r.between.some((s) => 'component' in s && gone.has(s.component))),
    },
  };
}

/** Copies components beside themselves by `offset` mm in their group's frame, with their joints among one another. */
export function duplicateComponents(
  scene: Scene,
  ids: readonly string[],
  offset: Vec3,
): { scene: Scene; ids: string[] } {
  let next = scene;
  const copies = new Map<string, string>();
  for (const id of ids) {
    const original = next.components.find((c) => c.id === id);
    if (original === undefined) continue;
    const [x, y, z] = original.pose.at ?? [0, 0, 0];
    const copy: Component = {
      ...original,
      id: freshId(next.components, original.id),
      name: `${original.name} copy`.slice(0, 120),
      pose: { ...original.pose, at: [x + offset[0], y + offset[1], z + offset[2]] },
    };
    copies.set(id, copy.id);
    next = addComponent(next, copy, id);
  }
  const pairs = scene.rules.pairs.flatMap((rule): PairRule[] => {
    const [a, b] = rule.between;
    if (!('component' in a) || !('component' in b)) return [];
    const x = copies.get(a.component);
    const y = copies.get(b.component);
    return x === undefined || y === undefined ? [] : [{ ...rule, between: [{ component: x }, { component: y }] }];
  });
  return {
    scene: { ...next, rules: { ...next.rules, pairs: [...next.rules.pairs, ...pairs] } },
    ids: [...copies.values()],
  };
}

export function setComponentPose(scene: Scene, id: string, pose: Pose): Scene {
  return patchComponent(scene, id, { pose });
}

export function setGroupPose(scene: Scene, id: string, pose: Pose): Scene {
  return { ...scene, groups: scene.groups.map((g) => (g.id === id ? { ...g, pose } : g)) };
}

export function renameGroup(scene: Scene, id: string, name: string): Scene {
  return { ...scene, groups: scene.groups.map((g) => (g.id === id ? { ...g, name } : g)) };
}

/** Moves a component to a group (or out of any), keeping where it stands in the car. */
export function moveToGroup(scene: Scene, id: string, group: string | undefined): Scene {
  const target = scene.groups.find((g) => g.id === group);
  if (group !== undefined && target === undefined) return scene;
  return changeComponent(scene, id, (c) => {
    const from = scene.groups.find((g) => g.id === c.group);
    const world = composeRigid(rigidOf(from?.pose), rigidOf(c.pose));
    const pose = poseFromRigid(composeRigid(invertRigid(rigidOf(target?.pose)), world));
    const { group: _left, ...rest } = c;
    return group === undefined ? { ...rest, pose } : { ...rest, group, pose };
  });
}

/** Clamps components together as a new group whose frame stands at `at`; they stay where they are. */
export function clampTogether(
  scene: Scene,
  ids: readonly string[],
  name: string,
  at: Vec3,
): { scene: Scene; group: string } {
  const group: Group = { id: freshId(scene.groups, name), name, pose: { at } };
  let next: Scene = { ...scene, groups: [...scene.groups, group] };
  for (const id of ids) next = moveToGroup(next, id, group.id);
  return { scene: dropEmptyGroups(next), group: group.id };
}

/** Parts a group again; its components stay where they are. */
export function partAgain(scene: Scene, group: string): Scene {
  let next = scene;
  for (const c of scene.components) if (c.group === group) next = moveToGroup(next, c.id, undefined);
  return withoutGroup(next, group);
}

function withoutGroup(scene: Scene, id: string): Scene {
  return {
    ...scene,
    groups: scene.groups.filter((g) => g.id !== id),
    rules: {
      ...scene.rules,
      pairs: scene.rules.pairs.filter((r) => !r.between.some((s) => 'group' in s && s.group === id)),
    },
  };
}

/** Takes out groups that hold nothing any more. */
export function dropEmptyGroups(scene: Scene): Scene {
  const used = new Set(scene.components.map((c) => c.group));
  return scene.groups.filter((g) => !used.has(g.id)).reduce((s, g) => withoutGroup(s, g.id), scene);
}

/** Puts components in the given fitting order; those not named stay behind the one before them. */
export function reorderComponents(scene: Scene, order: readonly string[]): Scene {
  const rank = new Map(order.map((id, i) => [id, i]));
  let last = -1;
  const ranked = scene.components.map((c, i) => {
    last = rank.get(c.id) ?? last + 1e-6 * (i + 1);
    return { c, at: last };
  });
  return { ...scene, components: ranked.sort((a, b) => a.at - b.at).map((r) => r.c) };
}

export function setLasers(scene: Scene, lasers: readonly Laser[]): Scene {
  return { ...scene, lasers };
}

export function patchLaser(scene: Scene, id: string, patch: Partial<Omit<Laser, 'id'>>): Scene {
  return { ...scene, lasers: scene.lasers.map((l) => (l.id === id ? { ...l, ...patch } : l)) };
}

export function patchRules(scene: Scene, patch: Partial<Rules>): Scene {
  return { ...scene, rules: { ...scene.rules, ...patch } };
}

export function patchHead(scene: Scene, patch: Partial<Pick<Scene, 'name' | 'display' | 'accuracy'>>): Scene {
  return { ...scene, ...patch };
}

const sameSide = (a: Side, b: Side): boolean => JSON.stringify(a) === JSON.stringify(b);

/** True if a rule is about these two sides, whichever way round. */
export function isBetween(rule: PairRule, a: Side, b: Side): boolean {
  const [x, y] = rule.between;
  return (sameSide(x, a) && sameSide(y, b)) || (sameSide(x, b) && sameSide(y, a));
}

/** Sets the gap between two sides, in place of one that is there. */
export function setPairGap(scene: Scene, a: Side, b: Side, gap: number): Scene {
  return replaceRule(scene, { between: [a, b], gap }, (r) => r.joint === undefined && isBetween(r, a, b));
}

/** Joins two components; null parts them. */
export function setJoint(scene: Scene, a: string, b: string, allow: number | null): Scene {
  const sides = [{ component: a }, { component: b }] as const;
  const isThis = (r: PairRule): boolean => r.joint !== undefined && isBetween(r, ...sides);
  if (allow === null) return patchRules(scene, { pairs: scene.rules.pairs.filter((r) => !isThis(r)) });
  if (a === b) return scene;
  return replaceRule(scene, { between: sides, joint: { allow } }, isThis);
}

function replaceRule(scene: Scene, rule: PairRule, isOld: (r: PairRule) => boolean): Scene {
  const { pairs } = scene.rules;
  const at = pairs.findIndex(isOld);
  return patchRules(scene, { pairs: at < 0 ? [...pairs, rule] : pairs.map((r, i) => (i === at ? rule : r)) });
}

/** Takes out one rule, by its place. */
export function removeRule(scene: Scene, index: number): Scene {
  return patchRules(scene, { pairs: scene.rules.pairs.filter((_, i) => i !== index) });
}

/** The components that a component is jointed to. */
export function jointsOf(scene: Scene, id: string): { readonly other: string; readonly allow: number }[] {
  return scene.rules.pairs.flatMap((rule) => {
    if (rule.joint === undefined) return [];
    const [a, b] = rule.between;
    if (!names(a, id) && !names(b, id)) return [];
    const other = names(a, id) ? b : a;
    return 'component' in other ? [{ other: other.component, allow: rule.joint.allow }] : [];
  });
}
