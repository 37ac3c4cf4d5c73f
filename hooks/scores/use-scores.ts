import { queryOptions, useQuery } from '@tanstack/react-query';
import { call } from '@/hooks/client/api-client';
import { scoreEndpoints } from '@/shared/scores/score-endpoints';

const scoresQuery = () =>
  queryOptions({
    queryKey: ['scores'],
    queryFn: ({ signal }) => call(scoreEndpoints.readScores, { signal }),
    staleTime: 30_000,
  });

export const useScores = () => useQuery(scoresQuery());
