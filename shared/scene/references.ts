// What a document must keep between its parts: ids that are unique and exist, one operating motion a solid, sums in bounds,
// everything within reach.
//
// Readings that the document's page leaves open, taken strictly here:
// - The limits of swing and slide hold for the whole of a motion, all its steps together, and for every position in it.
// - A pair rule of a component with itself is refused: pairs inside one component are not checked, so it must be a slip.
//   A group or a category with itself is fine: it speaks of two different components.
// - Two rules about the same two sides are fine: the larger wins.
import { applyRigid, type Rigid } from '#shared/units';
import { MAX_REACH, MAX_SLIDE, MAX_SOLIDS, MAX_SWING } from './limits';
import { worldPose } from './pose';
import type { Component, Motion, Scene, Shape, Side } from './types';

export interface Refusal {
  /** As in `components[3].solids[0].shape.size[1]`; empty for the document itself. */
  readonly path: string;
  readonly reason: string;
}

type Report = (path: string, reason: string) => void;

function findDuplicates(list: readonly { readonly id: string }[], path: string, report: Report): void {
  const seen = new Map<string, number>();
  for (const [i, { id }] of list.entries()) {
    const first = seen.get(id);
    if (first === undefined) seen.set(id, i);
    else report(`${path}[${i}].id`, `"${id}" is taken by ${path}[${first}]`);
  }
}

function checkSteps(motion: Motion, path: string, report: Report): void {
  let swings = 0;
  let slides = 0;
  for (const [i, step] of motion.steps.entries()) {
    const where = `${path}.steps[${i}]`;
    if (i > 0 && step.from !== 0) report(`${where}.from`, 'belongs to the first step only');
    const farthest = Math.max(Math.abs(step.from), Math.abs(step.to));
    const travel = Math.abs(step.to - step.from);
    if (step.kind === 'swing') {
      swings += travel;
      if (farthest > MAX_SWING || swings > MAX_SWING) {
        report(`${where}.to`, `the motion's swings must stay within ${MAX_SWING} degrees together`);
      }
    } else {
      slides += travel;
      if (farthest > MAX_SLIDE || slides > MAX_SLIDE) {
        report(`${where}.to`, `the motion's slides must stay within ${MAX_SLIDE / 1000} m together`);
      }
    }
  }
}

function checkMovedSolids(motion: Motion, there: ReadonlySet<string>, path: string, report: Report): void {
  const seen = new Set<string>();
  for (const [k, solid] of (motion.solids ?? []).entries()) {
    if (!there.has(solid)) report(`${path}.solids[${k}]`, `there is no solid "${solid}" in this component`);
    else if (seen.has(solid)) report(`${path}.solids[${k}]`, `"${solid}" is named twice`);
    seen.add(solid);
  }
}

function checkMotions(component: Component, path: string, report: Report): void {
  const ids = component.solids.map((s) => s.id);
  const there = new Set(ids);
  const operating = new Map<string, number>();
  for (const [i, motion] of component.motions.entries()) {
    const where = `${path}.motions[${i}]`;
    checkSteps(motion, where, report);
    checkMovedSolids(motion, there, where, report);
    if (motion.use !== 'operating') continue;
    for (const [k, solid] of (motion.solids ?? ids).entries()) {
      const other = operating.get(solid);
      if (other !== undefined && other !== i) {
        const at = motion.solids === undefined ? where : `${where}.solids[${k}]`;
        report(at, `solid "${solid}" is moved by ${path}.motions[${other}] already: one operating motion a solid`);
      } else operating.set(solid, i);
    }
  }
}

/** Farthest of a shape's corners from the origin of a frame that it is placed in, mm; a cylinder by its box. */
function farthestCorner(shape: Exclude<Shape, { kind: 'mesh' }>, pose: Rigid | null): number {
  const [x, y, z] = shape.kind === 'box' ? shape.size : [shape.diameter, shape.diameter, shape.length];
  let far = 0;
  for (let k = 0; k < 8; k += 1) {
    const corner = [k & 1 ? x / 2 : -x / 2, k & 2 ? y / 2 : -y / 2, k & 4 ? z / 2 : -z / 2] as const;
    const [px, py, pz] = pose === null ? corner : applyRigid(pose, corner);
    far = Math.max(far, Math.sqrt(px * px + py * py + pz * pz));
  }
  return far;
}

/** Boxes and cylinders, in their own frame and in the car; the corners of meshes are seen when they are read. */
function checkReach(scene: Scene, component: Component, path: string, report: Report): void {
  for (const [i, solid] of component.solids.entries()) {
    if (solid.shape.kind === 'mesh') continue;
    const where = `${path}.solids[${i}].shape`;
    // written so that a NaN of an overflow is refused too
    if (!(farthestCorner(solid.shape, null) <= MAX_REACH)) {
      report(where, 'a corner lies more than 100 m from the origin of its own frame');
    } else if (!(farthestCorner(solid.shape, worldPose(scene, component, solid)) <= MAX_REACH)) {
      report(where, 'a corner lies more than 100 m from the origin of the car');
    }
  }
}

function checkComponents(scene: Scene, groups: ReadonlySet<string>, report: Report): void {
  let solids = 0;
  for (const [i, component] of scene.components.entries()) {
    const path = `components[${i}]`;
    const isPlaced = component.group === undefined || groups.has(component.group);
    if (!isPlaced) report(`${path}.group`, `there is no group "${component.group}"`);
    findDuplicates(component.solids, `${path}.solids`, report);
    checkMotions(component, path, report);
    findDuplicates(component.motions, `${path}.motions`, report);
    findDuplicates(component.holes, `${path}.holes`, report);
    if (isPlaced) checkReach(scene, component, path, report);
    const before = solids;
    solids += component.solids.length;
    if (solids > MAX_SOLIDS && before <= MAX_SOLIDS) {
      report(`${path}.solids`, `the scene has more than ${MAX_SOLIDS} solids`);
    }
  }
}

function checkSide(side: Side, known: Known, path: string, report: Report): void {
  if ('component' in side && !known.components.has(side.component)) {
    report(`${path}.component`, `there is no component "${side.component}"`);
  }
  if ('group' in side && !known.groups.has(side.group)) {
    report(`${path}.group`, `there is no group "${side.group}"`);
  }
}

function checkRules(scene: Scene, known: Known, report: Report): void {
  for (const [i, rule] of scene.rules.pairs.entries()) {
    const path = `rules.pairs[${i}]`;
    const [a, b] = rule.between;
    for (const k of [0, 1] as const) {
      const side = `${path}.between[${k}]`;
      checkSide(rule.between[k], known, side, report);
      if (rule.joint !== undefined && !('component' in rule.between[k])) {
        report(side, 'a joint names two components, never a group or category');
      }
    }
    if ('component' in a && 'component' in b && a.component === b.component) {
      report(`${path}.between[1].component`, 'is the same component twice');
    }
    if (rule.gap === undefined && rule.joint === undefined) report(path, 'needs one of gap and joint');
    if (rule.gap !== undefined && rule.joint !== undefined) report(path, 'has both gap and joint: only one is allowed');
  }
}

interface Known {
  readonly components: ReadonlySet<string>;
  readonly groups: ReadonlySet<string>;
}

/** All that is wrong between the parts of a document, in the document's order. */
export function findBrokenReferences(scene: Scene): Refusal[] {
  const refusals: Refusal[] = [];
  const report: Report = (path, reason) => refusals.push({ path, reason });
  const known: Known = {
    components: new Set(scene.components.map((c) => c.id)),
    groups: new Set(scene.groups.map((g) => g.id)),
  };
  findDuplicates(scene.lasers, 'lasers', report);
  findDuplicates(scene.groups, 'groups', report);
  findDuplicates(scene.components, 'components', report);
  checkComponents(scene, known.groups, report);
  checkRules(scene, known, report);
  return refusals;
}
