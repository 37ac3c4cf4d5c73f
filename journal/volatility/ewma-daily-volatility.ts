import { DomainError } from '@/journal/errors/domain-error';
import { requireMagnitude } from '@/journal/returns/centred-sample';
import { scaleUnit } from '@/journal/returns/scale-unit';

/** What the weighted variance starts from. */
export type EwmaStart =
  /** The mean of the first `count` squared returns; the recursion goes on from the next. */
  | { readonly kind: 'firstSquares'; readonly count: number }
  /** Nothing: only the last `count` returns are used, with weights λ^age that are made to sum to 1. */
  | { readonly kind: 'lastReturns'; readonly count: number };

/** The start where none is stated: the first squared return. */
export const defaultEwmaStart: EwmaStart = { kind: 'firstSquares', count: 1 };

/**
 * Daily volatility by exponentially weighted squared returns, v = λ·v + (1 − λ)·r².
 * @param returns log returns, oldest first, as many as the start's count at least, each of a magnitude up to 1e308.
 * @param options.lambda decay, strictly between 0 and 1; 0.94 for daily data by the source.
 * @param options.start see {@link EwmaStart}, its count a whole number from 1.
 * @returns volatility for the next session, a fraction, 0 or more.
 * @throws {DomainError} `lambda-out-of-range`, `too-few-returns`, or `value-invalid` with the index.
 * @see J.P. Morgan/Reuters (1996), RiskMetrics Technical Document, 4th ed., chapter 5 (74 last returns keep 99 % of the weight at 0.94).
 *   Assumes zero mean.
 */
export function ewmaDailyVolatility(
  returns: readonly number[],
  { lambda, start = defaultEwmaStart }: { readonly lambda: number; readonly start?: EwmaStart },
): number {
  requireLambda(lambda);
  const { count } = start;
  if (!(Number.isInteger(count) && count >= 1 && returns.length >= count)) {
    throw new DomainError('too-few-returns', { required: Math.max(1, Math.ceil(count)), received: returns.length });
  }
  requireMagnitude(returns, 1e308);
  const unit = scaleUnit(returns);
  const squares = returns.map((value) => (unit === 1 ? value : value / unit) ** 2);
  const variance =
    start.kind === 'lastReturns' ? weightedMean(squares.slice(-count), lambda) : recursion(squares, lambda, count);
  return Math.sqrt(variance) * unit;
}

function recursion(squares: readonly number[], lambda: number, count: number): number {
  let variance = 0;
  for (const [index, square] of squares.entries()) {
    variance = index < count ? variance + square / count : lambda * variance + (1 - lambda) * square;
  }
  return variance;
}

function weightedMean(squares: readonly number[], lambda: number): number {
  let sum = 0;
  let weights = 0;
  for (const square of squares) {
    sum = lambda * sum + square;
    weights = lambda * weights + 1;
  }
  return sum / weights;
}

/**
 * Number of equally weighted returns that carry as much information as the weights do.
 * @param lambda strictly between 0 and 1.
 * @returns (1 + λ)/(1 − λ), 32.3 for 0.94.
 * @throws {DomainError} `lambda-out-of-range`.
 * @see Kish (1965), Survey Sampling: squared sum of weights over sum of squared weights.
 */
export function ewmaEffectiveReturns(lambda: number): number {
  requireLambda(lambda);
  return (1 + lambda) / (1 - lambda);
}

function requireLambda(lambda: number): void {
  if (!(lambda > 0 && lambda < 1)) throw new DomainError('lambda-out-of-range', { lambda });
}
