import { useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

export function useReplayDelivery(farmId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => call(routes.notices.replay, { params: { farmId, id } }),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.notices(farmId) }),
  });
}
