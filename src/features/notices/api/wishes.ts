import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { Wishes } from '../../../../shared/api/notices.ts';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

/** Which notices reach me, and how. */
export const wishesQuery = (farmId: string) => queryOptions({ queryKey: keys.wishes(farmId), queryFn: ({ signal }) => call(routes.notices.readWishes, { params: { farmId }, signal }) });

export function useUpdateWishes(farmId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: Wishes) => call(routes.notices.updateWishes, { params: { farmId }, body }),
    onSuccess: (wishes) => client.setQueryData(keys.wishes(farmId), wishes),
  });
}
