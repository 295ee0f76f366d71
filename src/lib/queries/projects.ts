import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { listActivity, listGuests, listProjects, readProject } from '#shared/api';
import { callApi } from '../api';

type ProjectListQuery = Omit<z.input<typeof listProjects.query>, 'after'>;

export const projectsQuery = (teamId: string, query: ProjectListQuery) =>
  infiniteQueryOptions({
    queryKey: ['team', teamId, 'projects', query],
    queryFn: ({ signal, pageParam }) =>
      callApi(listProjects, {
        params: { teamId },
        query: { ...query, ...(pageParam === null ? {} : { after: pageParam }) },
        signal,
      }),
    initialPageParam: null as string | null,
    getNextPageParam: (last) => last.after,
    placeholderData: keepPreviousData,
  });

export const projectQuery = (projectId: string) =>
  queryOptions({
    queryKey: ['project', projectId],
    queryFn: ({ signal }) => callApi(readProject, { params: { projectId }, signal }),
  });

export const guestsQuery = (projectId: string) =>
  queryOptions({
    queryKey: ['project', projectId, 'guests'],
    queryFn: ({ signal }) => callApi(listGuests, { params: { projectId }, signal }),
  });

export const activityQuery = (projectId: string) =>
  infiniteQueryOptions({
    queryKey: ['project', projectId, 'activity'],
    queryFn: ({ signal, pageParam }) =>
      callApi(listActivity, {
        params: { projectId },
        query: { limit: 12, ...(pageParam === null ? {} : { after: pageParam }) },
        signal,
      }),
    initialPageParam: null as string | null,
    getNextPageParam: (last) => last.after,
    staleTime: 0,
  });
