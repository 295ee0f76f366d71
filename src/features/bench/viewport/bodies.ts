// The bodies of a part: the solids of a component that move together. Each is drawn as one piece.
import { displacementAt, pathOf, type PathStep } from '#shared/geometry';
import { worldPose, type Component, type Motion, type Scene, type Solid, type Step } from '#shared/scene';
import { composeRigid, type Rigid } from '#shared/units';
import { unit } from './vectors';

export interface Body {
  /** Places in the component's list of solids. */
  readonly solids: readonly number[];
  /** Ids of the motions that move it, operating ones first. */
  readonly motions: readonly string[];
}

/** Where a motion stands, 0 to 1; left out: at rest, as the document has it. */
export type Positions = Readonly<Record<string, number>>;

export const motionKey = (component: string, motion: string): string => `${component}.${motion}`;

const moves = (motion: Motion, solid: Solid): boolean =>
  motion.solids === undefined || motion.solids.includes(solid.id);

export function bodiesOf(component: Component): Body[] {
  const bodies = new Map<string, { solids: number[]; motions: string[] }>();
  const ordered = [...component.motions].sort((a, b) => Number(a.use === 'service') - Number(b.use === 'service'));
  component.solids.forEach((solid, i) => {
    const motions = ordered.filter((m) => moves(m, solid)).map((m) => m.id);
    const key = motions.join(' ');
    const body = bodies.get(key) ?? { solids: [], motions };
    body.solids.push(i);
    bodies.set(key, body);
  });
  return [...bodies.values()];
}

const pathStep = (step: Step): PathStep =>
  step.kind === 'slide' ? { ...step, along: unit(step.along) } : { ...step, axis: unit(step.axis) };

/** Displacement of a component's frame, in that frame, by one motion at a position. */
export function displacementOf(motion: Motion, position: number): Rigid {
  return displacementAt(pathOf(motion.steps.map(pathStep)), position);
}

/** Where a body stands in the car. @param except a motion that is left at rest */
export function bodyPose(scene: Scene, component: Component, body: Body, positions: Positions, except?: string): Rigid {
  let pose = worldPose(scene, component);
  for (const id of [...body.motions].reverse()) {
    const motion = component.motions.find((m) => m.id === id);
    const position = positions[motionKey(component.id, id)];
    if (motion !== undefined && position !== undefined && id !== except) {
      pose = composeRigid(pose, displacementOf(motion, position));
    }
  }
  return pose;
}
