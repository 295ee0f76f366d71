// Edits of groups: components clamped together and parted again, each staying where it stands in the car.
import { composeRigid, invertRigid } from '#shared/units';
import { changeComponent, freshId } from './edit-components';
import { poseFromRigid, rigidOf } from './pose';
import type { Group, Pose, Scene, Vec3 } from './types';

function patchGroup(scene: Scene, id: string, patch: Partial<Omit<Group, 'id'>>): Scene {
  if (!scene.groups.some((g) => g.id === id)) return scene;
  return { ...scene, groups: scene.groups.map((g) => (g.id === id ? { ...g, ...patch } : g)) };
}

/** Places a group, and all that is clamped in it, in the car. */
export function setGroupPose(scene: Scene, id: string, pose: Pose): Scene {
  return patchGroup(scene, id, { pose });
}

export function renameGroup(scene: Scene, id: string, name: string): Scene {
  return patchGroup(scene, id, { name });
}

/** Moves a component to a group (or out of any), keeping where it stands in the car. */
export function moveToGroup(scene: Scene, id: string, group: string | undefined): Scene {
  const target = scene.groups.find((g) => g.id === group);
  if (group !== undefined && target === undefined) return scene;
  return changeComponent(scene, id, (c) => {
    if (c.group === group) return c;
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
  if (!scene.components.some((c) => ids.includes(c.id))) return { scene, group: group.id };
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
  if (!scene.groups.some((g) => g.id === id)) return scene;
  return {
    ...scene,
    groups: scene.groups.filter((g) => g.id !== id),
    rules: {
      ...scene.rules,
      pairs: scene.rules.pairs.filter((r) => !r.between.some((s) => 'group' in s && s.group === id)),
    },
  };
}

/** Takes out groups that hold nothing any more, with the rules that name them. */
export function dropEmptyGroups(scene: Scene): Scene {
  const used = new Set(scene.components.map((c) => c.group));
  return scene.groups.filter((g) => !used.has(g.id)).reduce((s, g) => withoutGroup(s, g.id), scene);
}
