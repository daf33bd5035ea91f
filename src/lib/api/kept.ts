import { queryOptions, useMutation, useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import type { AnswerOf, BodyInputOf, Endpoint } from '../../../shared/api/endpoint.ts';
import { call, type CallParts, type Route } from './call.ts';
import { keys, type KeptNoun } from './keys.ts';

interface KeptRoutes<Read extends Endpoint, Create extends Endpoint, Update extends Endpoint> {
  list: Route<Endpoint>;
  read: Route<Read>;
  create: Route<Create>;
  update: Route<Update>;
  archive: Route<Endpoint>;
}

export type Archived = 'no' | 'yes' | 'all';

/** A body to save, and the version of the copy it was made from; undefined for a new thing. */
export interface Change<Body> {
  body: Body;
  version: number | undefined;
}

/** Parts whose type the generic routes cannot tell; the pairs of route and parts below are right by construction. */
const parts = <E extends Endpoint>(given: { params: Record<string, string>; query?: Record<string, string>; body?: unknown; signal?: AbortSignal }) => given as unknown as CallParts<E>;

/**
 * Queries and mutations of a thing that a farm keeps (blocks, places, sprayers, products, plans).
 * Every change may change a verdict, so it forgets the farm's mornings too.
 */
export function keptApi<Read extends Endpoint, Create extends Endpoint, Update extends Endpoint>(noun: KeptNoun, routes: KeptRoutes<Read, Create, Update>) {
  type Item = AnswerOf<Read>;

  const listQuery = (farmId: string, archived: Archived = 'no') =>
    queryOptions({
      queryKey: [...keys.kept(farmId, noun), 'list', archived],
      queryFn: async ({ signal }) => ((await call(routes.list, parts({ params: { farmId }, query: { archived }, signal }))) as { items: Item[] }).items,
    });

  const oneQuery = (farmId: string, id: string) =>
    queryOptions({
      queryKey: [...keys.kept(farmId, noun), 'one', id],
      queryFn: async ({ signal }): Promise<Item> => call(routes.read, parts<Read>({ params: { farmId, id }, signal })),
    });

  /** The list, for a part of a page that waits for it. */
  const useList = (farmId: string, archived: Archived = 'no'): Item[] => useSuspenseQuery(listQuery(farmId, archived)).data;

  /** One of them, for a page that waits for it. */
  const useOne = (farmId: string, id: string): Item => useSuspenseQuery(oneQuery(farmId, id)).data;

  function useForget(farmId: string) {
    const client = useQueryClient();
    return () => Promise.all([client.invalidateQueries({ queryKey: keys.kept(farmId, noun) }), client.invalidateQueries({ queryKey: keys.mornings(farmId) })]);
  }

  /** Creates when `id` is null, else changes. */
  function useSave(farmId: string, id: string | null) {
    const forget = useForget(farmId);
    return useMutation({
      mutationFn: async ({ body, version }: Change<BodyInputOf<Create>>): Promise<Item> =>
        id === null ? ((await call(routes.create, parts<Create>({ params: { farmId }, body }))) as Item) : ((await call(routes.update, parts<Update>({ params: { farmId, id }, body: { ...(body as object), version } }))) as Item),
      onSuccess: forget,
    });
  }

  function useArchive(farmId: string) {
    const forget = useForget(farmId);
    return useMutation({
      mutationFn: ({ id, archived }: { id: string; archived: boolean }) => call(routes.archive, parts({ params: { farmId, id }, body: { archived } })),
      onSuccess: forget,
    });
  }

  return { listQuery, useList, useOne, useSave, useArchive };
}
