import { queryOptions } from '@tanstack/react-query';
import type { Me } from '../../../shared/api/accounts.ts';
import { call } from '../api/call.ts';
import { keys } from '../api/keys.ts';
import { isApiProblem } from '../api/problem.ts';
import { routes } from '../api/routes.ts';

/** Who is signed in; null when nobody is. */
async function getMe(signal: AbortSignal): Promise<Me | null> {
  try {
    return await call(routes.account.me, { signal });
  } catch (error) {
    if (isApiProblem(error, 401)) return null;
    throw error;
  }
}

export const meQuery = queryOptions({ queryKey: keys.me(), queryFn: ({ signal }) => getMe(signal), staleTime: 60_000 });
