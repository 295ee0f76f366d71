// The tape: a card beside the selected part, with its place in the shop's own terms and all else that can be said of it.
import { useState } from 'react';
import { edits } from '#shared/scene';
import { Button } from '../../../components/button';
import { Hole } from '../../../components/hole';
import { IconButton } from '../../../components/icon-button';
import { CrossMark, HolesMark } from '../../../components/pictograms';
import { Tabs } from '../../../components/tabs';
import { useBench, useOpen } from '../bench-model';
import { clamp } from '../part-deeds';
import { useSelection } from '../use-selection';
import { FactsPanel } from './facts-panel';
import { MotionPanel } from './motion-panel';
import { NeighboursPanel } from './neighbours-panel';
import { PlacePanel } from './place-panel';
import { ShapePanel } from './shape-panel';
import { TapeName } from './tape-name';

type Page = 'place' | 'shape' | 'motion' | 'facts' | 'neighbours';

export function Tape() {
  const bench = useBench();
  const { ids, main, group } = useSelection();
  const scene = useOpen((o) => o.scene);
  const { set, select } = bench.session.getState();
  if (main === null) return null;
  const meant = scene.groups.find((g) => g.id === group) ?? null;
  return (
    <aside className="tape on-card cut" aria-label="Tape">
      <header className="tape-head">
        <Hole ring through="var(--dye)" className="tape-hole" />
        {meant !== null ? (
          <TapeName
            key={meant.id}
            name={meant.name}
            label="Name of the group"
            onRename={(name) => bench.open.getState().apply(edits.renameGroup(scene, meant.id, name))}
          />
        ) : ids.length > 1 ? (
          <h2 className="tape-title">{ids.length} parts</h2>
        ) : (
          <TapeName
            key={main.id}
            name={main.name}
            label="Name of the part"
            onRename={(name) => bench.open.getState().apply(edits.renameComponent(scene, main.id, name))}
          />
        )}
        <IconButton
          label="More for this"
          onClick={(event) => {
            const { left, bottom } = event.currentTarget.getBoundingClientRect();
            set({ menuAt: { x: left, y: bottom + 4 } });
          }}
        >
          <HolesMark />
        </IconButton>
        <IconButton label="Put the tape away" onClick={() => select([])}>
          <CrossMark />
        </IconButton>
      </header>
      <Clamped />
      {ids.length > 1 || meant !== null ? <PlacePanel /> : <TapePages />}
    </aside>
  );
}

/** One line on what moves together, and the way to more or less of it. */
function Clamped() {
  const bench = useBench();
  const { ids, main, group } = useSelection();
  const scene = useOpen((o) => o.scene);
  const canEdit = useOpen((o) => o.canEdit);
  const { set } = bench.session.getState();
  const own = scene.groups.find((g) => g.id === main?.group);
  if (ids.length > 1) {
    return (
      <p className="tape-clamped">
        selected together
        {canEdit && (
          <Button size="small" onClick={() => clamp(bench)}>
            Clamp together
          </Button>
        )}
      </p>
    );
  }
  if (own === undefined) return null;
  const count = scene.components.filter((c) => c.group === own.id).length;
  return (
    <p className="tape-clamped">
      {group === null ? `one of ${count} in ${own.name}` : `${count} parts together`}
      <button type="button" className="button-text" onClick={() => set({ reach: group === null ? 'group' : 'part' })}>
        {group === null ? 'whole group' : 'this part alone'}
      </button>
    </p>
  );
}

function TapePages() {
  const [page, setPage] = useState<Page>('place');
  return (
    <Tabs<Page>
      label="Of this part"
      value={page}
      onChange={setPage}
      panels={[
        { value: 'place', label: 'Place', content: <PlacePanel /> },
        { value: 'shape', label: 'Size', content: <ShapePanel /> },
        { value: 'motion', label: 'Motion', content: <MotionPanel /> },
        { value: 'facts', label: 'What', content: <FactsPanel /> },
        { value: 'neighbours', label: 'Joints', content: <NeighboursPanel /> },
      ]}
    />
  );
}
