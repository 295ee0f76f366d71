// A bench for an open scene: its own session, camera and drawn meshes around the stores that it is given.
import { decodeDisplayMesh, readDisplayMesh, readMesh } from '#shared/api';
import { callApi, fetchFile } from '../../lib/api';
import { localProblem, sayProblem } from '../../lib/api-problem';
import type { Bench } from './bench-model';
import { createSession } from './session';
import { createFrameStore } from './viewport/frame';
import { createMeshSource } from './viewport/mesh-source';
import { createViewControl } from './viewport/view-control';

export function newBench({ open, live }: Pick<Bench, 'open' | 'live'>, teamId: string): Bench {
  const meshes = createMeshSource({
    load: async (sha256) => {
      const mesh = decodeDisplayMesh(await fetchFile(readDisplayMesh, { teamId, sha256 }));
      if (mesh === null) throw localProblem('answer/unreadable');
      return mesh;
    },
    extent: async (sha256) => {
      const { low, high } = await callApi(readMesh, { params: { teamId, sha256 } });
      return { low, high };
    },
    say: sayProblem,
  });
  return { open, live, session: createSession(), meshes, frames: createFrameStore(), view: createViewControl() };
}
