// One ready-made part: its picture, its measurements, and the button that takes it off the shelf.
import { useState } from 'react';
import type { Fault, Params, PartRecipe } from '#shared/parts';
import type { Component } from '#shared/scene';
import { Button } from '../../../components/button';
import { DialogActions } from '../../../components/dialog';
import { TextField } from '../../../components/text-field';
import { inWords } from '../../../lib/part-words';
import { useFacts, useOpen } from '../bench-model';
import { partFromRecipe } from '../new-parts';
import type { Triple } from '../viewport/vectors';
import { ParamFields } from './param-fields';
import { RecipeFactsList } from './recipe-facts';

export interface RecipeFormProps {
  readonly recipe: PartRecipe;
  readonly picture: string | null;
  readonly at: () => Triple;
  readonly onPlace: (component: Component) => void;
  readonly onBack: () => void;
}

const startOf = (recipe: PartRecipe): Params => Object.fromEntries(recipe.params.map((p) => [p.key, p.default]));

export function RecipeForm({ recipe, picture, at, onPlace, onBack }: RecipeFormProps) {
  const { words } = useFacts();
  const scene = useOpen((o) => o.scene);
  const name = words === 'uk' ? recipe.ukName : recipe.name;
  const [called, setCalled] = useState(name);
  const [params, setParams] = useState<Params>(() => startOf(recipe));
  const [faults, setFaults] = useState<readonly Fault[]>([]);
  return (
    <div className="recipe">
      <div className="recipe-about">
        {picture !== null && <img className="shelf-picture" src={picture} alt="" width={160} height={160} />}
        <div>
          <h3>{name}</h3>
          <p>{inWords(recipe.about, words)}</p>
          <p className="tape-small">{inWords(recipe.frame, words)}</p>
          <RecipeFactsList recipe={recipe} params={params} />
        </div>
      </div>
      <TextField label="Call it" value={called} maxLength={120} onChange={(event) => setCalled(event.target.value)} />
      <ParamFields
        recipe={recipe}
        params={params}
        faults={faults}
        disabled={false}
        onChange={(key, value) => {
          const next = { ...params, [key]: value };
          const judged = recipe.check(next);
          setParams(next);
          setFaults(judged.ok ? [] : judged.faults);
        }}
      />
      <DialogActions>
        <Button
          kind="main"
          disabled={faults.length > 0}
          onClick={() => {
            const made = partFromRecipe(scene, recipe.kind, params, called.trim(), at());
            if (made.ok) onPlace(made.component);
            else setFaults(made.faults);
          }}
        >
          Put it on the bench
        </Button>
        <Button onClick={onBack}>Back to the shelf</Button>
      </DialogActions>
    </div>
  );
}
