import { queryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

/** Measurements made on the farm, newest first. */
export const readingsQuery = (farmId: string) =>
  queryOptions({ queryKey: keys.readings(farmId), queryFn: async ({ signal }) => (await call(routes.mornings.listReadings, { params: { farmId }, signal })).items });
