import { exactSum } from '@/journal/returns/exact-sum';
import { logRatio } from '@/journal/returns/log-ratio';
import { type PriceBar, requireBars } from '@/journal/returns/price-bar';

/**
 * Daily volatility from the ranges of sessions: the mean of ln(H/L)² over 4 ln 2.
 * @param bars one a session, at least 1.
 * @returns standard deviation of the log price from open to close, a fraction, 0 or more: the night before is not in it.
 * @throws {DomainError} `too-few-bars`, `bar-invalid` with the row.
 * @see Parkinson (1980), J. Business 53(1), 61-65. Assumes no drift, and prices seen all through the session: with few trades the
 *   extremes are missed and it reads low (Garman and Klass 1980, J. Business 53(1), 67-78).
 */
export function parkinsonDailyVolatility(bars: readonly PriceBar[]): number {
  requireBars(bars, 1);
  const squares = bars.map(({ high, low }) => logRatio(high, low) ** 2);
  return Math.sqrt(exactSum(squares) / (4 * Math.LN2 * bars.length));
}
