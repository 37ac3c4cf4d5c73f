import { DomainError } from '@/journal/errors/domain-error';
import { seededRandom } from '@/journal/random/seeded-random';
import { quantile } from '@/journal/returns/quantile';
import { requireConfidence } from '@/journal/scoring/hit-count';
import { isotonicRegression } from '@/journal/scoring/isotonic-regression';
import { groupByForecast } from '@/journal/scoring/murphy-decomposition';

export interface ReliabilityBandPoint {
  readonly probability: number;
  /** Between these the calibrated curve lies so often when the forecasts are right. */
  readonly low: number;
  readonly high: number;
}

const fewestResamples = 100;
const mostResamples = 1000;
/** Draws in all: keeps 100,000 forecasts within a fraction of a second. */
const drawBudget = 2_000_000;
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
  const groups = groupByForecast(
    forecasts,
    forecasts.map(() => false),
  );
  const resamples = Math.min(mostResamples, Math.max(fewestResamples, Math.floor(drawBudget / forecasts.length)));
  const random = seededRandom(seed);
  const shown = evenlyOver(groups.length, mostPoints);
  const fits = shown.map(() => new Array<number>());
  for (let resample = 0; resample < resamples; resample += 1) {
    const drawn = groups.map(({ forecast, weight }) => {
      let events = 0;
      for (let index = 0; index < weight; index += 1) if (random.uniform() < forecast) events += 1;
      return { value: events / weight, weight };
    });
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

/** At most `most` of the numbers 0 to count - 1, the first and the last among them. */
function evenlyOver(count: number, most: number): number[] {
  if (count <= most) return Array.from({ length: count }, (_, index) => index);
  return Array.from({ length: most }, (_, index) => Math.round((index * (count - 1)) / (most - 1)));
}
