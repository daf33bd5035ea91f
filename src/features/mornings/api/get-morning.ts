import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

export const morningQuery = (farmId: string, date: string) =>
  queryOptions({ queryKey: keys.morning(farmId, date), queryFn: ({ signal }) => call(routes.mornings.read, { params: { farmId, date }, signal }), refetchInterval: 60_000 });
