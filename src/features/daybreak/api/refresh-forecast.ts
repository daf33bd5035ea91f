import { useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

/** Fetches the newest forecast and assesses anew. */
export function useRefreshForecast(farmId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call(routes.mornings.refresh, { params: { farmId } }),
    onSuccess: async (daybreak) => {
      client.setQueryData(keys.daybreak(farmId), daybreak);
      await client.invalidateQueries({ queryKey: keys.mornings(farmId) });
    },
  });
}
