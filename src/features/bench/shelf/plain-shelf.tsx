// A plain block: a box or a cylinder of given size, for what the shelf does not have.
import { useState } from 'react';
import { CATEGORIES, type Category, type Shape } from '#shared/scene';
import { MM_PER_INCH } from '#shared/units';
import { Button } from '../../../components/button';
import { Choice } from '../../../components/choice';
import { DialogActions } from '../../../components/dialog';
import { LengthField } from '../../../components/length-field';
import { Select, TextField } from '../../../components/text-field';
import { categoryLabel } from '../../../lib/part-words';
import { useFacts, useOpen } from '../bench-model';
import { LEAST_SIZE } from '../least-size';
import { plainPart } from '../new-parts';
import { LengthTriple } from '../tape/triple-fields';
import { CATEGORY_FOR } from './roll-call-categories';
import type { BoardProps } from './board';

export function PlainShelf({ wanted, at, onPlace }: BoardProps) {
  const { display, words } = useFacts();
  const scene = useOpen((o) => o.scene);
  const inch = display === 'mm' ? 25 : MM_PER_INCH;
  const [kind, setKind] = useState<'box' | 'cylinder'>('box');
  const [name, setName] = useState('');
  const [category, setCategory] = useState<Category>(wanted === null ? 'other' : CATEGORY_FOR[wanted]);
  const [size, setSize] = useState<readonly [number, number, number]>([8 * inch, 6 * inch, 4 * inch]);
  const [diameter, setDiameter] = useState(2 * inch);
  const [length, setLength] = useState(8 * inch);
  const shape: Shape = kind === 'box' ? { kind, size } : { kind, diameter, length };
  const usual = kind === 'box' ? 'Box' : 'Cylinder';
  return (
    <div className="recipe">
      <Choice
        legend="Shape"
        name="shape"
        inline
        value={kind}
        onChange={setKind}
        options={[
          { value: 'box', label: 'a box' },
          { value: 'cylinder', label: 'a cylinder, its length upright' },
        ]}
      />
      {kind === 'box' ? (
        <LengthTriple
          legend="Size"
          labels={['long', 'wide', 'high']}
          value={size}
          least={LEAST_SIZE}
          disabled={false}
          onCommit={setSize}
        />
      ) : (
        <div className="pair">
          <LengthField label="Diameter" display={display} value={diameter} least={LEAST_SIZE} onCommit={setDiameter} />
          <LengthField label="Length" display={display} value={length} least={LEAST_SIZE} onCommit={setLength} />
        </div>
      )}
      <TextField
        label="Call it"
        value={name}
        maxLength={120}
        placeholder={usual}
        onChange={(event) => setName(event.target.value)}
      />
      <Select label="Kind of part" value={category} onChange={(event) => setCategory(event.target.value as Category)}>
        {CATEGORIES.map((c) => (
          <option key={c} value={c}>
            {categoryLabel(c, words)}
          </option>
        ))}
      </Select>
      <DialogActions>
        <Button
          kind="main"
          onClick={() => {
            const called = name.trim() === '' ? usual : name.trim();
            onPlace(plainPart(scene, { name: called, category, source: 'guess', shape }, at()));
          }}
        >
          Put it on the bench
        </Button>
      </DialogActions>
    </div>
  );
}
