import { DomainError } from '@/journal/errors/domain-error';
import { type Outcome, scoredForecasts } from '@/journal/scoring/outcome';

/** All forecasts of one value. */
export interface ForecastGroup {
  /** The probability that was said, 0 to 1. */
  readonly forecast: number;
  /** Number of forecasts, or their share of all; above 0. */
  readonly weight: number;
  /** How often the event then happened, 0 to 1. */
  readonly observed: number;
}

export interface MurphyDecomposition {
  readonly brierScore: number;
  /** Distance of what was said from how often it happened; 0 is best. */
  readonly reliability: number;
  /** How far the groups' frequencies lie from the base rate; more is better. */
  readonly resolution: number;
  /** Base rate x (1 - base rate): the score of saying the base rate always. */
  readonly uncertainty: number;
  readonly baseRate: number;
  /** By rising forecast. */
  readonly groups: readonly ForecastGroup[];
}

/**
 * Splits the mean Brier score exactly: score = reliability - resolution + uncertainty, grouping by each distinct forecast.
 * @throws {DomainError} as scoredForecasts.
 * @see Murphy (1973), J. Applied Meteorology 12(4), 595-600.
 */
export function murphyDecomposition(forecasts: readonly number[], outcomes: readonly Outcome[]): MurphyDecomposition {
  return murphyFromGroups(groupByForecast(forecasts, outcomes));
}

/**
 * The same from a table of forecast values.
 * @param groups at least one, each forecast value once.
 * @throws {DomainError} `forecasts-missing`, `group-invalid` with the index.
 */
export function murphyFromGroups(groups: readonly ForecastGroup[]): MurphyDecomposition {
  if (groups.length === 0) throw new DomainError('forecasts-missing');
  for (const [index, { forecast, weight, observed }] of groups.entries()) {
    const isValid = forecast >= 0 && forecast <= 1 && observed >= 0 && observed <= 1 && weight > 0 && weight < Infinity;
    if (!isValid) throw new DomainError('group-invalid', { index, forecast, weight, observed });
  }
  const total = groups.reduce((sum, { weight }) => sum + weight, 0);
  const mean = (of: (group: ForecastGroup) => number) =>
    groups.reduce((sum, group) => sum + group.weight * of(group), 0) / total;
  const baseRate = mean(({ observed }) => observed);
  return {
    brierScore: mean(({ forecast, observed }) => observed * (forecast - 1) ** 2 + (1 - observed) * forecast ** 2),
    reliability: mean(({ forecast, observed }) => (forecast - observed) ** 2),
    resolution: mean(({ observed }) => (observed - baseRate) ** 2),
    uncertainty: baseRate * (1 - baseRate),
    baseRate,
    groups: [...groups].sort((one, other) => one.forecast - other.forecast),
  };
}

/**
 * Counts the forecasts of each distinct value and how often their event happened.
 * @returns groups by rising forecast; weight is the count.
 * @throws {DomainError} as scoredForecasts.
 */
export function groupByForecast(forecasts: readonly number[], outcomes: readonly Outcome[]): ForecastGroup[] {
  const counts = new Map<number, { count: number; events: number }>();
  for (const { forecast, outcome } of scoredForecasts(forecasts, outcomes)) {
    const { count, events } = counts.get(forecast) ?? { count: 0, events: 0 };
    counts.set(forecast, { count: count + 1, events: events + outcome });
  }
  return [...counts]
    .sort(([one], [other]) => one - other)
    .map(([forecast, { count, events }]) => ({ forecast, weight: count, observed: events / count }));
}
