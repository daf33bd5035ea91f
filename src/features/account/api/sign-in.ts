import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Me } from '../../../../shared/api/accounts.ts';
import type { BodyInputOf } from '../../../../shared/api/endpoint.ts';
import type { accountEndpoints } from '../../../../shared/api/accounts.ts';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

export function useSignIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyInputOf<typeof accountEndpoints.signIn>) => call(routes.account.signIn, { body }),
    onSuccess: (me: Me) => {
      // What another person saw in this browser is none of theirs.
      client.removeQueries({ queryKey: ['farms'] });
      client.setQueryData(keys.me(), me);
    },
  });
}

export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(routes.account.signOut, {}),
    onSuccess: () => {
      client.removeQueries({ queryKey: ['farms'] });
      client.setQueryData(keys.me(), null);
    },
  });
}
