import { queryOptions } from '@tanstack/react-query';
import { listShares, readShared } from '#shared/api';
import { callApi } from '../api';

export const sharesQuery = (projectId: string) =>
  queryOptions({
    queryKey: ['project', projectId, 'shares'],
    queryFn: ({ signal }) => callApi(listShares, { params: { projectId }, signal }),
  });

/** What a share link opens; the same for as long as it is open at all. */
export const sharedQuery = (token: string) =>
  queryOptions({
    queryKey: ['shared', token],
    queryFn: ({ signal }) => callApi(readShared, { params: { token }, signal }),
    staleTime: 60_000,
  });
