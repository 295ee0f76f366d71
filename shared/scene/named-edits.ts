// Every edit under the name that undo shows: `edits.moveComponent(scene, id, pose)` gives the label, made from the scene as
// it is, and the change, for the scene as it is when it runs. A change that would leave a document which does not load
// changes nothing, so that no undo step and no save ever holds a broken one; while a hand drags, the bare functions do.
import * as components from './edit-components';
import * as groups from './edit-groups';
import * as lasers from './edit-lasers';
import * as rules from './edit-rules';
import * as solids from './edit-solids';
import { loadScene } from './load';
import type { Display, Scene, Side, Vec3 } from './types';

export interface NamedEdit {
  readonly label: string;
  readonly edit: (scene: Scene) => Scene;
}

type Label<A extends readonly unknown[]> = string | ((scene: Scene, ...args: A) => string);

function named<A extends readonly unknown[]>(
  change: (scene: Scene, ...args: A) => Scene,
  label: Label<A>,
): (scene: Scene, ...args: A) => NamedEdit {
  return (scene, ...args) => ({
    label: typeof label === 'string' ? label : label(scene, ...args),
    edit: (current) => {
      const next = change(current, ...args);
      return next === current || loadScene(next).ok ? next : current;
    },
  });
}

const part = (scene: Scene, id: string): string => scene.components.find((c) => c.id === id)?.name ?? id;
const group = (scene: Scene, id: string): string => scene.groups.find((g) => g.id === id)?.name ?? id;
const laser = (scene: Scene, id: string): string => scene.lasers.find((l) => l.id === id)?.name ?? id;

/** One part by its name, several by their number. */
function parts(scene: Scene, ids: readonly string[]): string {
  return ids.length === 1 ? part(scene, ids[0]!) : `${ids.length} parts`;
}

function solid(scene: Scene, component: string, id: string): string {
  const home = scene.components.find((c) => c.id === component);
  const name = home?.solids.find((s) => s.id === id)?.name ?? id;
  return home?.solids.length === 1 ? home.name : `${name} of ${part(scene, component)}`;
}

function motion(scene: Scene, component: string, id: string): string {
  const home = scene.components.find((c) => c.id === component);
  return `${home?.motions.find((m) => m.id === id)?.name ?? id} of ${part(scene, component)}`;
}

function side(scene: Scene, s: Side): string {
  if ('component' in s) return part(scene, s.component);
  return 'group' in s ? group(scene, s.group) : s.category.replaceAll('-', ' ');
}

function rule(scene: Scene, index: number): string {
  const found = scene.rules.pairs[index];
  if (found === undefined) return 'a rule';
  const [a, b] = found.between.map((s) => side(scene, s)) as [string, string];
  return `the ${found.joint === undefined ? 'gap rule' : 'joint'} of ${a} and ${b}`;
}

const copy = (scene: Scene, ids: readonly string[], offset: Vec3): Scene =>
  components.duplicateComponents(scene, ids, offset).scene;
const clamp = (scene: Scene, ids: readonly string[], name: string, at: Vec3): Scene =>
  groups.clampTogether(scene, ids, name, at).scene;
type GeneralGaps = Partial<Pick<Scene['rules'], 'gap' | 'movingGap' | 'touch'>>;

export const edits = {
  addComponent: named(components.addComponent, (_, c) => `Add ${c.name}`),
  removeComponents: named(components.removeComponents, (s, ids) => `Remove ${parts(s, ids)}`),
  /** Which ids the copies get, duplicateComponents of the same scene says. */
  duplicateComponents: named(copy, (s, ids) => `Copy ${parts(s, ids)}`),
  renameComponent: named(components.renameComponent, (s, id) => `Rename ${part(s, id)}`),
  moveComponent: named(components.setComponentPose, (s, id) => `Move ${part(s, id)}`),
  setCategory: named(components.setCategory, (s, id) => `Change what ${part(s, id)} is`),
  setSource: named(components.setSource, (s, id) => `Change the source of ${part(s, id)}`),
  setTolerance: named(components.setTolerance, (s, id) => `Change the tolerance of ${part(s, id)}`),
  setNote: named(components.setNote, (s, id) => `Change the note on ${part(s, id)}`),
  setRecipeResult: named(components.setRecipeResult, (s, id) => `Rebuild ${part(s, id)}`),
  reorderComponents: named(components.reorderComponents, 'Change the fitting order'),

  addSolid: named(solids.addSolid, (s, id) => `Add a solid to ${part(s, id)}`),
  removeSolid: named(solids.removeSolid, (s, id, which) => `Remove ${solid(s, id, which)}`),
  setShape: named(solids.setShape, (s, id, which) => `Resize ${solid(s, id, which)}`),
  moveSolid: named(solids.setSolidPose, (s, id, which) => `Move ${solid(s, id, which)}`),
  renameSolid: named(solids.renameSolid, (s, id, which) => `Rename ${solid(s, id, which)}`),
  addMotion: named(solids.addMotion, (s, id, m) => `Add ${m.name} to ${part(s, id)}`),
  removeMotion: named(solids.removeMotion, (s, id, which) => `Remove ${motion(s, id, which)}`),
  changeMotion: named(solids.patchMotion, (s, id, which) => `Change ${motion(s, id, which)}`),

  /** Which id the group gets, clampTogether of the same scene says. */
  clampTogether: named(clamp, (s, ids, name) => `Clamp ${parts(s, ids)} together as ${name}`),
  partAgain: named(groups.partAgain, (s, id) => `Part ${group(s, id)}`),
  moveToGroup: named(groups.moveToGroup, (s, id, to) =>
    to === undefined ? `Take ${part(s, id)} out of its group` : `Clamp ${part(s, id)} to ${group(s, to)}`,
  ),
  moveGroup: named(groups.setGroupPose, (s, id) => `Move ${group(s, id)}`),
  renameGroup: named(groups.renameGroup, (s, id) => `Rename ${group(s, id)}`),

  addLaser: named(lasers.addLaser, (_, l) => `Add ${l.name}`),
  removeLaser: named(lasers.removeLaser, (s, id) => `Remove ${laser(s, id)}`),
  renameLaser: named(lasers.renameLaser, (s, id) => `Rename ${laser(s, id)}`),
  moveLaser: named(lasers.moveLaser, (s, id) => `Move ${laser(s, id)}`),

  setPairGap: named(rules.setPairGap, (s, a, b) => `Set the gap of ${side(s, a)} and ${side(s, b)}`),
  setJoint: named(
    rules.setJoint,
    (s, a, b, allow) => `${allow === null ? 'Part' : 'Join'} ${part(s, a)} and ${part(s, b)}`,
  ),
  removeRule: named(rules.removeRule, (s, index) => `Remove ${rule(s, index)}`),
  setGeneralGaps: named((s: Scene, gaps: GeneralGaps) => rules.patchRules(s, gaps), 'Change the general gaps'),

  setName: named(
    (s: Scene, name: string) => rules.patchHead(s, { name }),
    (_, name) => `Rename the scene to ${name}`,
  ),
  setDisplay: named((s: Scene, display: Display) => rules.patchHead(s, { display }), 'Change the unit'),
  setAccuracy: named((s: Scene, accuracy: number) => rules.patchHead(s, { accuracy }), 'Change the accuracy'),
} as const;
