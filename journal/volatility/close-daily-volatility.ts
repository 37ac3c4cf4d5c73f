import { DomainError } from '@/journal/errors/domain-error';
import { centredSample, rootMeanSquare } from '@/journal/returns/centred-sample';

/**
 * Daily volatility of log returns, close to close.
 * @param returns log returns of a magnitude up to 1e308, at least 2 with the sample mean removed, at least 1 with zero mean.
 * @param options.mean 'sample' divides by n − 1 about the sample mean; 'zero' divides the squares by n.
 * @returns standard deviation of one session's log return, a fraction, 0 or more.
 * @throws {DomainError} `too-few-returns`, or `value-invalid` with the index.
 * @see sample deviation: any statistics text, e.g. Casella and Berger (2002); zero mean: Figlewski (1997), Financial
 *   Markets, Institutions and Instruments 6(1).
 */
export function closeDailyVolatility(
  returns: readonly number[],
  { mean }: { readonly mean: 'sample' | 'zero' },
): number {
  const required = mean === 'sample' ? 2 : 1;
  if (returns.length < required) throw new DomainError('too-few-returns', { required, received: returns.length });
  if (mean === 'zero') return rootMeanSquare(returns);
  const { count, unit, squares } = centredSample(returns);
  return Math.sqrt(squares / (count - 1)) * unit;
}
