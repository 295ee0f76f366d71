// From a recipe to a component of the document, and back again when its measurements change.
import { defaultTolerance, type Component, type Source } from '#shared/scene';
import { recipeOf } from './shelf';
import type { Fault, Params } from './types';

/** Stands in every ready-made part until somebody measures the real one. */
export const STAND_IN_NOTE =
  'Ready-made block, drawn from measurements that are common practice, remembered or judged by eye. Measure the real part, or put its mesh in place of this, before anything is cut.';

export interface NewPart {
  readonly id: string;
  /** The recipe's name if left out. */
  readonly name?: string;
  /** "guess" if left out: nothing of a ready-made part is measured. */
  readonly source?: Source;
}

export type PartResult =
  | { readonly ok: true; readonly component: Component }
  | { readonly ok: false; readonly faults: readonly [Fault, ...Fault[]] };

const unknownKind = (kind: string): PartResult => ({
  ok: false,
  faults: [{ key: '', message: `There is no ready-made part “${kind}”.` }],
});

/** A new component at its frame's origin, with the tolerance of its source and the note that a measured part replaces it. */
export function newPart(kind: string, params: Params, part: NewPart): PartResult {
  const recipe = recipeOf(kind);
  if (recipe === null) return unknownKind(kind);
  const built = recipe.build(params);
  if (!built.ok) return built;
  const source = part.source ?? 'guess';
  return {
    ok: true,
    component: {
      id: part.id,
      name: part.name ?? recipe.name,
      category: recipe.category,
      pose: {},
      tolerance: defaultTolerance(source, recipe.category),
      source,
      note: STAND_IN_NOTE,
      recipe: { kind, params: built.params },
      solids: built.part.solids,
      motions: built.part.motions,
      holes: built.part.holes,
    },
  };
}

/** The component built again with other measurements: its place, name, tolerance, source and note stay. */
export function rebuildPart(component: Component, params: Params): PartResult {
  const { recipe } = component;
  if (recipe === undefined) {
    return { ok: false, faults: [{ key: '', message: `${component.name} was not made from a ready-made part.` }] };
  }
  const made = newPart(recipe.kind, params, { id: component.id });
  if (!made.ok) return made;
  const { solids, motions, holes } = made.component;
  return { ok: true, component: { ...component, recipe: made.component.recipe, solids, motions, holes } };
}
