// Edits of what a component is made of: its solids and motions. A part that is changed by hand is no longer what its recipe
// builds, so the recipe goes: building it again would undo the hand's work without a word.
import { changeComponent } from './edit-components';
import type { Component, Motion, Pose, Scene, Shape, Solid } from './types';

function byHand(scene: Scene, id: string, change: (c: Component) => Component): Scene {
  return changeComponent(scene, id, (c) => {
    const next = change(c);
    if (next === c || next.recipe === undefined) return next;
    const { recipe: _gone, ...rest } = next;
    return rest;
  });
}

/** Adds a solid; one that an operating motion of all solids then carries too. */
export function addSolid(scene: Scene, component: string, solid: Solid): Scene {
  return byHand(scene, component, (c) =>
    c.solids.some((s) => s.id === solid.id) ? c : { ...c, solids: [...c.solids, solid] },
  );
}

/** Takes a solid out, and out of the motions that name it; a motion left without any goes too. The last solid stays. */
export function removeSolid(scene: Scene, component: string, solid: string): Scene {
  return byHand(scene, component, (c) => {
    const solids = c.solids.filter((s) => s.id !== solid);
    if (solids.length === c.solids.length || solids.length === 0) return c;
    const motions = c.motions
      .map((m) => (m.solids === undefined ? m : { ...m, solids: m.solids.filter((s) => s !== solid) }))
      .filter((m) => m.solids === undefined || m.solids.length > 0);
    return { ...c, solids, motions };
  });
}

function patchSolid(scene: Scene, component: string, solid: string, patch: Partial<Omit<Solid, 'id'>>): Scene {
  return byHand(scene, component, (c) =>
    c.solids.some((s) => s.id === solid)
      ? { ...c, solids: c.solids.map((s) => (s.id === solid ? { ...s, ...patch } : s)) }
      : c,
  );
}

/** Gives a solid another shape or size; mm. */
export function setShape(scene: Scene, component: string, solid: string, shape: Shape): Scene {
  return patchSolid(scene, component, solid, { shape });
}

/** Places a solid in its component. */
export function setSolidPose(scene: Scene, component: string, solid: string, pose: Pose): Scene {
  return patchSolid(scene, component, solid, { pose });
}

/** An empty name is none. */
export function renameSolid(scene: Scene, component: string, solid: string, name: string): Scene {
  return patchSolid(scene, component, solid, { name: name === '' ? undefined : name });
}

export function addMotion(scene: Scene, component: string, motion: Motion): Scene {
  return byHand(scene, component, (c) =>
    c.motions.some((m) => m.id === motion.id) ? c : { ...c, motions: [...c.motions, motion] },
  );
}

export function removeMotion(scene: Scene, component: string, motion: string): Scene {
  return byHand(scene, component, (c) =>
    c.motions.some((m) => m.id === motion) ? { ...c, motions: c.motions.filter((m) => m.id !== motion) } : c,
  );
}

/** Changes a motion: its name, use, solids or steps. */
export function patchMotion(
  scene: Scene,
  component: string,
  motion: string,
  patch: Partial<Omit<Motion, 'id'>>,
): Scene {
  return byHand(scene, component, (c) =>
    c.motions.some((m) => m.id === motion)
      ? { ...c, motions: c.motions.map((m) => (m.id === motion ? { ...m, ...patch } : m)) }
      : c,
  );
}
