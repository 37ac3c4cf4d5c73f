import { DomainError } from '@/journal/errors/domain-error';
import { centredSample, requireMagnitude } from '@/journal/returns/centred-sample';
import { exactSum } from '@/journal/returns/exact-sum';

/**
 * Variance of returns over several sessions, from all overlapping ones, a session: unbiased when returns are uncorrelated.
 * @param returns log returns of a magnitude up to 1e150, more than `sessions`, at least 2.
 * @param sessions q, a whole number from 1; 1 gives the sample variance.
 * @returns Σ(q-session return − q·mean)²/M, M = q·(T − q + 1)·(1 − q/T), 0 or more; times q it is the variance over q sessions.
 * @throws {DomainError} `horizon-invalid`, `too-few-returns`, `value-invalid` with the index.
 * @see Lo and MacKinlay (1988), Review of Financial Studies 1(1), 41-66.
 */
export function overlappingVariance(returns: readonly number[], sessions: number): number {
  requireHorizon(sessions, 1);
  const count = returns.length;
  const required = Math.max(2, sessions + 1);
  if (count < required) throw new DomainError('too-few-returns', { required, received: count });
  requireMagnitude(returns, 1e150);
  const { centred, unit } = centredSample(returns);
  const path = [0];
  for (const deviation of centred) path.push((path.at(-1) ?? 0) + deviation);
  const squares = path.slice(sessions).map((place, at) => (place - (path[at] ?? 0)) ** 2);
  const divisor = sessions * (count - sessions + 1) * (1 - sessions / count);
  return (exactSum(squares) / divisor) * unit * unit;
}

/**
 * Checks a horizon.
 * @throws {DomainError} `horizon-invalid` unless it is a whole number from `least`.
 */
export function requireHorizon(sessions: number, least: number): void {
  if (!(Number.isSafeInteger(sessions) && sessions >= least))
    throw new DomainError('horizon-invalid', { sessions, least });
}
