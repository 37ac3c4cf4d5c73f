import { DomainError } from '@/journal/errors/domain-error';

/**
 * Daily volatility by exponentially weighted squared returns, v = λ·v + (1 − λ)·r².
 * @param returns log returns, oldest first, at least `seedReturns`.
 * @param options.lambda decay, strictly between 0 and 1; 0.94 for daily data by the source.
 * @param options.seedReturns the recursion starts from the mean of this many first squared returns; 1 (the default) starts
 *   from the first squared return.
 * @returns volatility for the next session, a fraction, 0 or more.
 * @throws {DomainError} `lambda-out-of-range`, `too-few-returns`, or `value-invalid` with the index.
 * @see J.P. Morgan/Reuters (1996), RiskMetrics Technical Document, 4th ed., chapter 5. Assumes zero mean.
 */
export function ewmaDailyVolatility(
  returns: readonly number[],
  { lambda, seedReturns = 1 }: { readonly lambda: number; readonly seedReturns?: number },
): number {
  if (!(lambda > 0 && lambda < 1)) throw new DomainError('lambda-out-of-range', { lambda });
  if (returns.length < seedReturns || seedReturns < 1) {
    throw new DomainError('too-few-returns', { required: Math.max(1, seedReturns), received: returns.length });
  }
  let variance = 0;
  for (const [index, value] of returns.entries()) {
    if (!(Math.abs(value) < Infinity)) throw new DomainError('value-invalid', { index, value });
    variance =
      index < seedReturns ? variance + value ** 2 / seedReturns : lambda * variance + (1 - lambda) * value ** 2;
  }
  return Math.sqrt(variance);
}

/**
 * Number of equally weighted returns that carry as much information as the weights do.
 * @param lambda strictly between 0 and 1.
 * @returns (1 + λ)/(1 − λ), 32.3 for 0.94.
 * @throws {DomainError} `lambda-out-of-range`.
 * @see Kish (1965), Survey Sampling: squared sum of weights over sum of squared weights.
 */
export function ewmaEffectiveReturns(lambda: number): number {
  if (!(lambda > 0 && lambda < 1)) throw new DomainError('lambda-out-of-range', { lambda });
  return (1 + lambda) / (1 - lambda);
}
