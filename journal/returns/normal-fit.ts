import { normalCumulative, normalUpperTail } from '@/journal/distributions/normal-distribution';
import { type Histogram, histogram } from '@/journal/returns/histogram';
import { kurtosisTypes, type MomentTypes, skewnessTypes } from '@/journal/returns/moment-types';
import { type QuantilePair, quantilePairs } from '@/journal/returns/quantile-pairs';
import { type SampleStatistics, sampleStatistics } from '@/journal/returns/sample-statistics';
import { wilsonInterval } from '@/journal/scoring/wilson-interval';

/** How many values lie beyond so many deviations from the mean, on both sides together. */
export interface SigmaCount {
  readonly deviations: 1 | 2 | 3;
  readonly observed: number;
  /** Count expected under the normal, n·2Φ(−deviations). */
  readonly expected: number;
  readonly observedShare: number;
  readonly expectedShare: number;
  /** Wilson interval of the share behind the observed one, at the stated confidence. */
  readonly low: number;
  readonly high: number;
}

export interface NormalFit {
  /** Moments, and Jarque-Bera with its probability. */
  readonly statistics: SampleStatistics;
  readonly skewness: MomentTypes;
  readonly excessKurtosis: MomentTypes;
  readonly histogram: Histogram;
  /** Count expected in each bin under the normal with the sample's mean and deviation; with those outside they sum to n. */
  readonly expectedCounts: readonly number[];
  readonly expectedBelow: number;
  readonly expectedAbove: number;
  readonly sigmaCounts: readonly SigmaCount[];
  /** Hazen's positions. */
  readonly quantilePairs: readonly QuantilePair[];
}

/**
 * How well the normal law with the sample's own mean and deviation fits returns.
 * @param returns at least 4, of a magnitude up to 8e307. @param confidence of the shares' intervals, strictly between 0 and 1.
 * @returns the figures to judge by; a sample without spread has all its values in one bin and none beyond any deviation.
 * @throws {DomainError} `too-few-values`, `value-invalid`, `confidence-invalid`.
 * @see the parts' own files; mean and deviation are estimated from the same sample, so that the counts beyond scatter a little less
 *   than the binomial says.
 */
export function normalFit(returns: readonly number[], confidence = 0.95): NormalFit {
  const statistics = sampleStatistics(returns);
  const bins = histogram(returns);
  return {
    statistics,
    skewness: skewnessTypes(statistics.skewness, statistics.count),
    excessKurtosis: kurtosisTypes(statistics.excessKurtosis, statistics.count),
    histogram: bins,
    ...expectedIn(bins, statistics),
    sigmaCounts: sigmaCounts(returns, confidence),
    quantilePairs: quantilePairs(returns),
  };
}

/**
 * Values beyond ±1, ±2 and ±3 sample deviations from the sample mean, observed and expected.
 * @param returns at least 2, of a magnitude up to 1e308. @param confidence strictly between 0 and 1.
 * @throws {DomainError} `too-few-values`, `value-invalid`, `confidence-invalid`.
 * @see common practice; Wilson (1927) for the interval.
 */
export function sigmaCounts(returns: readonly number[], confidence = 0.95): SigmaCount[] {
  const { count, mean, standardDeviation } = sampleStatistics(returns);
  return ([1, 2, 3] as const).map((deviations) => {
    const observed = returns.filter((value) => Math.abs(value - mean) > deviations * standardDeviation).length;
    const expectedShare = 2 * normalUpperTail(deviations);
    return {
      deviations,
      observed: standardDeviation > 0 ? observed : 0,
      expected: count * expectedShare,
      observedShare: observed / count,
      expectedShare,
      ...wilsonInterval({ hits: observed, count, confidence }),
    };
  });
}

function expectedIn(
  { edges }: Histogram,
  { count, mean, standardDeviation }: SampleStatistics,
): Pick<NormalFit, 'expectedCounts' | 'expectedBelow' | 'expectedAbove'> {
  if (!(standardDeviation > 0)) return { expectedCounts: [count], expectedBelow: 0, expectedAbove: 0 };
  const places = edges.map((edge) => (edge - mean) / standardDeviation);
  const between = (from: number, to: number) =>
    // By the smaller tails, so that far bins keep their digits.
    from > 0 ? normalUpperTail(from) - normalUpperTail(to) : normalCumulative(to) - normalCumulative(from);
  return {
    expectedCounts: places.slice(1).map((place, at) => count * between(places[at] ?? place, place)),
    expectedBelow: count * normalCumulative(places[0] ?? 0),
    expectedAbove: count * normalUpperTail(places.at(-1) ?? 0),
  };
}
