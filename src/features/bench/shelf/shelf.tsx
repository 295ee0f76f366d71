// The shelf: ready-made parts, plain blocks, the team's meshes.
import { useState } from 'react';
import { RECIPES, recipeOf } from '#shared/parts';
import { edits, type Component } from '#shared/scene';
import { Dialog } from '../../../components/dialog';
import { Tabs } from '../../../components/tabs';
import { notify } from '../../../components/toast';
import { inWords } from '../../../lib/part-words';
import { useBench, useFacts, useSession } from '../bench-model';
import { roundPlace } from '../new-parts';
import type { Triple } from '../viewport/vectors';
import type { BoardProps } from './board';
import { MeshShelf } from './mesh-shelf';
import { PlainShelf } from './plain-shelf';
import { RecipeForm } from './recipe-form';
import { hasRecipe, isFor } from './roll-call-categories';
import { useRecipePictures } from './use-recipe-pictures';

export function Shelf() {
  const { session } = useBench();
  const isOpen = useSession((s) => s.sheet === 'shelf');
  return (
    <Dialog
      open={isOpen}
      onOpenChange={(open) => {
        if (!open) session.getState().set({ sheet: null, shelfFor: null });
      }}
      title="The shelf"
      lead="What you take stands in the middle of what you look at. Nothing here is a maker's drawing: measure the real part before anything is cut."
      wide
    >
      <Shelves />
    </Dialog>
  );
}

type Board = 'ready' | 'plain' | 'meshes';

function Shelves() {
  const bench = useBench();
  const { display } = useFacts();
  const wanted = useSession((s) => s.shelfFor);
  const [board, setBoard] = useState<Board>(wanted === null || hasRecipe(wanted) ? 'ready' : 'plain');
  const place = (component: Component): void => {
    const { scene, apply } = bench.open.getState();
    apply(edits.addComponent(scene, component));
    bench.session.getState().set({ sheet: null, shelfFor: null });
    bench.session.getState().select([component.id]);
    notify({ text: `${component.name} stands on the bench.`, undo: () => bench.open.getState().undo() });
  };
  const at = (): Triple => roundPlace(bench.view.hand()?.view().target ?? [0, 0, 500], display);
  return (
    <Tabs<Board>
      label="Boards of the shelf"
      value={board}
      onChange={setBoard}
      panels={[
        { value: 'ready', label: 'Ready-made', content: <ReadyShelf wanted={wanted} at={at} onPlace={place} /> },
        { value: 'plain', label: 'Box or cylinder', content: <PlainShelf wanted={wanted} at={at} onPlace={place} /> },
        {
          value: 'meshes',
          label: 'Meshes of the team',
          content: <MeshShelf wanted={wanted} at={at} onPlace={place} />,
        },
      ]}
    />
  );
}

function ReadyShelf({ wanted, at, onPlace }: BoardProps) {
  const { words } = useFacts();
  const pictures = useRecipePictures();
  const [kind, setKind] = useState<string | null>(null);
  const recipe = kind === null ? null : recipeOf(kind);
  if (recipe !== null) {
    return (
      <RecipeForm
        recipe={recipe}
        picture={pictures.get(recipe.kind) ?? null}
        at={at}
        onPlace={onPlace}
        onBack={() => setKind(null)}
      />
    );
  }
  const sorted = [...RECIPES].sort((a, b) => Number(isFor(wanted, b.category)) - Number(isFor(wanted, a.category)));
  return (
    <ul className="shelf">
      {sorted.map((r) => (
        <li key={r.kind}>
          <button type="button" className="shelf-item" onClick={() => setKind(r.kind)}>
            <span className="shelf-picture">
              {pictures.has(r.kind) && <img src={pictures.get(r.kind)} alt="" width={128} height={128} />}
            </span>
            <span className="shelf-name">{words === 'uk' ? r.ukName : inWords(r.name, words)}</span>
          </button>
        </li>
      ))}
    </ul>
  );
}
