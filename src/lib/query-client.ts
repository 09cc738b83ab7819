import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { ApiError, NetworkError } from './api-error.ts';
import { sessionQuery } from './session.ts';

const mostRetries = 2;

/**
 * The store of what the server said. A lost sign-in makes the session be asked for anew, which leads to
 * the sign-in screen; a refusal is final, a lost connection is tried again.
 */
export function createQueryClient(): QueryClient {
  const noticeLostSignIn = (error: Error): void => {
    if (error instanceof ApiError && error.status === 401) {
      void client.invalidateQueries({ queryKey: sessionQuery.queryKey });
    }
  };
  const client = new QueryClient({
    queryCache: new QueryCache({ onError: noticeLostSignIn }),
    mutationCache: new MutationCache({ onError: noticeLostSignIn }),
    defaultOptions: {
      queries: {
        staleTime: 10_000,
        // Asks the server even if the browser believes to be offline: a server may be in the same house.
        networkMode: 'always',
        retry: (failures, error) =>
          failures < mostRetries &&
          (error instanceof NetworkError || (error instanceof ApiError && error.status >= 500)),
      },
      mutations: { networkMode: 'always', retry: false },
    },
  });
  return client;
}
