import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { listScenes, readDocument, type openDocument } from '#shared/api';
import { callApi } from '../api';

export type ReadDocument = z.output<typeof openDocument>;
type SceneListQuery = z.input<typeof listScenes.query>;

export const scenesQuery = (projectId: string, query: SceneListQuery) =>
  queryOptions({
    queryKey: ['project', projectId, 'scenes', query],
    queryFn: ({ signal }) => callApi(listScenes, { params: { projectId }, query, signal }),
    placeholderData: keepPreviousData,
  });

/** The document as a sitting starts from it. From then on it lives in the sitting's store, so it is never read again here. */
export const documentQuery = (sceneId: string) =>
  queryOptions({
    queryKey: ['scene', sceneId, 'document'],
    queryFn: ({ signal }) => callApi(readDocument, { params: { sceneId }, signal }),
    staleTime: Infinity,
    gcTime: 0,
  });
