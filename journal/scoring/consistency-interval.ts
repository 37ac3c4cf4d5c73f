import { DomainError } from '@/journal/errors/domain-error';
import { eventCountProbabilities, eventCountQuantile } from '@/journal/scoring/event-count-distribution';
import { requireConfidence } from '@/journal/scoring/hit-count';

/**
 * The range of observed frequency that perfectly calibrated forecasts would show by chance: a point of a reliability diagram inside
 * its own range is no evidence against the forecasts.
 * @param forecasts probabilities of one group, each 0 to 1, at least one; events taken as independent.
 * @param level central share of the range, above 0 and below 1; 0.9 gives the 5 % and 95 % points.
 * @returns frequencies, 0 to 1. Exact (the distribution of the count given these forecasts), where the paper resamples.
 * @throws {DomainError} `forecasts-missing`, `probability-invalid`, `confidence-invalid`.
 * @see Bröcker and Smith (2007), Weather and Forecasting 22(3), 651-661.
 */
export function consistencyInterval(forecasts: readonly number[], level = 0.9): { low: number; high: number } {
  if (forecasts.length === 0) throw new DomainError('forecasts-missing');
  requireConfidence(level);
  const distribution = eventCountProbabilities(forecasts);
  return {
    low: eventCountQuantile(distribution, (1 - level) / 2) / forecasts.length,
    high: eventCountQuantile(distribution, (1 + level) / 2) / forecasts.length,
  };
}
