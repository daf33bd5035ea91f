import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

/** The coming mornings; asked anew every minute, because the answer is only as good as its age. */
export const daybreakQuery = (farmId: string) =>
  queryOptions({ queryKey: keys.daybreak(farmId), queryFn: ({ signal }) => call(routes.mornings.daybreak, { params: { farmId }, signal }), refetchInterval: 60_000 });
