import { exactSum } from '@/journal/returns/exact-sum';
import { logRatio } from '@/journal/returns/log-ratio';
import { type PriceBar, requireBars } from '@/journal/returns/price-bar';
import { garmanKlassVariance } from '@/journal/volatility/garman-klass-daily-volatility';

/**
 * Daily volatility by Garman and Klass with the night added: mean of ln(O/C′)² and the session's own variance, C′ the close before.
 * @param bars one a session, at least 2; the first gives only the close before the second.
 * @returns standard deviation of the log return of one session, close to close, a fraction, 0 or more.
 * @throws {DomainError} `too-few-bars`, `bar-invalid` with the row.
 * @see Yang and Zhang (2000), J. Business 73(3), 477-491, on Garman and Klass (1980). Assumes no drift by night or day.
 */
export function garmanKlassYangZhangDailyVolatility(bars: readonly PriceBar[]): number {
  requireBars(bars, 2);
  const { nightVariance, dayVariance } = garmanKlassYangZhangParts(bars);
  return Math.sqrt(nightVariance + dayVariance);
}

/** The two parts of the variance, each 0 or more. Bars as above, already checked. */
export function garmanKlassYangZhangParts(bars: readonly PriceBar[]): { nightVariance: number; dayVariance: number } {
  const sessions = bars.slice(1);
  const nights = sessions.map(({ open }, row) => logRatio(open, bars[row]?.close ?? open) ** 2);
  return {
    nightVariance: exactSum(nights) / sessions.length,
    dayVariance: exactSum(sessions.map(garmanKlassVariance)) / sessions.length,
  };
}
