import { exactSum } from '@/journal/returns/exact-sum';
import { logRatio } from '@/journal/returns/log-ratio';
import { type PriceBar, requireBars } from '@/journal/returns/price-bar';

/**
 * Daily volatility from range, open and close: mean of ln(H/C)·ln(H/O) + ln(L/C)·ln(L/O), whatever the drift.
 * @param bars one a session, at least 1.
 * @returns standard deviation of the log price from open to close, a fraction, 0 or more: the night before is not in it.
 * @throws {DomainError} `too-few-bars`, `bar-invalid` with the row.
 * @see Rogers and Satchell (1991), Annals of Applied Probability 1(4), 504-512. Assumes prices seen all through the session: with few
 *   trades it reads low.
 */
export function rogersSatchellDailyVolatility(bars: readonly PriceBar[]): number {
  requireBars(bars, 1);
  return Math.sqrt(rogersSatchellVariance(bars));
}

/** Mean variance of sessions from open to close; both products of a session are 0 or more. */
export function rogersSatchellVariance(bars: readonly PriceBar[]): number {
  const variances = bars.map(
    ({ open, high, low, close }) =>
      logRatio(high, close) * logRatio(high, open) + logRatio(low, close) * logRatio(low, open),
  );
  return exactSum(variances) / bars.length;
}
