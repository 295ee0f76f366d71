// What a part is: its kind, where its measures come from, how far it may sit off, its group, a note.
import { useState } from 'react';
import {
  CATEGORIES,
  defaultTolerance,
  edits,
  MAX_NOTE,
  SOURCES,
  type Category,
  type Component,
  type Source,
} from '#shared/scene';
import { formatLength } from '#shared/units';
import { FinishSwatch } from '../../../components/finish-swatch';
import { LengthField } from '../../../components/length-field';
import { Select, TextArea } from '../../../components/text-field';
import { FINISH_NAME, finishOf } from '../../../lib/finishes';
import { categoryLabel } from '../../../lib/part-words';
import { useBench, useFacts, useOpen } from '../bench-model';
import { useSelection } from '../use-selection';

const SOURCE_WORDS: Readonly<Record<Source, string>> = {
  measured: 'measured on the car',
  sheet: "the maker's sheet",
  guess: 'a guess',
};

export function FactsPanel() {
  const { main } = useSelection();
  return main === null ? null : <Facts key={main.id} part={main} />;
}

function Facts({ part }: { readonly part: Component }) {
  const { open } = useBench();
  const { display, words } = useFacts();
  const scene = useOpen((o) => o.scene);
  const canEdit = useOpen((o) => o.canEdit);
  const { apply } = open.getState();
  const usual = part.source === undefined ? null : defaultTolerance(part.source, part.category);
  const finish = finishOf(part.category);
  return (
    <div className="tape-facts">
      <Select
        label="Kind of part"
        value={part.category}
        disabled={!canEdit}
        hint={<FinishSwatch finish={finish} label={`shown in ${FINISH_NAME[finish]}`} />}
        onChange={(event) => apply(edits.setCategory(scene, part.id, event.target.value as Category))}
      >
        {CATEGORIES.map((c) => (
          <option key={c} value={c}>
            {categoryLabel(c, words)}
          </option>
        ))}
      </Select>
      <Select
        label="Its measures are"
        value={part.source ?? ''}
        disabled={!canEdit}
        onChange={(event) =>
          apply(edits.setSource(scene, part.id, event.target.value === '' ? undefined : (event.target.value as Source)))
        }
      >
        <option value="">not said</option>
        {SOURCES.map((s) => (
          <option key={s} value={s}>
            {SOURCE_WORDS[s]}
          </option>
        ))}
      </Select>
      <LengthField
        label="Tolerance: it may sit off by"
        value={part.tolerance}
        display={display}
        least={0}
        disabled={!canEdit}
        hint={
          usual !== null && usual !== part.tolerance
            ? `usual for this: ${formatLength(usual, display, { denominator: 32, rounding: 'up' })}`
            : undefined
        }
        onCommit={(mm) => apply(edits.setTolerance(scene, part.id, mm))}
      />
      <Select
        label="Clamped in"
        value={part.group ?? ''}
        disabled={!canEdit || scene.groups.length === 0}
        onChange={(event) =>
          apply(edits.moveToGroup(scene, part.id, event.target.value === '' ? undefined : event.target.value))
        }
      >
        <option value="">no group</option>
        {scene.groups.map((g) => (
          <option key={g.id} value={g.id}>
            {g.name}
          </option>
        ))}
      </Select>
      <Note part={part} />
    </div>
  );
}

function Note({ part }: { readonly part: Component }) {
  const { open } = useBench();
  const canEdit = useOpen((o) => o.canEdit);
  const [typed, setTyped] = useState<string | null>(null);
  return (
    <TextArea
      label="Note"
      optional
      rows={3}
      maxLength={MAX_NOTE}
      readOnly={!canEdit}
      value={typed ?? part.note ?? ''}
      onChange={(event) => setTyped(event.target.value)}
      onBlur={() => {
        if (typed !== null && typed !== (part.note ?? '')) {
          open.getState().apply(edits.setNote(open.getState().scene, part.id, typed));
        }
        setTyped(null);
      }}
    />
  );
}
