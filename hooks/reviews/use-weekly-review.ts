import { queryOptions, useQuery, type QueryClient } from '@tanstack/react-query';
import { call } from '@/hooks/client/api-client';
import { useEndpointMutation } from '@/hooks/client/use-endpoint-mutation';
import { weeklyReviewEndpoints } from '@/shared/reviews/weekly-review-endpoints';

const reviewsKey = ['weekly-review'] as const;

interface WantedWeek {
  /** Any date of it; the latest unless told. */
  readonly week?: string;
  readonly traderId?: string;
}

const weekQuery = (wanted: WantedWeek) =>
  queryOptions({
    queryKey: [...reviewsKey, wanted],
    queryFn: ({ signal }) => call(weeklyReviewEndpoints.readWeek, { query: wanted, signal }),
    staleTime: 30_000,
  });

export const useWeek = (wanted: WantedWeek) => useQuery(weekQuery(wanted));

/** Weeks after it show the rule too, and Today asks for it no more. */
async function afterReviewWritten(client: QueryClient): Promise<void> {
  await Promise.all([reviewsKey, ['today']].map((queryKey) => client.invalidateQueries({ queryKey })));
}

export const useCreateWeeklyReview = () =>
  useEndpointMutation(weeklyReviewEndpoints.createWeeklyReview, afterReviewWritten);
export const useEditWeeklyReview = () =>
  useEndpointMutation(weeklyReviewEndpoints.editWeeklyReview, afterReviewWritten);
