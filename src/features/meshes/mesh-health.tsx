import type { MeshLine } from '#shared/api';
import { countOf } from '../../lib/format';

export type MeshHealthFacts = Pick<MeshLine, 'kind' | 'badEdges' | 'shells' | 'dropped' | 'triangles'>;

/** What the mesh is good for, in plain words: first what it is, then what is wrong with it. */
export function healthWords(mesh: MeshHealthFacts): { readonly is: string; readonly notes: readonly string[] } {
  const notes: string[] = [];
  if (mesh.kind === 'sheet') {
    notes.push(
      mesh.badEdges > 0
        ? `${countOf(mesh.badEdges, 'torn or folded edge')}: only its surface is checked`
        : 'only its surface is checked',
    );
  }
  if (mesh.shells > 1) notes.push(`${countOf(mesh.shells, 'piece')} in one file`);
  if (mesh.dropped > 0) notes.push(`${countOf(mesh.dropped, 'useless triangle')} left out`);
  return { is: mesh.kind === 'body' ? 'closed shape' : 'open surface', notes };
}

export function MeshHealth({ mesh }: { readonly mesh: MeshHealthFacts }) {
  const { is, notes } = healthWords(mesh);
  return (
    <span className="inline-grid">
      <span className={mesh.kind === 'body' ? 'font-semibold text-clears' : 'font-semibold text-tight'}>{is}</span>
      {notes.map((note) => (
        <span key={note} className="text-sm text-soft">
          {note}
        </span>
      ))}
    </span>
  );
}
