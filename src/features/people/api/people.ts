import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { Role } from '../../../../shared/rules/authorization.ts';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

/** Members of the farm, and invitations still open. */
export const peopleQuery = (farmId: string) => queryOptions({ queryKey: keys.people(farmId), queryFn: ({ signal }) => call(routes.people.list, { params: { farmId }, signal }) });

/** What changed people, keys and limits, newest first. */
export const auditQuery = (farmId: string) =>
  queryOptions({ queryKey: keys.audit(farmId), queryFn: async ({ signal }) => (await call(routes.people.audit, { params: { farmId }, signal })).items });

/** One's own role may have changed too. */
function useForget(farmId: string) {
  const client = useQueryClient();
  return () => Promise.all([keys.people(farmId), keys.audit(farmId), keys.me()].map((queryKey) => client.invalidateQueries({ queryKey })));
}

export function useInvite(farmId: string) {
  return useMutation({ mutationFn: (body: { email: string; role: Role }) => call(routes.people.invite, { params: { farmId }, body }), onSuccess: useForget(farmId) });
}

export function useRevokeInvitation(farmId: string) {
  return useMutation({ mutationFn: (id: string) => call(routes.people.revoke, { params: { farmId, id } }), onSuccess: useForget(farmId) });
}

export function useChangeRole(farmId: string) {
  return useMutation({ mutationFn: ({ id, role }: { id: string; role: Role }) => call(routes.people.changeRole, { params: { farmId, id }, body: { role } }), onSuccess: useForget(farmId) });
}

export function useRemovePerson(farmId: string) {
  return useMutation({ mutationFn: (id: string) => call(routes.people.remove, { params: { farmId, id } }), onSuccess: useForget(farmId) });
}
