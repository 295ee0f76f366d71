// Who moves: the motions of a component and the solids that they carry.
import type { Component, Motion, Solid } from './types';

/** Motions that happen while driving, in the document's order. */
export function operatingMotions(component: Component): Motion[] {
  return component.motions.filter((m) => m.use === 'operating');
}

/** Motions of fitting and removal, in the document's order. */
export function serviceMotions(component: Component): Motion[] {
  return component.motions.filter((m) => m.use === 'service');
}

/** The solids of `component` that a motion of it carries, in the component's order. */
export function movedSolids(component: Component, motion: Motion): Solid[] {
  const { solids } = motion;
  return solids === undefined ? [...component.solids] : component.solids.filter((s) => solids.includes(s.id));
}

/** The solids that no operating motion carries: those that stay while driving, and that a new motion may take. */
export function fixedSolids(component: Component): Solid[] {
  const moved = new Set(operatingMotions(component).flatMap((m) => movedSolids(component, m)));
  return component.solids.filter((s) => !moved.has(s));
}
