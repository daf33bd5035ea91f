import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

/** Who may send forecasts or readings to this farm. */
export const inboundSourcesQuery = (farmId: string) =>
  queryOptions({ queryKey: keys.inboundSources(farmId), queryFn: async ({ signal }) => (await call(routes.inboundSources.list, { params: { farmId }, signal })).items });

function useForget(farmId: string) {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: keys.inboundSources(farmId) });
}

export function useAddInboundSource(farmId: string) {
  return useMutation({ mutationFn: (body: { name: string }) => call(routes.inboundSources.create, { params: { farmId }, body }), onSuccess: useForget(farmId) });
}

export function useArchiveInboundSource(farmId: string) {
  return useMutation({ mutationFn: (id: string) => call(routes.inboundSources.archive, { params: { farmId, id } }), onSuccess: useForget(farmId) });
}
