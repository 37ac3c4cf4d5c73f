import { DomainError } from '@/journal/errors/domain-error';
import { logReturns } from '@/journal/returns/log-returns';
import { centredSample } from '@/journal/returns/centred-sample';
import { closeDailyVolatility } from '@/journal/volatility/close-daily-volatility';
import { ewmaDailyVolatility, ewmaEffectiveReturns } from '@/journal/volatility/ewma-daily-volatility';
import { volatilityInterval } from '@/journal/volatility/volatility-interval';
import { type CloseMethod, requireWindow, type VolatilityEstimate } from '@/journal/volatility/volatility-method';

export const defaultConfidence = 0.95;

/**
 * Daily volatility of a series of closes by one method, with its chi-square interval.
 * @param closes oldest first, adjusted for splits; at least window + 1 for a window (from 2 returns, from 1 with zero mean), at least 2
 *   for the weighted method.
 * @param confidence strictly between 0 and 1.
 * @returns close: n − 1 degrees of freedom, n with zero mean; ewma: as many degrees as there are effective returns (common practice),
 *   (1 + λ)/(1 − λ), but never more than returns.
 * @throws {DomainError} `window-invalid`, `too-few-returns` with what is required, `close-invalid`, `confidence-out-of-range`,
 *   `lambda-out-of-range`.
 * @see the methods' own files.
 */
export function estimateCloseVolatility(
  closes: readonly number[],
  method: CloseMethod,
  confidence: number = defaultConfidence,
): VolatilityEstimate<CloseMethod> {
  const available = Math.max(0, closes.length - 1);
  const required = method.kind === 'ewma' ? 1 : requiredReturns(method);
  if (available < required) throw new DomainError('too-few-returns', { required, received: available });
  if (method.kind === 'ewma') {
    const { lambda, start } = method;
    const returns = logReturns(closes);
    const dailyVolatility = ewmaDailyVolatility(returns, { lambda, start });
    const returnsUsed = start?.kind === 'lastReturns' ? start.count : available;
    const degreesOfFreedom = Math.min(ewmaEffectiveReturns(lambda), returnsUsed);
    const interval = volatilityInterval({ dailyVolatility, degreesOfFreedom, confidence });
    return { method, dailyVolatility, mean: 0, ...interval, confidence, degreesOfFreedom, returnsUsed };
  }
  const returns = logReturns(closes.slice(-(required + 1)));
  const hasZeroMean = method.mean === 'zero';
  const dailyVolatility = closeDailyVolatility(returns, { mean: hasZeroMean ? 'zero' : 'sample' });
  const degreesOfFreedom = hasZeroMean ? returns.length : returns.length - 1;
  return {
    method,
    dailyVolatility,
    mean: hasZeroMean ? 0 : centredSample(returns).mean,
    ...volatilityInterval({ dailyVolatility, degreesOfFreedom, confidence }),
    confidence,
    degreesOfFreedom,
    returnsUsed: returns.length,
  };
}

function requiredReturns({ window, mean }: Extract<CloseMethod, { kind: 'close' }>): number {
  requireWindow(window);
  const least = mean === 'zero' ? 1 : 2;
  if (window < least) throw new DomainError('too-few-returns', { required: least, received: window });
  return window;
}
