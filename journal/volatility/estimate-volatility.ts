import { DomainError } from '@/journal/errors/domain-error';
import { logReturns } from '@/journal/returns/log-returns';
import { sampleStatistics } from '@/journal/returns/sample-statistics';
import { ewmaDailyVolatility, ewmaEffectiveReturns } from '@/journal/volatility/ewma-daily-volatility';
import { volatilityInterval } from '@/journal/volatility/volatility-interval';
import { type VolatilityEstimate, type VolatilityMethod } from '@/journal/volatility/volatility-method';

const DEFAULT_CONFIDENCE = 0.95;

/**
 * Daily volatility of a series of closes by one method, with its interval.
 * @param closes oldest first, at least window + 1 for a window (window from 2), at least 2 for the weighted method.
 * @returns window: sample mean removed, n − 1 degrees of freedom; ewma: zero mean, started at the first squared return,
 *   its interval by the effective number of returns (common practice).
 * @throws {DomainError} `too-few-returns` with what is required, `close-invalid`, `confidence-out-of-range`, `lambda-out-of-range`.
 * @see the methods' own files.
 */
export function estimateVolatility(
  closes: readonly number[],
  method: VolatilityMethod,
  confidence: number = DEFAULT_CONFIDENCE,
): VolatilityEstimate {
  const available = Math.max(0, closes.length - 1);
  const required = method.kind === 'window' ? method.window : 1;
  if (!(required >= 1) || available < required)
    throw new DomainError('too-few-returns', { required, received: available });
  if (method.kind === 'ewma') {
    const dailyVolatility = ewmaDailyVolatility(logReturns(closes), { lambda: method.lambda });
    const degreesOfFreedom = ewmaEffectiveReturns(method.lambda);
    const interval = volatilityInterval({ dailyVolatility, degreesOfFreedom, confidence });
    return { method, dailyVolatility, mean: 0, ...interval, confidence, degreesOfFreedom, returnsUsed: available };
  }
  const returns = logReturns(closes.slice(-(method.window + 1)));
  const { standardDeviation, mean } = sampleStatistics(returns);
  const degreesOfFreedom = returns.length - 1;
  const interval = volatilityInterval({ dailyVolatility: standardDeviation, degreesOfFreedom, confidence });
  return {
    method,
    dailyVolatility: standardDeviation,
    mean,
    ...interval,
    confidence,
    degreesOfFreedom,
    returnsUsed: returns.length,
  };
}
