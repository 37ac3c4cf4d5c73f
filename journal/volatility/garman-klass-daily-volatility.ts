import { exactSum } from '@/journal/returns/exact-sum';
import { logRatio } from '@/journal/returns/log-ratio';
import { type PriceBar, requireBars } from '@/journal/returns/price-bar';

/**
 * Daily volatility from range and close, the practical form: mean of ln(H/L)²/2 − (2 ln 2 − 1)·ln(C/O)².
 * @param bars one a session, at least 1.
 * @returns standard deviation of the log price from open to close, a fraction, 0 or more: the night before is not in it.
 * @throws {DomainError} `too-few-bars`, `bar-invalid` with the row.
 * @see Garman and Klass (1980), J. Business 53(1), 67-78. Assumes no drift, and prices seen all through the session: with few trades
 *   it reads low.
 */
export function garmanKlassDailyVolatility(bars: readonly PriceBar[]): number {
  requireBars(bars, 1);
  return Math.sqrt(exactSum(bars.map(garmanKlassVariance)) / bars.length);
}

/** Variance of one session from open to close by its range and close; 0 or more, since the close lies within the range. */
export function garmanKlassVariance({ open, high, low, close }: PriceBar): number {
  return 0.5 * logRatio(high, low) ** 2 - (2 * Math.LN2 - 1) * logRatio(close, open) ** 2;
}
