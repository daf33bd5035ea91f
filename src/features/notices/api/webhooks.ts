import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyInputOf } from '../../../../shared/api/endpoint.ts';
import type { webhookEndpoints } from '../../../../shared/api/notices.ts';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

export const webhooksQuery = (farmId: string) =>
  queryOptions({ queryKey: keys.webhooks(farmId), queryFn: async ({ signal }) => (await call(routes.webhooks.list, { params: { farmId }, signal })).items });

function useForget(farmId: string) {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: keys.webhooks(farmId) });
}

export function useAddWebhook(farmId: string) {
  return useMutation({ mutationFn: (body: BodyInputOf<typeof webhookEndpoints.create>) => call(routes.webhooks.create, { params: { farmId }, body }), onSuccess: useForget(farmId) });
}

export function useChangeWebhook(farmId: string) {
  return useMutation({
    mutationFn: ({ id, ...body }: BodyInputOf<typeof webhookEndpoints.update> & { id: string }) => call(routes.webhooks.update, { params: { farmId, id }, body }),
    onSuccess: useForget(farmId),
  });
}

export function useRemoveWebhook(farmId: string) {
  return useMutation({ mutationFn: (id: string) => call(routes.webhooks.remove, { params: { farmId, id } }), onSuccess: useForget(farmId) });
}

export function useTestWebhook(farmId: string) {
  return useMutation({ mutationFn: (id: string) => call(routes.webhooks.test, { params: { farmId, id } }) });
}
