// Brings the meshes of a team to the check: the file itself, not the thinned-out copy that is drawn.
import { loadedMesh, type LoadedMesh } from '#shared/check';
import { readMeshFile } from '#shared/api';
import { meshFromStl } from '#shared/geometry';
import { fetchFile } from '../lib/api';
import { isProblem, sayProblem } from '../lib/api-problem';

export type MeshAnswer =
  | { readonly ok: true; readonly mesh: LoadedMesh }
  /** `again`: the way to the server failed, not the file. */
  | { readonly ok: false; readonly sentence: string; readonly again: boolean };

export async function readTeamMesh(teamId: string, sha256: string): Promise<MeshAnswer> {
  let bytes: ArrayBuffer;
  try {
    bytes = await fetchFile(readMeshFile, { teamId, sha256 });
  } catch (error) {
    return { ok: false, sentence: sayProblem(error), again: !isProblem(error, 'thing/missing', 'access/denied') };
  }
  const result = meshFromStl(new Uint8Array(bytes));
  if (!result.ok) return { ok: false, sentence: `its mesh cannot be read: ${result.reason}.`, again: false };
  return { ok: true, mesh: loadedMesh(result.mesh, sha256) };
}
