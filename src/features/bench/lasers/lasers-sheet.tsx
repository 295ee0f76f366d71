// The lasers of the scene: the datum planes that positions are read off.
import { useState } from 'react';
import { edits, freshId, type Laser } from '#shared/scene';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { IconButton } from '../../../components/icon-button';
import { CrossMark } from '../../../components/pictograms';
import { TextField } from '../../../components/text-field';
import { useBench, useOpen, useSession } from '../bench-model';
import { DirectionTriple, LengthTriple } from '../tape/triple-fields';

export function LasersSheet() {
  const { session } = useBench();
  const isOpen = useSession((s) => s.sheet === 'lasers');
  return (
    <Dialog
      open={isOpen}
      onOpenChange={(open) => {
        if (!open) session.getState().set({ sheet: null });
      }}
      title="Lasers"
      lead="Planes that a line laser would throw on the car. The first is the datum that hangs as a curtain; all of them are thrown on the parts. Never look into the laser."
      wide
    >
      <Lasers />
    </Dialog>
  );
}

const NEW: readonly (readonly [string, Laser['normal']])[] = [
  ['upright, along the car', [0, 1, 0]],
  ['upright, across the car', [1, 0, 0]],
  ['level', [0, 0, 1]],
];

function Lasers() {
  const { open } = useBench();
  const scene = useOpen((o) => o.scene);
  const canEdit = useOpen((o) => o.canEdit);
  const { apply } = open.getState();
  return (
    <>
      <ul className="lasers">
        {scene.lasers.map((laser) => (
          <LaserRow key={laser.id} laser={laser} canEdit={canEdit} />
        ))}
        {scene.lasers.length === 0 && <li>No laser yet. One along the steering column is the usual datum.</li>}
      </ul>
      {canEdit && (
        <div className="mt-4 flex flex-wrap items-baseline gap-2 border-t border-dashed border-line pt-4">
          <span>Add one</span>
          {NEW.map(([name, normal]) => (
            <Button
              key={name}
              size="small"
              onClick={() =>
                apply(
                  edits.addLaser(scene, {
                    id: freshId(scene.lasers, 'laser'),
                    name: `Laser ${scene.lasers.length + 1}`,
                    point: [0, 0, 0],
                    normal,
                  }),
                )
              }
            >
              {name}
            </Button>
          ))}
        </div>
      )}
    </>
  );
}

function LaserRow({ laser, canEdit }: { readonly laser: Laser; readonly canEdit: boolean }) {
  const { open } = useBench();
  const scene = useOpen((o) => o.scene);
  const [name, setName] = useState<string | null>(null);
  const { apply } = open.getState();
  return (
    <li className="laser-row">
      <TextField
        label="Called"
        value={name ?? laser.name}
        maxLength={120}
        disabled={!canEdit}
        onChange={(event) => setName(event.target.value)}
        onBlur={() => {
          const next = name?.trim() ?? '';
          if (next !== '' && next !== laser.name) apply(edits.renameLaser(scene, laser.id, next));
          setName(null);
        }}
      />
      <LengthTriple
        legend="goes through"
        labels={['rearward', 'right', 'up']}
        value={laser.point}
        disabled={!canEdit}
        onCommit={(point) => apply(edits.moveLaser(scene, laser.id, point))}
      />
      <DirectionTriple
        legend="square to"
        labels={['rearward', 'right', 'up']}
        value={laser.normal}
        disabled={!canEdit}
        onCommit={(normal) => apply(edits.moveLaser(scene, laser.id, laser.point, normal))}
      />
      {canEdit && (
        <IconButton label={`Take ${laser.name} away`} onClick={() => apply(edits.removeLaser(scene, laser.id))}>
          <CrossMark />
        </IconButton>
      )}
    </li>
  );
}
