// Making and revoking share links.
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { makeShare, revokeShare, type Share } from '#shared/api';
import { callApi } from '../../lib/api';
import { sharesQuery } from '../../lib/queries/shares';
import { shownInPlace } from '../../lib/query-client';

export function useMakeShare(projectId: string, revisionId: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (pictureId: string | null) => callApi(makeShare, { params: { revisionId }, body: { pictureId } }),
    onSuccess: (share) => {
      queryClient.setQueryData(sharesQuery(projectId).queryKey, (known) => [share, ...(known ?? [])]);
      void queryClient.invalidateQueries({ queryKey: ['project', projectId] });
    },
    meta: shownInPlace,
  });
}

export function useRevokeShare(projectId: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (share: Share) => callApi(revokeShare, { params: { shareId: share.id } }),
    onSuccess: () => queryClient.invalidateQueries({ queryKey: sharesQuery(projectId).queryKey }),
    meta: shownInPlace,
  });
}
