import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import { call } from '@/hooks/client/api-client';
import { scoreEndpoints } from '@/shared/scores/score-endpoints';
import { type ScoreFilter } from '@/shared/scores/score-filter';

const scoresQuery = (filter: ScoreFilter) =>
  queryOptions({
    queryKey: ['scores', filter],
    queryFn: ({ signal }) => call(scoreEndpoints.readScores, { query: filter, signal }),
    staleTime: 30_000,
    // What was shown stays until the narrowed figures are there.
    placeholderData: keepPreviousData,
  });

export const useScores = (filter: ScoreFilter) => useQuery(scoresQuery(filter));
