import { DomainError } from '@/journal/errors/domain-error';
import { type SeededRandom, seededRandom } from '@/journal/random/seeded-random';
import { quantile } from '@/journal/returns/quantile';
import { requireConfidence } from '@/journal/scoring/hit-count';
import { isotonicRegression } from '@/journal/scoring/isotonic-regression';
import { type ForecastGroup, groupByForecast } from '@/journal/scoring/murphy-decomposition';

export interface ReliabilityBandPoint {
  readonly probability: number;
  /** Between these the calibrated curve lies so often when the forecasts are right. */
  readonly low: number;
  readonly high: number;
}

const fewestResamples = 100;
const mostResamples = 1000;
/** Draws in all: keeps 100,000 forecasts within a fraction of a second. */
const drawBudget = 400_000;
/** More distinct forecasts are gathered to thousandths. */
const MOST_GROUPS = 1000;
/** Of a count, from which the normal law stands for the binomial one. */
const WIDE_VARIANCE = 25;
/** More points than a chart shows apart. */
const mostPoints = 200;

/**
 * Where the isotonic reliability curve would lie by chance if each forecast were right: point by point, by drawing the outcomes from
 * the forecasts themselves and fitting the curve anew.
 * @param forecasts probabilities 0 to 1, at least one; events taken as independent.
 * @param seed whole number; the same seed gives the same band.
 * @param level central share, above 0 and below 1.
 * @returns one point a distinct forecast, rising, or 200 spread evenly over them when they are more; and how many resamples were
 *   drawn (100 to 1,000, fewer for many forecasts).
 * @throws {DomainError} `confidence-invalid`, and as scoredForecasts.
 * @see Dimitriadis, Gneiting and Jordan (2021), supporting information section S2; Bröcker and Smith (2007), Weather and Forecasting
 *   22(3), 651-661.
 */
export function reliabilityBand(
  forecasts: readonly number[],
  { seed, level = 0.9 }: { seed: number; level?: number },
): { points: ReliabilityBandPoint[]; resamples: number } {
  requireConfidence(level);
  if (forecasts.length === 0) throw new DomainError('forecasts-missing');
  const distinct = groupByForecast(
    forecasts,
    forecasts.map(() => false),
  );
  const groups = distinct.length <= MOST_GROUPS ? distinct : gathered(distinct);
  const resamples = Math.min(mostResamples, Math.max(fewestResamples, Math.floor(drawBudget / forecasts.length)));
  const random = seededRandom(seed);
  const shown = evenlyOver(groups.length, mostPoints);
  const fits = shown.map(() => new Array<number>());
  for (let resample = 0; resample < resamples; resample += 1) {
    const drawn = groups.map(({ forecast, weight }) => ({
      value: eventsDrawn(random, weight, forecast) / weight,
      weight,
    }));
    const fitted = isotonicRegression(drawn);
    for (const [point, group] of shown.entries()) fits[point]?.push(fitted[group] ?? 0);
  }
  const points = shown.map((group, point) => ({
    probability: groups[group]?.forecast ?? 0,
    low: quantile(fits[point] ?? [], (1 - level) / 2),
    high: quantile(fits[point] ?? [], (1 + level) / 2),
  }));
  return { points, resamples };
}

/** Forecasts put to the nearest thousandth: what a chart shows stays the same, and the fit of the curve costs little. */
function gathered(groups: readonly ForecastGroup[]): ForecastGroup[] {
  const weights = new Map<number, number>();
  for (const { forecast, weight } of groups) {
    const place = Math.round(forecast * MOST_GROUPS);
    weights.set(place, (weights.get(place) ?? 0) + weight);
  }
  return [...weights]
    .sort(([one], [other]) => one - other)
    .map(([place, weight]) => ({ forecast: place / MOST_GROUPS, weight, observed: 0 }));
}

/** How many of so many events of one probability happen; by the normal law where their spread is wide. */
function eventsDrawn(random: SeededRandom, count: number, probability: number): number {
  const variance = count * probability * (1 - probability);
  if (variance > WIDE_VARIANCE) {
    const drawn = Math.round(count * probability + Math.sqrt(variance) * random.normal());
    return Math.min(count, Math.max(0, drawn));
  }
  let events = 0;
  for (let index = 0; index < count; index += 1) if (random.uniform() < probability) events += 1;
  return events;
}

/** At most `most` of the numbers 0 to count - 1, the first and the last among them. */
function evenlyOver(count: number, most: number): number[] {
  if (count <= most) return Array.from({ length: count }, (_, index) => index);
  return Array.from({ length: most }, (_, index) => Math.round((index * (count - 1)) / (most - 1)));
}
