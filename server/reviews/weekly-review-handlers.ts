import { type HandlersOf } from '@/server/http/handler';
import { type WeeklyReviewService } from '@/server/reviews/weekly-review-service';
import { type weeklyReviewEndpoints } from '@/shared/reviews/weekly-review-endpoints';

export function weeklyReviewHandlers(reviews: WeeklyReviewService): HandlersOf<typeof weeklyReviewEndpoints> {
  return {
    readWeek: ({ scope, query }) => reviews.read(scope, query),
    createWeeklyReview: ({ scope, body }) => reviews.create(scope, body),
    editWeeklyReview: ({ scope, params, body, version }) =>
      reviews.edit(scope, { id: params.reviewId, version, written: body }),
  };
}
