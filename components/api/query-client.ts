import { QueryClient } from '@tanstack/react-query';
import { ApiProblem, NetworkFailure } from './problem';

/** Makes the store of what came from the server. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
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
}
