import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { accountEndpoints } from '../../../../shared/api/accounts.ts';
import type { BodyInputOf } from '../../../../shared/api/endpoint.ts';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

type Account = typeof accountEndpoints;

export const useSignUp = () => useMutation({ mutationFn: (body: BodyInputOf<Account['signUp']>) => call(routes.account.signUp, { body }) });
export const useConfirmEmail = () => useMutation({ mutationFn: (token: string) => call(routes.account.confirmEmail, { body: { token } }) });
export const useRequestReset = () => useMutation({ mutationFn: (body: { email: string }) => call(routes.account.requestReset, { body }) });
export const useResetPassword = () => useMutation({ mutationFn: (body: BodyInputOf<Account['resetPassword']>) => call(routes.account.resetPassword, { body }) });
export const useChangePassword = () => useMutation({ mutationFn: (body: BodyInputOf<Account['changePassword']>) => call(routes.account.changePassword, { body }) });

export function useUpdateMe() {
  const client = useQueryClient();
  return useMutation({ mutationFn: (body: BodyInputOf<Account['updateMe']>) => call(routes.account.updateMe, { body }), onSuccess: (me) => client.setQueryData(keys.me(), me) });
}

export function useAcceptInvitation() {
  const client = useQueryClient();
  return useMutation({ mutationFn: (token: string) => call(routes.account.acceptInvitation, { body: { token } }), onSuccess: (me) => client.setQueryData(keys.me(), me) });
}
