import { isotonicRegression } from '@/journal/scoring/isotonic-regression';
import { groupByForecast } from '@/journal/scoring/murphy-decomposition';
import { type Outcome } from '@/journal/scoring/outcome';

/**
 * What each forecast should have been, seen from the outcomes: the frequency of the event, fitted so that it never falls as the
 * forecast rises.
 * @param forecasts probabilities 0 to 1, at least one. @param outcomes as many.
 * @returns one probability for each forecast, in their order.
 * @throws {DomainError} as scoredForecasts.
 * @see Dimitriadis, Gneiting and Jordan (2021), Proceedings of the National Academy of Sciences 118(8) (CORP).
 */
export function calibratedForecasts(forecasts: readonly number[], outcomes: readonly Outcome[]): number[] {
  const groups = groupByForecast(forecasts, outcomes);
  const fitted = isotonicRegression(groups.map(({ observed, weight }) => ({ value: observed, weight })));
  const byForecast = new Map(groups.map(({ forecast }, index) => [forecast, fitted[index] ?? forecast]));
  return forecasts.map((forecast) => byForecast.get(forecast) ?? forecast);
}
