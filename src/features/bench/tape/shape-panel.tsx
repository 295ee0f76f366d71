// The sizes of a part: a ready-made part's measurements, or its solids one by one; and its holes.
import { edits, type Component, type Solid } from '#shared/scene';
import { Length } from '../../../components/fraction';
import { LengthField } from '../../../components/length-field';
import { useBench, useFacts, useOpen, useShown } from '../bench-model';
import { LEAST_SIZE } from '../least-size';
import { useSelection } from '../use-selection';
import { MeshFields } from './mesh-fields';
import { RecipeFields } from './recipe-fields';
import { LengthTriple } from './triple-fields';

export function ShapePanel() {
  const { main } = useSelection();
  const part = useShown().components.find((c) => c.id === main?.id);
  if (part === undefined) return null;
  return (
    <div className="tape-shape" key={part.id}>
      {part.recipe !== undefined ? (
        <>
          <RecipeFields part={part} />
          <details>
            <summary>Its {part.solids.length} solids</summary>
            <p className="tape-small">Changed here by hand, the part is no longer made from the measurements above.</p>
            <Solids part={part} />
          </details>
        </>
      ) : (
        <Solids part={part} />
      )}
      <Holes part={part} />
    </div>
  );
}

const Solids = ({ part }: { readonly part: Component }) => (
  <ul className="solids">
    {part.solids.map((solid) => (
      <li key={solid.id}>
        {part.solids.length > 1 && <h4>{solid.name ?? solid.id.replaceAll('-', ' ')}</h4>}
        <SolidFields part={part} solid={solid} />
      </li>
    ))}
  </ul>
);

function SolidFields({ part, solid }: { readonly part: Component; readonly solid: Solid }) {
  const { open } = useBench();
  const { display } = useFacts();
  const scene = useOpen((o) => o.scene);
  const canEdit = useOpen((o) => o.canEdit);
  const { shape } = solid;
  const set = (next: Solid['shape']): void => open.getState().apply(edits.setShape(scene, part.id, solid.id, next));
  if (shape.kind === 'mesh') return <MeshFields part={part} solid={solid} shape={shape} />;
  if (shape.kind === 'box') {
    return (
      <LengthTriple
        legend="box"
        labels={['long', 'wide', 'high']}
        value={shape.size}
        least={LEAST_SIZE}
        disabled={!canEdit}
        onCommit={(size) => set({ ...shape, size })}
      />
    );
  }
  return (
    <fieldset className="triple">
      <legend>cylinder</legend>
      <LengthField
        label="diameter"
        look="measure"
        display={display}
        value={shape.diameter}
        least={LEAST_SIZE}
        disabled={!canEdit}
        onCommit={(diameter) => set({ ...shape, diameter })}
      />
      <LengthField
        label="length"
        look="measure"
        display={display}
        value={shape.length}
        least={LEAST_SIZE}
        disabled={!canEdit}
        onCommit={(length) => set({ ...shape, length })}
      />
    </fieldset>
  );
}

function Holes({ part }: { readonly part: Component }) {
  const { display } = useFacts();
  if (part.holes.length === 0) return null;
  const sizes = new Map<number, number>();
  for (const { diameter } of part.holes) sizes.set(diameter, (sizes.get(diameter) ?? 0) + 1);
  return (
    <section className="tape-holes">
      <h4>Holes</h4>
      <ul>
        {[...sizes].map(([diameter, count]) => (
          <li key={diameter}>
            {count} of <Length mm={diameter} display={display} options={{ denominator: 64 }} />
          </li>
        ))}
      </ul>
    </section>
  );
}
