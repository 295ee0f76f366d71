import { queryOptions } from '@tanstack/react-query';
import { listDryFits, readDocument, readRevision, type DryFit } from '#shared/api';
import { callApi } from '../api';

export const isUnderWay = ({ state }: Pick<DryFit, 'state'>): boolean => state === 'queued' || state === 'running';

/** How often a dry fit that is under way is asked after, ms. */
const BEAT = 700;

/** All dry fits of a scene, the newest first; asked again by itself while one is under way. */
export const dryFitsQuery = (sceneId: string) =>
  queryOptions({
    queryKey: ['scene', sceneId, 'dry-fits'],
    queryFn: ({ signal }) => callApi(listDryFits, { params: { sceneId }, signal }),
    staleTime: 0,
    refetchInterval: ({ state }) => (state.data?.some(isUnderWay) === true ? BEAT : false),
  });

/** A revision with its document, its report and its pictures. Only report and pictures can still come in. */
export const revisionQuery = (revisionId: string) =>
  queryOptions({
    queryKey: ['revision', revisionId],
    queryFn: ({ signal }) => callApi(readRevision, { params: { revisionId }, signal }),
    refetchInterval: ({ state }) => {
      const dryFit = state.data?.dryFit ?? null;
      return dryFit !== null && isUnderWay(dryFit) ? BEAT : false;
    },
  });

/** The scene as it is kept just now, for those who only look: the bench reads it in its own way. */
export const keptSceneQuery = (sceneId: string) =>
  queryOptions({
    queryKey: ['scene', sceneId, 'kept'],
    queryFn: ({ signal }) => callApi(readDocument, { params: { sceneId }, signal }),
    staleTime: 0,
  });
