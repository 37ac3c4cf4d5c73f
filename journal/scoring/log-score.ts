import { type Outcome, scoredForecast, scoredForecasts } from '@/journal/scoring/outcome';

/**
 * The least probability a clipped log score reckons with: one in 10,000, a score of 9.21. Model odds below it say more about the
 * model's tail than about the event, and a single one of exactly 0 would make every mean infinite.
 */
export const logScoreFloor = 0.0001;

/**
 * Surprise at what happened: minus the natural logarithm of the probability given to it. 0 is best.
 * @param forecast probability of the event, 0 to 1.
 * @returns 0 or more; Infinity when what happened had been given probability 0.
 * @throws {DomainError} `probability-invalid`, `outcome-invalid`.
 * @see Good (1952), J. Royal Statistical Society B 14(1), 107-114.
 */
export function logScore(forecast: number, outcome: Outcome): number {
  return scoreOf(scoredForecast(forecast, outcome));
}

/**
 * The log score with probabilities under the floor raised to it, and whether that was done.
 * @returns score from 0 to -ln(logScoreFloor).
 * @throws {DomainError} `probability-invalid`, `outcome-invalid`.
 */
export function clippedLogScore(forecast: number, outcome: Outcome): { score: number; isClipped: boolean } {
  const score = logScore(forecast, outcome);
  const worst = -Math.log(logScoreFloor);
  return { score: Math.min(score, worst), isClipped: score > worst };
}

/**
 * Mean of the log scores without clipping.
 * @returns 0 or more, Infinity when anything happened that had been given probability 0.
 * @throws {DomainError} as scoredForecasts.
 */
export function meanLogScore(forecasts: readonly number[], outcomes: readonly Outcome[]): number {
  const pairs = scoredForecasts(forecasts, outcomes);
  return pairs.reduce((sum, pair) => sum + scoreOf(pair), 0) / pairs.length;
}

/**
 * Mean of the clipped log scores, and how many were clipped: to be shown together.
 * @throws {DomainError} as scoredForecasts.
 */
export function meanClippedLogScore(
  forecasts: readonly number[],
  outcomes: readonly Outcome[],
): { score: number; clippedCount: number } {
  const scores = scoredForecasts(forecasts, outcomes).map(({ forecast, outcome }) =>
    clippedLogScore(forecast, outcome),
  );
  return {
    score: scores.reduce((sum, { score }) => sum + score, 0) / scores.length,
    clippedCount: scores.filter(({ isClipped }) => isClipped).length,
  };
}

function scoreOf({ forecast, outcome }: { forecast: number; outcome: 0 | 1 }): number {
  // log1p keeps the digits of a small forecast that came out right; the sum makes -0 a plain 0.
  return 0 - (outcome === 1 ? Math.log(forecast) : Math.log1p(-forecast));
}
