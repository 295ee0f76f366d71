// What a document must keep between its parts: ids that are unique and exist, one operating motion a solid, sums in bounds.
import { MAX_REACH, MAX_SLIDE, MAX_SOLIDS, MAX_SWING } from './limits';
import type { Component, Motion, Scene, Side } from './types';

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
    const farthest = Math.max(Math.abs(step.from), Math.abs(step.to), Math.abs(step.to - step.from));
    if (step.kind === 'swing') {
      swings += Math.abs(step.to - step.from);
      if (farthest > MAX_SWING || swings > MAX_SWING) {
        report(`${where}.to`, `the motion's swings must stay within ${MAX_SWING} degrees together`);
      }
    } else {
      slides += Math.abs(step.to - step.from);
      if (farthest > MAX_SLIDE || slides > MAX_SLIDE) {
        report(`${where}.to`, `the motion's slides must stay within ${MAX_SLIDE / 1000} m together`);
      }
    }
  }
}

function checkMotions(component: Component, path: string, report: Report): void {
  const ids = component.solids.map((s) => s.id);
  const operating = new Map<string, number>();
  for (const [i, motion] of component.motions.entries()) {
    const where = `${path}.motions[${i}]`;
    checkSteps(motion, where, report);
    for (const [k, solid] of (motion.solids ?? []).entries()) {
      if (!ids.includes(solid)) report(`${where}.solids[${k}]`, `there is no solid "${solid}" in this component`);
      else if (motion.solids!.indexOf(solid) !== k) report(`${where}.solids[${k}]`, `"${solid}" is named twice`);
    }
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

/** Boxes and cylinders by the farthest corner of their box, in their own frame; meshes are seen when they are read. */
function checkReach(component: Component, path: string, report: Report): void {
  for (const [i, { shape }] of component.solids.entries()) {
    if (shape.kind === 'mesh') continue;
    const [x, y, z] = shape.kind === 'box' ? shape.size : [shape.diameter, shape.diameter, shape.length];
    const half = Math.sqrt(x * x + y * y + z * z) / 2;
    if (!(half <= MAX_REACH)) report(`${path}.solids[${i}].shape`, 'a corner lies more than 100 m from its own origin');
  }
}

function checkSide(scene: Scene, side: Side, path: string, report: Report): void {
  if ('component' in side && !scene.components.some((c) => c.id === side.component)) {
    report(`${path}.component`, `there is no component "${side.component}"`);
  }
  if ('group' in side && !scene.groups.some((g) => g.id === side.group)) {
    report(`${path}.group`, `there is no group "${side.group}"`);
  }
}

function checkRules(scene: Scene, report: Report): void {
  for (const [i, rule] of scene.rules.pairs.entries()) {
    const path = `rules.pairs[${i}]`;
    for (const k of [0, 1] as const) checkSide(scene, rule.between[k], `${path}.between[${k}]`, report);
    if ((rule.gap === undefined) === (rule.joint === undefined)) report(path, 'needs one of gap and joint');
    const [a, b] = rule.between;
    if (rule.joint !== undefined) {
      for (const k of [0, 1] as const) {
        if (!('component' in rule.between[k])) {
          report(`${path}.between[${k}]`, 'a joint names two components, never a group or category');
        }
      }
    }
    if ('component' in a && 'component' in b && a.component === b.component) {
      report(`${path}.between[1].component`, 'is the same component twice');
    }
  }
}

/** All that is wrong between the parts of a document, in the document's order. */
export function findBrokenReferences(scene: Scene): Refusal[] {
  const refusals: Refusal[] = [];
  const report: Report = (path, reason) => refusals.push({ path, reason });
  findDuplicates(scene.lasers, 'lasers', report);
  findDuplicates(scene.groups, 'groups', report);
  findDuplicates(scene.components, 'components', report);
  const groups = new Set(scene.groups.map((g) => g.id));
  let solids = 0;
  for (const [i, component] of scene.components.entries()) {
    const path = `components[${i}]`;
    if (component.group !== undefined && !groups.has(component.group)) {
      report(`${path}.group`, `there is no group "${component.group}"`);
    }
    findDuplicates(component.solids, `${path}.solids`, report);
    findDuplicates(component.motions, `${path}.motions`, report);
    findDuplicates(component.holes, `${path}.holes`, report);
    checkMotions(component, path, report);
    checkReach(component, path, report);
    const before = solids;
    solids += component.solids.length;
    if (solids > MAX_SOLIDS && before <= MAX_SOLIDS) {
      report(`${path}.solids`, `the scene has more than ${MAX_SOLIDS} solids`);
    }
  }
  checkRules(scene, report);
  return refusals;
}
