import { queryOptions, useQuery } from '@tanstack/react-query';
import { meQuery } from '@/hooks/account/use-me';
import { call } from '@/hooks/client/api-client';
import { useEndpointMutation } from '@/hooks/client/use-endpoint-mutation';
import { deskEndpoints } from '@/shared/desk/desk-endpoints';

export const deskQuery = () =>
  queryOptions({
    queryKey: ['desk'],
    queryFn: ({ signal }) => call(deskEndpoints.readDesk, { signal }),
    staleTime: 60_000,
  });

export const useDesk = () => useQuery(deskQuery());

export const useEditDeskSettings = () =>
  useEndpointMutation(deskEndpoints.editDeskSettings, async (client, desk) => {
    client.setQueryData(deskQuery().queryKey, desk);
    await client.invalidateQueries({ queryKey: meQuery().queryKey });
  });
