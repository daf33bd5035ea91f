import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyInputOf } from '../../../../shared/api/endpoint.ts';
import type { noticeEndpoints } from '../../../../shared/api/notices.ts';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

/** My phones and browsers that get a push. */
export const devicesQuery = (farmId: string) =>
  queryOptions({ queryKey: keys.devices(farmId), queryFn: async ({ signal }) => (await call(routes.notices.listDevices, { params: { farmId }, signal })).items });

/** The server's VAPID public key; it stays the same for as long as the database. */
export const pushKeyQuery = queryOptions({ queryKey: keys.pushKey(), queryFn: async ({ signal }) => (await call(routes.notices.pushKey, { signal })).publicKey, staleTime: Infinity });

export type DeviceBody = BodyInputOf<typeof noticeEndpoints.createDevice>;

function useForget(farmId: string) {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: keys.devices(farmId) });
}

export function useAddDevice(farmId: string) {
  return useMutation({ mutationFn: (body: DeviceBody) => call(routes.notices.createDevice, { params: { farmId }, body }), onSuccess: useForget(farmId) });
}

export function useRemoveDevice(farmId: string) {
  return useMutation({ mutationFn: (id: string) => call(routes.notices.deleteDevice, { params: { farmId, id } }), onSuccess: useForget(farmId) });
}

export function useTestDevice(farmId: string) {
  return useMutation({ mutationFn: (id: string) => call(routes.notices.testDevice, { params: { farmId, id } }) });
}
