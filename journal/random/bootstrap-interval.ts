import { normalCumulative, normalQuantile } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';
import { seededRandom } from '@/journal/random/seeded-random';
import { exactSum } from '@/journal/returns/exact-sum';
import { quantile } from '@/journal/returns/quantile';

export interface BootstrapOptions {
  /** Whole number; the same seed gives the same interval. */
  readonly seed: number | bigint;
  /** Whole number from 100 to 1,000,000; 2,000 by default. */
  readonly resamples?: number;
  /** Strictly between 0 and 1; 0.95 by default. */
  readonly confidence?: number;
  /** `percentile`: the middle share of the resampled values; `bca` (the default): the same with bias and skewness corrected. */
  readonly kind?: 'percentile' | 'bca';
}

/**
 * Interval of a statistic by drawing the sample anew from itself, with replacement; the items are taken as independent.
 * @param items at least 2. @param statistic finite for any sample of as many items drawn from these (bca: and of one fewer).
 * @returns low and high.
 * @throws {DomainError} `too-few-values`, `resamples-invalid`, `confidence-out-of-range`, `seed-invalid`, `statistic-not-finite`.
 * @see percentile: Efron (1979), Annals of Statistics 7(1), 1-26; bca: Efron (1987), J. American Statistical Association 82, 171-185,
 *   acceleration from the jackknife (Efron and Tibshirani 1993, eq. 14.15).
 */
export function bootstrapInterval<Item>(
  items: readonly Item[],
  statistic: (sample: readonly Item[]) => number,
  { seed, resamples = 2000, confidence = 0.95, kind = 'bca' }: BootstrapOptions,
): { low: number; high: number } {
  if (items.length < 2) throw new DomainError('too-few-values', { required: 2, received: items.length });
  if (!(Number.isInteger(resamples) && resamples >= 100 && resamples <= 1_000_000))
    throw new DomainError('resamples-invalid', { resamples });
  const tail = (1 - confidence) / 2;
  if (!(confidence > 0 && 1 - tail < 1)) throw new DomainError('confidence-out-of-range', { confidence });
  const valueOf = (sample: readonly Item[]) => {
    const value = statistic(sample);
    if (!Number.isFinite(value)) throw new DomainError('statistic-not-finite', { value });
    return value;
  };
  const values = resampledValues(items, valueOf, { seed, resamples });
  const tails = kind === 'bca' ? correctedTails(items, valueOf, { values, tail }) : { low: tail, high: 1 - tail };
  return { low: quantile(values, tails.low), high: quantile(values, tails.high) };
}

function resampledValues<Item>(
  items: readonly Item[],
  valueOf: (sample: readonly Item[]) => number,
  { seed, resamples }: { seed: number | bigint; resamples: number },
): number[] {
  const random = seededRandom(seed);
  const sample = [...items];
  return Array.from({ length: resamples }, () => {
    for (let at = 0; at < sample.length; at += 1) {
      const drawn = items[random.index(items.length)];
      if (drawn !== undefined) sample[at] = drawn;
    }
    return valueOf(sample);
  });
}

function correctedTails<Item>(
  items: readonly Item[],
  valueOf: (sample: readonly Item[]) => number,
  { values, tail }: { values: readonly number[]; tail: number },
): { low: number; high: number } {
  const estimate = valueOf(items);
  const below = values.filter((value) => value < estimate).length;
  const equal = values.filter((value) => value === estimate).length;
  // Kept off 0 and 1: half a resample stands for "fewer than one".
  const share = Math.min(Math.max((below + equal / 2) / values.length, 0.5 / values.length), 1 - 0.5 / values.length);
  const bias = normalQuantile(share);
  const acceleration = jackknifeAcceleration(items, valueOf);
  const corrected = (probability: number) => {
    const shifted = bias + normalQuantile(probability);
    const stretch = 1 - acceleration * shifted;
    // Past the pole of the correction the tail is used up.
    if (!(stretch > 0)) return shifted > 0 ? 1 : 0;
    return normalCumulative(bias + shifted / stretch);
  };
  return { low: corrected(tail), high: corrected(1 - tail) };
}

function jackknifeAcceleration<Item>(items: readonly Item[], valueOf: (sample: readonly Item[]) => number): number {
  const without = items.map((_, left) => valueOf(items.filter((__, at) => at !== left)));
  const mean = exactSum(without) / without.length;
  const largest = without.reduce((most, value) => Math.max(most, Math.abs(value - mean)), 0);
  if (!(largest > 0)) return 0;
  const distances = without.map((value) => (mean - value) / largest);
  return (
    exactSum(distances.map((distance) => distance ** 3)) /
    (6 * exactSum(distances.map((distance) => distance ** 2)) ** 1.5)
  );
}
