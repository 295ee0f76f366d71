// Moves and turns of parts and groups, in the car's own axes, whatever frame they are kept in.
import {
  loadScene,
  poseFromRigid,
  rigidOf,
  setComponentPose,
  setGroupPose,
  worldPose,
  type Component,
  type NamedEdit,
  type Pose,
  type Scene,
  type Vec3,
} from '#shared/scene';
import { composeRigid, invertRigid, rigidFromPose, rigidFromSwing, turnByRigid, type Rigid } from '#shared/units';
import { add, type Triple } from './viewport/vectors';

/** What a gesture takes along: single parts, or one group as a whole. */
export interface Moved {
  readonly parts: readonly string[];
  readonly group: string | null;
}

/** Rounds off what long sums leave behind, far below anything that can be measured. */
const tidy = (x: number): number => Math.round(x * 1e6) / 1e6 + 0;
const tidied = (v: Triple): Vec3 => [tidy(v[0]), tidy(v[1]), tidy(v[2])];

const groupFrame = (scene: Scene, component: Component): Rigid =>
  rigidOf(scene.groups.find((g) => g.id === component.group)?.pose);

/** The place of a part's or group's own zero point in the car. */
export function zeroPoint(scene: Scene, { parts, group }: Moved): Triple {
  if (group !== null) return scene.groups.find((g) => g.id === group)?.pose.at ?? [0, 0, 0];
  const component = scene.components.find((c) => c.id === parts.at(-1));
  if (component === undefined) return [0, 0, 0];
  const m = worldPose(scene, component);
  return [m[3]!, m[7]!, m[11]!];
}

/** How it is turned in the car, as angles of a pose. */
export function turnInCar(scene: Scene, { parts, group }: Moved): Vec3 {
  if (group !== null) return scene.groups.find((g) => g.id === group)?.pose.turn ?? [0, 0, 0];
  const component = scene.components.find((c) => c.id === parts.at(-1));
  if (component === undefined) return [0, 0, 0];
  if (component.group === undefined) return component.pose.turn ?? [0, 0, 0];
  return poseFromRigid(worldPose(scene, component)).turn ?? [0, 0, 0];
}

const shifted = (pose: Pose, by: Triple): Pose => ({ ...pose, at: tidied(add(pose.at ?? [0, 0, 0], by)) });

/** Shifts by a vector in the car, mm. */
export function shift(scene: Scene, { parts, group }: Moved, by: Triple): Scene {
  if (group !== null) {
    const found = scene.groups.find((g) => g.id === group);
    return found === undefined ? scene : setGroupPose(scene, group, shifted(found.pose, by));
  }
  return parts.reduce((next, id) => {
    const component = next.components.find((c) => c.id === id);
    if (component === undefined) return next;
    const own = turnByRigid(invertRigid(groupFrame(next, component)), by);
    return setComponentPose(next, id, shifted(component.pose, own));
  }, scene);
}

/** Turns about a line through `point` along the unit vector `axis`, both in the car; right-hand rule, degrees. */
export function turn(scene: Scene, { parts, group }: Moved, point: Triple, axis: Triple, degrees: number): Scene {
  const swing = rigidFromSwing(point, axis, degrees);
  if (group !== null) {
    const found = scene.groups.find((g) => g.id === group);
    if (found === undefined) return scene;
    return setGroupPose(scene, group, poseFromRigid(composeRigid(swing, rigidOf(found.pose))));
  }
  return parts.reduce((next, id) => {
    const component = next.components.find((c) => c.id === id);
    if (component === undefined) return next;
    return placeInCar(next, component, composeRigid(swing, worldPose(next, component)));
  }, scene);
}

function placeInCar(scene: Scene, component: Component, world: Rigid): Scene {
  const pose = poseFromRigid(composeRigid(invertRigid(groupFrame(scene, component)), world));
  return setComponentPose(scene, component.id, pose);
}

/** Sets the angles in the car; the zero point stays where it is. */
export function setTurnInCar(scene: Scene, moved: Moved, angles: Vec3): Scene {
  if (moved.group !== null) {
    const found = scene.groups.find((g) => g.id === moved.group);
    return found === undefined ? scene : setGroupPose(scene, found.id, { ...found.pose, turn: angles });
  }
  const component = scene.components.find((c) => c.id === moved.parts.at(-1));
  if (component === undefined) return scene;
  if (component.group === undefined) return setComponentPose(scene, component.id, { ...component.pose, turn: angles });
  return placeInCar(scene, component, rigidFromPose(zeroPoint(scene, moved), angles));
}

/** Puts the zero point at one coordinate of the car, leaving the others. */
export function setCoordinate(scene: Scene, moved: Moved, axis: 0 | 1 | 2, value: number): Scene {
  const at = zeroPoint(scene, moved);
  const by = [0, 0, 0] as [number, number, number];
  by[axis] = value - at[axis];
  return shift(scene, moved, by);
}

/** What a gesture is called in undo: "Move brake pedal", "Turn 3 parts". */
export function labelOf(verb: string, scene: Scene, { parts, group }: Moved): string {
  const name =
    group !== null
      ? (scene.groups.find((g) => g.id === group)?.name ?? group)
      : parts.length === 1
        ? (scene.components.find((c) => c.id === parts[0])?.name ?? parts[0]!)
        : `${parts.length} parts`;
  return `${verb} ${name}`;
}

/** An edit that undo names; a change that would leave a document which does not load changes nothing. */
export function checked(label: string, change: (scene: Scene) => Scene): NamedEdit {
  return {
    label,
    edit: (scene) => {
      const next = change(scene);
      return next === scene || loadScene(next).ok ? next : scene;
    },
  };
}
