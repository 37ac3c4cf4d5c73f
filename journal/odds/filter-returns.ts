import { DomainError } from '@/journal/errors/domain-error';

/** Returns in units of the volatility expected of their session. */
export interface FilteredReturns {
  readonly standardised: Float64Array;
  /** Volatility expected of the next session, a fraction. */
  readonly dailyVolatility: number;
}

/**
 * Divides each return by the volatility that an exponentially weighted average expected of it.
 * @param logReturns oldest first, at least 2, each within ±100; not all 0.
 * @param options.lambda decay, strictly between 0 and 1; 0.94 for daily data.
 * @returns standardised returns, not centred and not scaled to a variance of 1: what the filter under- or overstates on average stays.
 * @throws {DomainError} `lambda-out-of-range`, `too-few-returns`, `return-invalid` with the index, `filter-volatility-zero`.
 * @see Barone-Adesi, Giannopoulos and Vosper (1999), J. Futures Markets 19, with the variance of RiskMetrics (1996) in place of
 *   GARCH; it starts at the mean square of all returns (common practice).
 */
export function filterReturns(logReturns: readonly number[], { lambda }: { readonly lambda: number }): FilteredReturns {
  if (!(lambda > 0 && lambda < 1)) throw new DomainError('lambda-out-of-range', { lambda });
  checkReturns(logReturns);
  let variance = 0;
  for (const value of logReturns) variance += (value * value) / logReturns.length;
  const standardised = new Float64Array(logReturns.length);
  for (const [index, value] of logReturns.entries()) {
    // Below this a square has lost its digits.
    if (!(variance > 1e-280)) throw new DomainError('filter-volatility-zero', { index });
    standardised[index] = value / Math.sqrt(variance);
    variance = lambda * variance + (1 - lambda) * value * value;
  }
  return { standardised, dailyVolatility: Math.sqrt(variance) };
}

/** @throws {DomainError} `too-few-returns`, `return-invalid` with the index. */
export function checkReturns(logReturns: readonly number[]): void {
  if (logReturns.length < 2) throw new DomainError('too-few-returns', { required: 2, received: logReturns.length });
  for (const [index, value] of logReturns.entries())
    if (!(Math.abs(value) <= 100)) throw new DomainError('return-invalid', { index, value });
}
