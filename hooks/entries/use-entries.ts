import {
  infiniteQueryOptions,
  queryOptions,
  useInfiniteQuery,
  useQuery,
  useQueryClient,
  type QueryClient,
} from '@tanstack/react-query';
import { useCallback } from 'react';
import { call } from '@/hooks/client/api-client';
import { useEndpointMutation } from '@/hooks/client/use-endpoint-mutation';
import { type Entry, type EntryState } from '@/shared/entries/entry';
import { entryEndpoints } from '@/shared/entries/entry-endpoints';

const entriesKey = ['entries'] as const;

export interface EntryFilter {
  readonly state?: EntryState;
  readonly underlyingId?: string;
  readonly tag?: string;
  readonly search?: string;
}

export const entriesQuery = (filter: EntryFilter) =>
  infiniteQueryOptions({
    queryKey: [...entriesKey, 'list', filter],
    queryFn: ({ signal, pageParam }) =>
      call(entryEndpoints.listEntries, { query: { ...filter, after: pageParam ?? undefined }, signal }),
    initialPageParam: null as string | null, // the first page has no cursor
    getNextPageParam: (page) => page.next,
    staleTime: 30_000,
  });

export const entryQuery = (entryId: string) =>
  queryOptions({
    queryKey: [...entriesKey, 'detail', entryId],
    queryFn: ({ signal }) => call(entryEndpoints.readEntry, { params: { entryId }, signal }),
    staleTime: 30_000,
  });

export const useEntries = (filter: EntryFilter) => useInfiniteQuery(entriesQuery(filter));
export const useEntry = (entryId: string) => useQuery(entryQuery(entryId));

/** The answer is the entry as it now stands; lists and figures made from it are read anew. */
async function afterEntryChanged(client: QueryClient, entry: Entry): Promise<void> {
  client.setQueryData(entryQuery(entry.row.id).queryKey, entry);
  await refreshLists(client);
}

async function refreshLists(client: QueryClient): Promise<void> {
  const keys = [[...entriesKey, 'list'], ['today'], ['scores']];
  await Promise.all(keys.map((queryKey) => client.invalidateQueries({ queryKey })));
}

export const useCreateEntry = () => useEndpointMutation(entryEndpoints.createEntry, afterEntryChanged);
export const useDiscardDraft = () =>
  useEndpointMutation(entryEndpoints.discardDraft, async (client, _, { params }) => {
    if (params !== undefined) client.removeQueries({ queryKey: entryQuery(params.entryId).queryKey });
    await refreshLists(client);
  });
export const useSealEntry = () => useEndpointMutation(entryEndpoints.sealEntry, afterEntryChanged);
export const useAbandonEntry = () => useEndpointMutation(entryEndpoints.abandonEntry, afterEntryChanged);
export const useAddFill = () => useEndpointMutation(entryEndpoints.addFill, afterEntryChanged);
export const useRemoveFill = () => useEndpointMutation(entryEndpoints.removeFill, afterEntryChanged);
export const useSaveLesson = () => useEndpointMutation(entryEndpoints.saveLesson, afterEntryChanged);

/** Puts an entry saved outside a mutation where the queries find it; lists wait until they are looked at. */
export function useKeepEntry(): (entry: Entry) => void {
  const client = useQueryClient();
  return useCallback(
    (entry) => {
      client.setQueryData(entryQuery(entry.row.id).queryKey, entry);
      void client.invalidateQueries({ queryKey: [...entriesKey, 'list'], refetchType: 'none' });
    },
    [client],
  );
}
