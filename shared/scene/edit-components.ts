// Edits of components. All edits are pure; one of something that is not there gives the same scene back.
import { defaultTolerance } from './defaults';
import { MAX_NAME } from './limits';
import type { Category, Component, Hole, Motion, PairRule, Pose, Recipe, Scene, Solid, Source, Vec3 } from './types';

/** An id that the list does not have yet, made from a name. */
export function freshId(list: readonly { readonly id: string }[], name: string): string {
  const base =
    name
      .normalize('NFKD')
      .replace(/\p{M}/gu, '')
      .toLowerCase()
      .replace(/[^a-z0-9]+/g, '-')
      .slice(0, 56)
      .replace(/^-+|-+$/g, '') || 'part';
  const taken = new Set(list.map((x) => x.id));
  if (!taken.has(base)) return base;
  for (let n = 2; ; n += 1) if (!taken.has(`${base}-${n}`)) return `${base}-${n}`;
}

export function changeComponent(scene: Scene, id: string, change: (c: Component) => Component): Scene {
  let isChanged = false;
  const components = scene.components.map((c) => {
    if (c.id !== id) return c;
    const next = change(c);
    isChanged ||= next !== c;
    return next;
  });
  return isChanged ? { ...scene, components } : scene;
}

export function patchComponent(scene: Scene, id: string, patch: Partial<Omit<Component, 'id'>>): Scene {
  return changeComponent(scene, id, (c) => ({ ...c, ...patch }));
}

/** Adds a component at the end of the fitting order, or after another; nothing if its id is taken. */
export function addComponent(scene: Scene, component: Component, after?: string): Scene {
  if (scene.components.some((c) => c.id === component.id)) return scene;
  const at = scene.components.findIndex((c) => c.id === after);
  const components = [...scene.components];
  components.splice(at < 0 ? components.length : at + 1, 0, component);
  return { ...scene, components };
}

/** Takes components out, with the rules that name them. */
export function removeComponents(scene: Scene, ids: readonly string[]): Scene {
  const gone = new Set(ids);
  if (!scene.components.some((c) => gone.has(c.id))) return scene;
  return {
    ...scene,
    components: scene.components.filter((c) => !gone.has(c.id)),
    rules: {
      ...scene.rules,
      pairs: scene.rules.pairs.filter((r) => !r.between.some((s) => 'component' in s && gone.has(s.component))),
    },
  };
}

/** The rules among the copied, said of the copies. */
function copiedRules(scene: Scene, copies: ReadonlyMap<string, string>): PairRule[] {
  return scene.rules.pairs.flatMap((rule): PairRule[] => {
    const [a, b] = rule.between;
    if (!('component' in a) || !('component' in b)) return [];
    const x = copies.get(a.component);
    const y = copies.get(b.component);
    return x === undefined || y === undefined ? [] : [{ ...rule, between: [{ component: x }, { component: y }] }];
  });
}

/** Copies components beside themselves by `offset` mm in their group's frame, with the rules and joints among them. */
export function duplicateComponents(
  scene: Scene,
  ids: readonly string[],
  offset: Vec3,
): { scene: Scene; ids: string[] } {
  let next = scene;
  const copies = new Map<string, string>();
  for (const id of new Set(ids)) {
    const original = scene.components.find((c) => c.id === id);
    if (original === undefined) continue;
    const [x, y, z] = original.pose.at ?? [0, 0, 0];
    const copy: Component = {
      ...original,
      id: freshId(next.components, original.id),
      name: [...`${original.name} copy`].slice(0, MAX_NAME).join(''),
      pose: { ...original.pose, at: [x + offset[0], y + offset[1], z + offset[2]] },
    };
    copies.set(id, copy.id);
    next = addComponent(next, copy, id);
  }
  if (copies.size === 0) return { scene, ids: [] };
  const pairs = [...next.rules.pairs, ...copiedRules(scene, copies)];
  return { scene: { ...next, rules: { ...next.rules, pairs } }, ids: [...copies.values()] };
}

export function renameComponent(scene: Scene, id: string, name: string): Scene {
  return patchComponent(scene, id, { name });
}

/** Places a component in its group, or in the car where it has none. */
export function setComponentPose(scene: Scene, id: string, pose: Pose): Scene {
  return patchComponent(scene, id, { pose });
}

/** A tolerance that was the usual one stays the usual one; one that somebody chose stays as it is. */
function withUsualTolerance(before: Component, after: Component): Component {
  const usual = ({ source, category }: Component): number | null =>
    source === undefined ? null : defaultTolerance(source, category);
  const next = usual(after);
  const isChosen = before.tolerance !== (usual(before) ?? 0);
  return next === null || isChosen ? after : { ...after, tolerance: next };
}

export function setCategory(scene: Scene, id: string, category: Category): Scene {
  return changeComponent(scene, id, (c) => withUsualTolerance(c, { ...c, category }));
}

/** Says where a component's sizes come from; undefined: not said. */
export function setSource(scene: Scene, id: string, source: Source | undefined): Scene {
  return changeComponent(scene, id, (c) => withUsualTolerance(c, { ...c, source }));
}

/** How far the part may sit from where the document says, mm. */
export function setTolerance(scene: Scene, id: string, tolerance: number): Scene {
  return patchComponent(scene, id, { tolerance });
}

/** An empty note is none. */
export function setNote(scene: Scene, id: string, note: string): Scene {
  return patchComponent(scene, id, { note: note === '' ? undefined : note });
}

export interface RecipeResult {
  readonly recipe: Recipe;
  readonly solids: readonly Solid[];
  readonly motions: readonly Motion[];
  readonly holes: readonly Hole[];
}

/** Puts what a recipe built in the place of a component's solids, motions and holes. */
export function setRecipeResult(scene: Scene, id: string, result: RecipeResult): Scene {
  const { recipe, solids, motions, holes } = result;
  return patchComponent(scene, id, { recipe, solids, motions, holes });
}

/** Puts components in the given fitting order; those not named stay behind the one before them. */
export function reorderComponents(scene: Scene, order: readonly string[]): Scene {
  const named = new Map(scene.components.map((c) => [c.id, c]));
  const wanted = [...new Set(order)].flatMap((id) => named.get(id) ?? []);
  const followers = new Map<Component | null, Component[]>();
  let leader: Component | null = null;
  const isNamed = new Set(wanted);
  for (const c of scene.components) {
    if (isNamed.has(c)) leader = c;
    else followers.set(leader, [...(followers.get(leader) ?? []), c]);
  }
  const components = [null, ...wanted].flatMap((c) => [...(c === null ? [] : [c]), ...(followers.get(c) ?? [])]);
  return components.every((c, i) => c === scene.components[i]) ? scene : { ...scene, components };
}
