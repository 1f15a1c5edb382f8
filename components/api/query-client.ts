import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { ApiProblem, NetworkFailure } from './problem';
import { sessionQuery } from './session';

/** Codes that mean: whoever was signed in here no longer is. */
const ended = new Set(['sign-in-required', 'session-ended', 'token-invalid', 'token-expired']);

/** Makes the store of what came from the server. */
export function createQueryClient(): QueryClient {
  const noteEnd = (error: unknown) => {
    if (error instanceof ApiProblem && ended.has(error.code)) client.setQueryData(sessionQuery.queryKey, null);
  };
  const client = new QueryClient({
    queryCache: new QueryCache({ onError: noteEnd }),
    mutationCache: new MutationCache({ onError: noteEnd }),
    defaultOptions: {
      queries: {
        // A layout can be answered from the device with no network, so a query always runs.
        networkMode: 'always',
        staleTime: 60_000,
        gcTime: 30 * 60_000,
        retry: (count, error) => {
          if (error instanceof NetworkFailure) return false;
          if (error instanceof ApiProblem) return error.status >= 500 && count < 2;
          return false;
        },
      },
      mutations: { networkMode: 'always', retry: false },
    },
  });
  return client;
}
