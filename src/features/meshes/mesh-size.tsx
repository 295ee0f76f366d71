import { MESH_UNITS, type MeshLine, type MeshUnit } from '#shared/api';
import type { LengthDisplay } from '#shared/units';
import { Length } from '../../components/fraction';

/** The mesh's extent in mm, were its file in this unit. */
export function extentOf(mesh: Pick<MeshLine, 'low' | 'high'>, unit: MeshUnit): readonly [number, number, number] {
  const scale = MESH_UNITS[unit];
  return [0, 1, 2].map((k) => (mesh.high[k]! - mesh.low[k]!) * scale) as [number, number, number];
}

export interface MeshSizeProps {
  readonly mesh: Pick<MeshLine, 'low' | 'high'>;
  readonly unit: MeshUnit;
  readonly display: LengthDisplay;
}

/** Three lengths and their unit: 4 1/4 x 6 x 9 in. */
export function MeshSize({ mesh, unit, display }: MeshSizeProps) {
  const [x, y, z] = extentOf(mesh, unit);
  return (
    <span className="whitespace-nowrap">
      {[x, y, z].map((mm, k) => (
        <span key={k}>
          {k > 0 && <span aria-hidden="true"> × </span>}
          <Length mm={mm} display={display} unit={false} />
          {k < 2 && <span className="sr-only"> by </span>}
        </span>
      ))}{' '}
      <span aria-hidden="true">{display === 'mm' ? 'mm' : 'in'}</span>
    </span>
  );
}
