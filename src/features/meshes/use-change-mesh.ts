import { useMutation, useQueryClient } from '@tanstack/react-query';
import { changeMesh, type MeshLine, type MeshUnit } from '#shared/api';
import { callApi } from '../../lib/api';
import { shownInPlace } from '../../lib/query-client';

/** Renames a mesh, or says its unit. */
export function useChangeMesh({ teamId, sha256 }: Pick<MeshLine, 'teamId' | 'sha256'>, onDone?: () => void) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (change: { readonly name?: string; readonly unit?: MeshUnit }) =>
      callApi(changeMesh, { params: { teamId, sha256 }, body: change }),
    onSuccess: async () => {
      await queryClient.invalidateQueries({ queryKey: ['team', teamId, 'meshes'] });
      onDone?.();
    },
    meta: shownInPlace,
  });
}
