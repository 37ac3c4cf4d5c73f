import { queryOptions, useQuery } from '@tanstack/react-query';
import { call } from '@/hooks/client/api-client';
import { todayEndpoints } from '@/shared/today/today-endpoints';

const todayQuery = () =>
  queryOptions({
    queryKey: ['today'],
    queryFn: ({ signal }) => call(todayEndpoints.readToday, { signal }),
    staleTime: 30_000,
  });

export const useToday = () => useQuery(todayQuery());
