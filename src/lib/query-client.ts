// The one cache of what the server owns.
import { MutationCache, QueryClient } from '@tanstack/react-query';
import { ApiProblem } from './api-problem';

/** Trying again helps where the server or the way to it failed, not where it said no. */
function isWorthRetrying(error: unknown): boolean {
  return error instanceof ApiProblem && (error.status >= 500 || error.code === 'network/unreachable');
}

export function createQueryClient(onMutationError: (error: unknown) => void): QueryClient {
  return new QueryClient({
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
    mutationCache: new MutationCache({
      onError: (error, _variables, _context, mutation) => {
        // a form shows its problem itself
        if (mutation.meta?.['shownInPlace'] !== true) onMutationError(error);
      },
    }),
  });
}

/** For mutations whose caller shows the problem where it happened. */
export const shownInPlace = { shownInPlace: true } as const;
