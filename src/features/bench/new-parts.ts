// New parts from the shelf: a recipe's, a box, a cylinder, a mesh of the team. They stand in the middle of what is looked at,
// on whole steps, and say by their source how far they can be trusted.
import { newPart, recipeOf, type Params, type PartResult } from '#shared/parts';
import {
  defaultTolerance,
  freshId,
  type Category,
  type Component,
  type Scene,
  type Shape,
  type Source,
  type Vec3,
} from '#shared/scene';
import { MM_PER_INCH, type LengthDisplay } from '#shared/units';
import type { Triple } from './viewport/vectors';

/** A place on whole quarter inches or whole centimetres, so that its readings begin round. */
export function roundPlace(at: Triple, display: LengthDisplay): Vec3 {
  const step = display === 'mm' ? 10 : MM_PER_INCH / 4;
  const round = (x: number): number => Math.round(x / step) * step + 0;
  return [round(at[0]), round(at[1]), round(at[2])];
}

/** A name that no other part has: "Box", "Box 2". */
export function freshName(scene: Scene, name: string): string {
  const taken = new Set(scene.components.map((c) => c.name));
  if (!taken.has(name)) return name;
  for (let n = 2; ; n += 1) if (!taken.has(`${name} ${n}`)) return `${name} ${n}`;
}

interface Plain {
  readonly name: string;
  readonly category: Category;
  readonly source: Source;
  readonly shape: Shape;
}

export function plainPart(scene: Scene, { name, category, source, shape }: Plain, at: Vec3): Component {
  const called = freshName(scene, name);
  return {
    id: freshId(scene.components, called),
    name: called,
    category,
    pose: { at },
    tolerance: defaultTolerance(source, category),
    source,
    solids: [{ id: 'body', shape }],
    motions: [],
    holes: [],
  };
}

export function partFromRecipe(scene: Scene, kind: string, params: Params, name: string, at: Vec3): PartResult {
  const called = freshName(scene, name || (recipeOf(kind)?.name ?? kind));
  const made = newPart(kind, params, { id: freshId(scene.components, called), name: called });
  return made.ok ? { ok: true, component: { ...made.component, pose: { at } } } : made;
}
