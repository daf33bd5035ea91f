import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { demoEndpoints } from '../../../../shared/api/system.ts';
import type { BodyInputOf } from '../../../../shared/api/endpoint.ts';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

/** What arrives is looked for often: a visitor waits for it. */
const oftenMs = 2_000;

export const demoClockQuery = queryOptions({ queryKey: keys.demo('clock'), queryFn: ({ signal }) => call(routes.demo.readClock, { signal }), refetchInterval: 10_000 });
export const demoPhoneQuery = queryOptions({ queryKey: keys.demo('phone'), queryFn: async ({ signal }) => (await call(routes.demo.phone, { signal })).items, refetchInterval: oftenMs });
export const demoMailboxQuery = queryOptions({ queryKey: keys.demo('mailbox'), queryFn: async ({ signal }) => (await call(routes.demo.mailbox, { signal })).items, refetchInterval: oftenMs });
export const demoHooksQuery = queryOptions({ queryKey: keys.demo('hooks'), queryFn: async ({ signal }) => (await call(routes.demo.hookLog, { signal })).items, refetchInterval: oftenMs });

/** Steps the clock; the whole world is then another. */
export function useSetDemoClock() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (now: string) => call(routes.demo.setClock, { body: { now } }),
    onSuccess: async (clock) => {
      client.setQueryData(keys.demo('clock'), clock);
      await client.invalidateQueries();
    },
  });
}

export function useSetDemoMood() {
  const client = useQueryClient();
  return useMutation({ mutationFn: (body: BodyInputOf<typeof demoEndpoints.mood>) => call(routes.demo.mood, { body }), onSuccess: () => client.invalidateQueries({ queryKey: ['farms'] }) });
}
