import { QueryCache, QueryClient } from '@tanstack/react-query';
import { keys } from '../lib/api/keys.ts';
import { isApiProblem } from '../lib/api/problem.ts';

const tries = 2;

/** Answers are kept for half a minute; a refusal is not tried again, want of a connection is. */
export function createQueryClient(): QueryClient {
  const client = new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: 30_000,
        retry: (failures, error) => failures < tries && !(isApiProblem(error) && error.status >= 400 && error.status < 500),
      },
    },
    queryCache: new QueryCache({
      onError: (error, query) => {
        // The session ended: ask who is signed in, and the router leads to the sign-in page.
        if (isApiProblem(error, 401) && query.queryKey[0] !== 'me') void client.invalidateQueries({ queryKey: keys.me() });
      },
    }),
  });
  return client;
}
