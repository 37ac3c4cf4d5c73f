import { normalUpperTail } from '@/journal/distributions/normal-distribution';
import { type Outcome, scoredForecasts } from '@/journal/scoring/outcome';

export interface CountAgainstForecast {
  /** Sum of the forecasts. */
  readonly expected: number;
  /** Events that happened. */
  readonly observed: number;
  /** Null when every forecast was 0 or 1. */
  readonly z: number | null;
}

/**
 * Compares how many events happened with how many the forecasts add up to.
 * @throws {DomainError} as scoredForecasts.
 * @see The normal approximation of a sum of independent events; common practice.
 */
export function countAgainstForecast(forecasts: readonly number[], outcomes: readonly Outcome[]): CountAgainstForecast {
  const pairs = scoredForecasts(forecasts, outcomes);
  const expected = pairs.reduce((sum, { forecast }) => sum + forecast, 0);
  const observed = pairs.reduce((sum, { outcome }) => sum + outcome, 0);
  const variance = pairs.reduce((sum, { forecast }) => sum + forecast * (1 - forecast), 0);
  return { expected, observed, z: variance > 0 ? (observed - expected) / Math.sqrt(variance) : null };
}

/**
 * Tests calibration without bins: the Brier score's distance from what calibrated forecasts would score, in standard deviations.
 * @returns z, positive when the score is worse than calibrated forecasts would have, and its two-sided p value; null when the forecasts
 *   allow no such test (each 0, 0.5 or 1).
 * @throws {DomainError} as scoredForecasts.
 * @see Spiegelhalter (1986), Statistics in Medicine 5(5), 421-433.
 */
export function spiegelhalterTest(
  forecasts: readonly number[],
  outcomes: readonly Outcome[],
): { z: number; pValue: number } | null {
  let distance = 0;
  let variance = 0;
  for (const { forecast, outcome } of scoredForecasts(forecasts, outcomes)) {
    distance += (outcome - forecast) * (1 - 2 * forecast);
    variance += (1 - 2 * forecast) ** 2 * forecast * (1 - forecast);
  }
  if (!(variance > 0)) return null;
  const z = distance / Math.sqrt(variance);
  return { z, pValue: 2 * normalUpperTail(Math.abs(z)) };
}
