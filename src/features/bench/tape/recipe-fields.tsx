// The measurements that a ready-made part is built from. A measurement that cannot be built changes nothing and says why.
import { useState } from 'react';
import { rebuildPart, recipeOf, type Fault, type Params } from '#shared/parts';
import { edits, type Component } from '#shared/scene';
import { useBench, useOpen } from '../bench-model';
import { ParamFields } from '../shelf/param-fields';
import { RecipeFactsList } from '../shelf/recipe-facts';

export function RecipeFields({ part }: { readonly part: Component }) {
  const { open } = useBench();
  const canEdit = useOpen((o) => o.canEdit);
  const [faults, setFaults] = useState<readonly Fault[]>([]);
  const recipe = part.recipe === undefined ? null : recipeOf(part.recipe.kind);
  if (part.recipe === undefined) return null;
  if (recipe === null) return <p>This part was made from measurements that this version does not know.</p>;
  const params = part.recipe.params as Params;
  return (
    <>
      <ParamFields
        compact
        recipe={recipe}
        params={params}
        faults={faults}
        disabled={!canEdit}
        onChange={(key, value) => {
          const { scene, apply } = open.getState();
          const result = rebuildPart(part, { ...params, [key]: value });
          if (!result.ok) {
            setFaults(result.faults);
            return;
          }
          setFaults([]);
          const { solids, motions, holes, recipe: made } = result.component;
          if (made !== undefined)
            apply(edits.setRecipeResult(scene, part.id, { recipe: made, solids, motions, holes }));
        }}
      />
      <RecipeFactsList recipe={recipe} params={params} />
    </>
  );
}
