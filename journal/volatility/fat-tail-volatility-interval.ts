import { normalQuantile } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';
import { kurtosisTypes } from '@/journal/returns/moment-types';
import { sampleStatistics } from '@/journal/returns/sample-statistics';

const NORMAL_KURTOSIS = 3;

/**
 * Interval of a volatility whose returns are independent but may have fat tails: the standard error of its logarithm is
 * √((kurtosis − 1)/(4n)).
 * @param question.dailyVolatility 0 or more; `count` returns n, from 1; `kurtosis` of the returns, from 1, 3 for normal ones;
 *   `confidence` strictly between 0 and 1.
 * @returns low and high, and the relative standard error.
 * @throws {DomainError} `volatility-invalid`, `too-few-returns`, `kurtosis-invalid`, `confidence-out-of-range`.
 * @see delta method on the logarithm, common practice; variance of a sample variance: e.g. Casella and Berger (2002), exercise 5.8.
 */
export function fatTailVolatilityInterval(question: {
  readonly dailyVolatility: number;
  readonly count: number;
  readonly kurtosis: number;
  readonly confidence: number;
}): { low: number; high: number; relativeError: number } {
  const { dailyVolatility, count, kurtosis, confidence } = question;
  if (!(dailyVolatility >= 0 && dailyVolatility < Infinity))
    throw new DomainError('volatility-invalid', { dailyVolatility });
  if (!(count >= 1 && count < Infinity)) throw new DomainError('too-few-returns', { required: 1, received: count });
  if (!(kurtosis >= 1 && kurtosis < Infinity)) throw new DomainError('kurtosis-invalid', { kurtosis });
  const upper = (1 + confidence) / 2;
  if (!(confidence > 0 && upper < 1)) throw new DomainError('confidence-out-of-range', { confidence });
  const relativeError = Math.sqrt((kurtosis - 1) / (4 * count));
  const factor = Math.exp(normalQuantile(upper) * relativeError);
  const high = dailyVolatility * factor;
  if (!(high < Infinity)) throw new DomainError('volatility-invalid', { dailyVolatility, relativeError });
  return { low: dailyVolatility / factor, high, relativeError };
}

/**
 * Kurtosis to use for an interval from a sample: its type 2 estimate, and not less than the normal 3, so that a small sample that
 * happens to show thin tails does not narrow the interval.
 * @param returns at least 4, of a magnitude up to 1e308.
 * @throws {DomainError} `too-few-values`, `value-invalid`.
 * @see type 2: Joanes and Gill (1998), The Statistician 47; the floor: common practice. Samples show less kurtosis than their law has.
 */
export function cautiousKurtosis(returns: readonly number[]): number {
  const { excessKurtosis, count } = sampleStatistics(returns);
  return NORMAL_KURTOSIS + Math.max(0, kurtosisTypes(excessKurtosis, count).type2);
}
