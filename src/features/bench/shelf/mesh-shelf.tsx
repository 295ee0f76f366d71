// The meshes of the team, from a scanner or a supplier.
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { MESH_UNITS, type MeshLine } from '#shared/api';
import { CATEGORIES, type Category } from '#shared/scene';
import { formatLength } from '#shared/units';
import { Button, ButtonLink } from '../../../components/button';
import { Select } from '../../../components/text-field';
import { EmptyState, ErrorState, LoadingState } from '../../../components/states';
import { tell } from '../../../lib/api-problem';
import { categoryLabel } from '../../../lib/part-words';
import { meshesQuery } from '../../../lib/queries/meshes';
import { useFacts, useOpen } from '../bench-model';
import { plainPart } from '../new-parts';
import { CATEGORY_FOR } from './roll-call-categories';
import type { BoardProps } from './board';

/** Names of files make names of parts: without ending, with spaces. */
const partName = (file: string): string =>
  file
    .replace(/\.stl$/i, '')
    .replace(/[_-]+/g, ' ')
    .trim()
    .slice(0, 110) || 'Mesh';

export function MeshShelf({ wanted, at, onPlace }: BoardProps) {
  const { teamId, words, display } = useFacts();
  const scene = useOpen((o) => o.scene);
  const meshes = useQuery(meshesQuery(teamId, {}));
  const [category, setCategory] = useState<Category>(wanted === null ? 'other' : CATEGORY_FOR[wanted]);
  if (meshes.isPending) return <LoadingState what="the meshes" />;
  if (meshes.isError) return <ErrorState {...tell(meshes.error)} onRetry={() => void meshes.refetch()} />;
  if (meshes.data.length === 0) {
    return (
      <EmptyState
        small
        title="The team has no mesh yet."
        action={
          <ButtonLink kind="main" to={`/teams/${teamId}/meshes`}>
            Bring a mesh
          </ButtonLink>
        }
      >
        Bring an STL file from a scanner or a supplier; then it can be put on any bench of the team.
      </EmptyState>
    );
  }
  const size = (mesh: MeshLine): string => {
    const scale = MESH_UNITS[mesh.unit ?? mesh.guess];
    return mesh.low.map((low, k) => formatLength((mesh.high[k]! - low) * scale, display)).join(' \u00d7 ');
  };
  return (
    <div className="recipe">
      <Select label="Kind of part" value={category} onChange={(event) => setCategory(event.target.value as Category)}>
        {CATEGORIES.map((c) => (
          <option key={c} value={c}>
            {categoryLabel(c, words)}
          </option>
        ))}
      </Select>
      <ul className="mesh-shelf">
        {meshes.data.map((mesh) => (
          <li key={mesh.sha256}>
            <span className="font-bold">{mesh.name}</span>
            <span className="tape-small">
              {size(mesh)}
              {mesh.unit === null && `, if its unit is ${mesh.guess}`} {'\u00b7'}{' '}
              {mesh.kind === 'body' ? 'a closed shape' : 'an open surface'}
            </span>
            <Button
              size="small"
              onClick={() =>
                onPlace(
                  plainPart(
                    scene,
                    {
                      name: partName(mesh.name),
                      category,
                      source: 'measured',
                      shape: { kind: 'mesh', mesh: mesh.sha256, scale: MESH_UNITS[mesh.unit ?? mesh.guess] },
                    },
                    meshPlace(mesh, at()),
                  ),
                )
              }
            >
              Put it on the bench
            </Button>
          </li>
        ))}
      </ul>
    </div>
  );
}

/** A scan has its own zero point, often far off: its middle is put where one looks. */
function meshPlace(mesh: MeshLine, at: readonly [number, number, number]): readonly [number, number, number] {
  const scale = MESH_UNITS[mesh.unit ?? mesh.guess];
  return [0, 1, 2].map((k) => {
    const middle = ((mesh.low[k]! + mesh.high[k]!) / 2) * scale;
    return Math.round((at[k]! - middle) * 10) / 10;
  }) as unknown as readonly [number, number, number];
}
