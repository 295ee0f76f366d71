// The one cache of what the server owns.
import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { ApiProblem, isProblem } from './api-problem';

/** Trying again helps where the server or the way to it failed, not where it said no. */
function isWorthRetrying(error: unknown): boolean {
  return error instanceof ApiProblem && (error.status >= 500 || error.code === 'network/unreachable');
}

export function createQueryClient(onMutationError: (error: unknown) => void): QueryClient {
  /** A session that has ended is seen by whatever asks next; asking for the person again lets the guard send to the door. */
  const watchSession = (error: unknown, isAboutMe: boolean): void => {
    if (!isProblem(error, 'session/missing')) return;
    // the door lets everybody through who is said to be signed in
    client.setQueryData(['session'], false);
    if (!isAboutMe) void client.invalidateQueries({ queryKey: ['me'] });
  };
  const client: QueryClient = new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: 10_000,
        retry: (count, error) => count < 2 && isWorthRetrying(error),
        retryDelay: (count) => 400 * 2 ** count,
        // without a connection a read must fail and say so, not wait for ever
        networkMode: 'always',
      },
      mutations: { retry: false, networkMode: 'always' },
    },
    queryCache: new QueryCache({
      onError: (error, query) => watchSession(error, query.queryKey[0] === 'me'),
    }),
    mutationCache: new MutationCache({
      onError: (error, _variables, _context, mutation) => {
        watchSession(error, false);
        // a form shows its problem itself
        if (mutation.meta?.['shownInPlace'] !== true) onMutationError(error);
      },
    }),
  });
  return client;
}

/** For mutations whose caller shows the problem where it happened. */
export const shownInPlace = { shownInPlace: true } as const;
