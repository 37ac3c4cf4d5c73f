import { DomainError } from '@/journal/errors/domain-error';
import { logRatio } from '@/journal/returns/log-ratio';

/**
 * Log returns of consecutive closes, ln(P(t)/P(t-1)).
 * @param closes one close per session, oldest first, at least 2, each above 0 and finite, adjusted for splits.
 * @returns one number fewer than closes; fractions (0.01 is about +1 %).
 * @throws {DomainError} `too-few-closes`, or `close-invalid` with the index of the bad close.
 * @see common practice; e.g. Campbell, Lo and MacKinlay (1997), The Econometrics of Financial Markets, 1.4.
 */
export function logReturns(closes: readonly number[]): number[] {
  if (closes.length < 2) throw new DomainError('too-few-closes', { required: 2, received: closes.length });
  const returns: number[] = [];
  let previous: number | null = null;
  for (const [index, close] of closes.entries()) {
    const isValid = close > 0 && close < Infinity;
    if (!isValid) throw new DomainError('close-invalid', { index, close });
    if (previous !== null) returns.push(logRatio(close, previous));
    previous = close;
  }
  return returns;
}
