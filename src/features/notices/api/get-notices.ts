import { infiniteQueryOptions } from '@tanstack/react-query';
import { call } from '../../../lib/api/call.ts';
import { keys } from '../../../lib/api/keys.ts';
import { routes } from '../../../lib/api/routes.ts';

const pageSize = 30;

/** Notices with their deliveries, newest first, a page at a time. */
export const noticesQuery = (farmId: string) =>
  infiniteQueryOptions({
    queryKey: keys.notices(farmId),
    queryFn: async ({ signal, pageParam }) =>
      (await call(routes.notices.list, { params: { farmId }, query: pageParam === null ? { limit: pageSize } : { limit: pageSize, before: pageParam }, signal })).items,
    initialPageParam: null as string | null,
    getNextPageParam: (page) => (page.length < pageSize ? null : (page.at(-1)?.createdAt ?? null)),
    refetchInterval: 30_000,
  });
