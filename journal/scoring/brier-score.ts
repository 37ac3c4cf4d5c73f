import { DomainError } from '@/journal/errors/domain-error';
import { type Outcome, scoredForecast, scoredForecasts } from '@/journal/scoring/outcome';

/**
 * Squared error of one probability: 0 is best, 1 is worst, 0.25 is what saying 50 % always scores.
 * @param forecast probability of the event, 0 to 1.
 * @throws {DomainError} `probability-invalid`, `outcome-invalid`.
 * @see Brier (1950), Monthly Weather Review 78(1), 1-3; the one-sided form for two classes, half of Brier's own sum.
 */
export function brierScore(forecast: number, outcome: Outcome): number {
  const pair = scoredForecast(forecast, outcome);
  return (pair.forecast - pair.outcome) ** 2;
}

/**
 * Mean of the Brier scores, 0 to 1.
 * @throws {DomainError} as scoredForecasts.
 */
export function meanBrierScore(forecasts: readonly number[], outcomes: readonly Outcome[]): number {
  const pairs = scoredForecasts(forecasts, outcomes);
  return pairs.reduce((sum, { forecast, outcome }) => sum + (forecast - outcome) ** 2, 0) / pairs.length;
}

/**
 * Share of the reference's score that the forecasts save: 1 is perfect, 0 no better, negative worse.
 * @param score mean score of the forecasts, 0 or more.
 * @param referenceScore mean score on the same events of what they are compared with (the base rate, market-implied odds), 0 or more.
 * @returns null when the reference is perfect, so that nothing is left to save.
 * @throws {DomainError} `score-invalid`.
 */
export function brierSkill({ score, referenceScore }: { score: number; referenceScore: number }): number | null {
  const isValid = score >= 0 && score < Infinity && referenceScore >= 0 && referenceScore < Infinity;
  if (!isValid) throw new DomainError('score-invalid', { score, referenceScore });
  return referenceScore === 0 ? null : 1 - score / referenceScore;
}
