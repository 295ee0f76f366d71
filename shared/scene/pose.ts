// Where things stand in the car: group pose, then component pose, then solid pose.
import { atan2Degrees, composeRigid, identityRigid, rigidFromPose, type Rigid } from '#shared/units';
import type { Component, Pose, Scene, Solid, Vec3 } from './types';

/** A pose of the document as a placement; a missing one changes nothing. */
export function rigidOf(pose: Pose | undefined): Rigid {
  return pose === undefined ? identityRigid() : rigidFromPose(pose.at, pose.turn);
}

/** Placement of a component's frame, or of one of its solids, in the world at rest. */
export function worldPose(scene: Scene, component: Component, solid?: Solid): Rigid {
  const group = component.group === undefined ? undefined : scene.groups.find((g) => g.id === component.group);
  const frame = composeRigid(rigidOf(group?.pose), rigidOf(component.pose));
  return solid === undefined ? frame : composeRigid(frame, rigidOf(solid.pose));
}

/** Drops the noise that a chain of placements leaves behind, and -0. */
function tidy(x: number): number {
  return Math.round(x * 1e9) / 1e9 + 0;
}

/** A placement as a pose of the document: the angles of Rx·Ry·Rz. At ±90 degrees about y, z takes no part. */
export function poseFromRigid(m: Rigid): Pose {
  const at: Vec3 = [tidy(m[3]!), tidy(m[7]!), tidy(m[11]!)];
  const across = Math.sqrt(m[0]! * m[0]! + m[1]! * m[1]!);
  const ry = atan2Degrees(m[2]!, across);
  const turn: Vec3 =
    across > 1e-9
      ? [tidy(atan2Degrees(-m[6]!, m[10]!)), tidy(ry), tidy(atan2Degrees(-m[1]!, m[0]!))]
      : [tidy(atan2Degrees(m[9]!, m[5]!)), tidy(ry), 0];
  return { at, turn };
}
