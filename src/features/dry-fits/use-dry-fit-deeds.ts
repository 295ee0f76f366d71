// Starting and cancelling dry fits.
import { useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { cancelDryFit, runDryFit, type DryFit } from '#shared/api';
import { callApi } from '../../lib/api';
import { isProblem } from '../../lib/api-problem';
import { dryFitsQuery, keptSceneQuery } from '../../lib/queries/dry-fits';
import { shownInPlace } from '../../lib/query-client';

/** Puts a dry fit into the list that is there, in place of what was known of it. */
export function noteDryFit(queryClient: QueryClient, dryFit: DryFit): void {
  queryClient.setQueryData(dryFitsQuery(dryFit.sceneId).queryKey, (known) => [
    dryFit,
    ...(known ?? []).filter((each) => each.id !== dryFit.id),
  ]);
  // asked again in any case: the list may not have been there
  void queryClient.invalidateQueries({ queryKey: dryFitsQuery(dryFit.sceneId).queryKey });
  void queryClient.invalidateQueries({ queryKey: ['revision', dryFit.revisionId] });
}

/** `saveNumberOf` gives the save that is to be checked; null: it could not be saved, and nothing is started. */
export function useRunDryFit(sceneId: string, saveNumberOf: () => Promise<number | null>) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: async () => {
      const saveNumber = await saveNumberOf();
      if (saveNumber === null) return null;
      return callApi(runDryFit, { params: { sceneId }, body: { saveNumber } });
    },
    onSuccess: (dryFit) => {
      if (dryFit !== null) noteDryFit(queryClient, dryFit);
    },
    meta: shownInPlace,
  });
}

/** The save that a scene stands at, asked anew each time: somebody may be at the bench right now. */
export function useKeptSaveNumber(sceneId: string): () => Promise<number> {
  const queryClient = useQueryClient();
  return async () => (await queryClient.fetchQuery(keptSceneQuery(sceneId))).saveNumber;
}

export function useCancelDryFit() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (dryFit: DryFit) => callApi(cancelDryFit, { params: { dryFitId: dryFit.id } }),
    onSuccess: (dryFit) => noteDryFit(queryClient, dryFit),
    onError: (error, dryFit) => {
      // it came through in the very moment: the list tells
      if (isProblem(error, 'dry-fit/ended')) {
        void queryClient.invalidateQueries({ queryKey: dryFitsQuery(dryFit.sceneId).queryKey });
      }
    },
  });
}
