import { queryOptions, useQuery, type QueryClient } from '@tanstack/react-query';
import { call } from '@/hooks/client/api-client';
import { useEndpointMutation } from '@/hooks/client/use-endpoint-mutation';
import { underlyingEndpoints } from '@/shared/underlyings/underlying-endpoints';

const underlyingsKey = ['underlyings'] as const;

export const underlyingsQuery = () =>
  queryOptions({
    queryKey: [...underlyingsKey, 'list'],
    queryFn: async ({ signal }) => (await call(underlyingEndpoints.listUnderlyings, { signal })).underlyings,
    staleTime: 60_000,
  });

/** One underlying with its newest 520 bars, two years of sessions. */
export const underlyingQuery = (underlyingId: string) =>
  queryOptions({
    queryKey: [...underlyingsKey, 'detail', underlyingId],
    queryFn: ({ signal }) => call(underlyingEndpoints.readUnderlying, { params: { underlyingId }, query: {}, signal }),
    staleTime: 60_000,
  });

export const useUnderlyings = () => useQuery(underlyingsQuery());
export const useUnderlying = (underlyingId: string) => useQuery(underlyingQuery(underlyingId));

/** Bars feed volatilities, outcomes and scores, so all of these are read anew. */
export async function afterBarsChanged(client: QueryClient): Promise<void> {
  await Promise.all(
    [underlyingsKey, ['entries'], ['today'], ['scores']].map((queryKey) => client.invalidateQueries({ queryKey })),
  );
}

export const useCreateUnderlying = () =>
  useEndpointMutation(underlyingEndpoints.createUnderlying, (client) =>
    client.invalidateQueries({ queryKey: underlyingsKey }),
  );
export const useEditUnderlying = () =>
  useEndpointMutation(underlyingEndpoints.editUnderlying, (client) =>
    client.invalidateQueries({ queryKey: underlyingsKey }),
  );
export const usePutBar = () => useEndpointMutation(underlyingEndpoints.putBar, afterBarsChanged);
