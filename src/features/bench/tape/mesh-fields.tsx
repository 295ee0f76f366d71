// A mesh of the team: which, and how large one unit of its file is.
import { useQuery } from '@tanstack/react-query';
import { MESH_UNITS, meshUnits, type MeshUnit } from '#shared/api';
import { edits, type Component, type MeshShape, type Solid } from '#shared/scene';
import { Length } from '../../../components/fraction';
import { Select } from '../../../components/text-field';
import { Button } from '../../../components/button';
import { meshQuery } from '../../../lib/queries/meshes';
import { useBench, useFacts, useOpen } from '../bench-model';
import { shapeBoxOf } from '../viewport/extent';
import { useMeshVersion } from '../viewport/use-mesh-version';
import { sizeOf } from '../viewport/vectors';

const UNIT_WORDS: Readonly<Record<MeshUnit, string>> = {
  mm: 'millimetres',
  cm: 'centimetres',
  m: 'metres',
  in: 'inches',
  ft: 'feet',
};

interface MeshFieldsProps {
  readonly part: Component;
  readonly solid: Solid;
  readonly shape: MeshShape;
}

export function MeshFields({ part, solid, shape }: MeshFieldsProps) {
  const { open, meshes } = useBench();
  const { display, teamId } = useFacts();
  const scene = useOpen((o) => o.scene);
  const canEdit = useOpen((o) => o.canEdit);
  const mesh = useQuery(meshQuery(teamId, shape.mesh));
  useMeshVersion();
  const unit = meshUnits.find((u) => MESH_UNITS[u] === shape.scale) ?? null;
  const box = shapeBoxOf(shape, meshes);
  const drawing = meshes.get(shape.mesh);
  return (
    <div className="mesh-fields">
      <p>
        <b>{mesh.data?.name ?? 'mesh'}</b>{' '}
        {mesh.data !== undefined && (
          <span className="tape-small">{mesh.data.kind === 'body' ? 'a closed shape' : 'an open surface'}</span>
        )}
      </p>
      {drawing?.state === 'failed' && (
        <p role="alert" className="tape-small text-hits">
          Its drawing could not be read: its box stands for it. {drawing.sentence}{' '}
          <Button size="small" onClick={() => meshes.retry(shape.mesh)}>
            Try again
          </Button>
        </p>
      )}
      {box !== null && (
        <p className="tape-small">
          {sizeOf(box).map((mm, k) => (
            <span key={k}>
              {k > 0 && ' \u00d7 '}
              <Length mm={mm} display={display} />
            </span>
          ))}
        </p>
      )}
      <Select
        label="One unit of its file is"
        value={unit ?? ''}
        disabled={!canEdit}
        onChange={(event) => {
          const next = meshUnits.find((u) => u === event.target.value);
          if (next === undefined) return;
          const scaled = { ...shape, scale: MESH_UNITS[next] };
          open.getState().apply(edits.setShape(scene, part.id, solid.id, scaled));
        }}
      >
        {unit === null && <option value="">{`${shape.scale} mm`}</option>}
        {meshUnits.map((u) => (
          <option key={u} value={u}>
            {UNIT_WORDS[u]}
          </option>
        ))}
      </Select>
    </div>
  );
}
