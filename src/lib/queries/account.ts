import { queryOptions } from '@tanstack/react-query';
import { listShelvedMail, readMe, readServerFacts } from '#shared/api';
import { callApi } from '../api';
import { hasSession } from '../auth-calls';

export const meQuery = () =>
  queryOptions({ queryKey: ['me'], queryFn: ({ signal }) => callApi(readMe, { signal }), staleTime: 60_000 });

export const serverFactsQuery = () =>
  queryOptions({
    queryKey: ['server'],
    queryFn: ({ signal }) => callApi(readServerFacts, { signal }),
    staleTime: 5 * 60_000,
  });

export const shelvedMailQuery = (to: string) =>
  queryOptions({
    queryKey: ['mail', to],
    queryFn: ({ signal }) => callApi(listShelvedMail, { query: to === '' ? {} : { to }, signal }),
    staleTime: 0,
    refetchInterval: 4000,
  });

/** Whether somebody is signed in, without the failure that asking for the person would be. */
export const sessionQuery = () => queryOptions({ queryKey: ['session'], queryFn: hasSession, staleTime: 60_000 });
