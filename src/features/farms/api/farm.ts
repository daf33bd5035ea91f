import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyInputOf } from '../../../../shared/api/endpoint.ts';
import type { farmEndpoints } from '../../../../shared/api/farms.ts';
import { call } from '../../../lib/api/call.ts';
import type { Change } from '../../../lib/api/kept.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

export const farmQuery = (farmId: string) => queryOptions({ queryKey: keys.facts(farmId), queryFn: ({ signal }) => call(routes.farm.read, { params: { farmId }, signal }) });

/** Who belongs to which farm, and its name, is part of who one is: forget that with the farm. */
function useForget() {
  const client = useQueryClient();
  return (farmId: string) => Promise.all([client.invalidateQueries({ queryKey: keys.me() }), client.invalidateQueries({ queryKey: keys.farm(farmId) })]);
}

export function useCreateFarm() {
  const forget = useForget();
  return useMutation({ mutationFn: (body: BodyInputOf<typeof farmEndpoints.createFarm>) => call(routes.farm.create, { body }), onSuccess: (farm) => forget(farm.id) });
}

export function useUpdateFarm(farmId: string) {
  const forget = useForget();
  return useMutation({
    mutationFn: ({ body, version }: Change<BodyInputOf<typeof farmEndpoints.createFarm>>) => call(routes.farm.update, { params: { farmId }, body: { ...body, version } }),
    onSuccess: () => forget(farmId),
  });
}

export function useArchiveFarm(farmId: string) {
  const forget = useForget();
  return useMutation({ mutationFn: (archived: boolean) => call(routes.farm.archive, { params: { farmId }, body: { archived } }), onSuccess: () => forget(farmId) });
}
