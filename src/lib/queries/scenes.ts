import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { listScenes } from '#shared/api';
import { callApi } from '../api';

type SceneListQuery = z.input<typeof listScenes.query>;

export const scenesQuery = (projectId: string, query: SceneListQuery) =>
  queryOptions({
    queryKey: ['project', projectId, 'scenes', query],
    queryFn: ({ signal }) => callApi(listScenes, { params: { projectId }, query, signal }),
    placeholderData: keepPreviousData,
  });
