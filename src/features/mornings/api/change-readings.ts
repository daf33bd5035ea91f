import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyInputOf } from '../../../../shared/api/endpoint.ts';
import type { morningEndpoints } from '../../../../shared/api/mornings.ts';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

/** A measurement changes the verdicts too. */
function useForget(farmId: string) {
  const client = useQueryClient();
  return () => Promise.all([client.invalidateQueries({ queryKey: keys.readings(farmId) }), client.invalidateQueries({ queryKey: keys.mornings(farmId) })]);
}

export function useAddReading(farmId: string) {
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof morningEndpoints.createReading>) => call(routes.mornings.createReading, { params: { farmId }, body }),
    onSuccess: useForget(farmId),
  });
}

export function useTakeBackReading(farmId: string) {
  return useMutation({ mutationFn: (id: string) => call(routes.mornings.deleteReading, { params: { farmId, id } }), onSuccess: useForget(farmId) });
}
