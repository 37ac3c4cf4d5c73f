import { logRatio } from '@/journal/returns/log-ratio';
import { type PriceBar, requireBars } from '@/journal/returns/price-bar';
import { sampleStatistics } from '@/journal/returns/sample-statistics';
import { rogersSatchellVariance } from '@/journal/volatility/rogers-satchell-daily-volatility';

/**
 * Daily volatility from nights, open-to-close moves and ranges: var(ln(O/C′)) + k·var(ln(C/O)) + (1 − k)·RS, the variances about
 * their means with n − 1, RS the variance of Rogers and Satchell, C′ the close before.
 * @param bars one a session, at least 3; the first gives only the close before the second, so that n is one less.
 * @returns standard deviation of the log return of one session, close to close, a fraction, 0 or more.
 * @throws {DomainError} `too-few-bars`, `bar-invalid` with the row.
 * @see Yang and Zhang (2000), J. Business 73(3), 477-491. Whatever the drift; assumes prices seen all through the session: with few
 *   trades it reads low.
 */
export function yangZhangDailyVolatility(bars: readonly PriceBar[]): number {
  requireBars(bars, 3);
  const { nightVariance, dayVariance } = yangZhangParts(bars);
  return Math.sqrt(nightVariance + dayVariance);
}

export interface YangZhangParts {
  readonly nightVariance: number;
  /** From open to close: the weighted mean of the moves' variance and that of Rogers and Satchell. */
  readonly dayVariance: number;
  /** Mean log return from close to close. */
  readonly mean: number;
}

/** The parts of the variance, each 0 or more. Bars as above, already checked. */
export function yangZhangParts(bars: readonly PriceBar[]): YangZhangParts {
  const sessions = bars.slice(1);
  const nights = sampleStatistics(sessions.map(({ open }, row) => logRatio(open, bars[row]?.close ?? open)));
  const days = sampleStatistics(sessions.map(({ open, close }) => logRatio(close, open)));
  const weight = yangZhangWeight(sessions.length);
  return {
    nightVariance: nights.standardDeviation ** 2,
    dayVariance: weight * days.standardDeviation ** 2 + (1 - weight) * rogersSatchellVariance(sessions),
    mean: nights.mean + days.mean,
  };
}

/**
 * The weight k that makes the variance of the estimate least, 0.34/(1.34 + (n + 1)/(n − 1)).
 * @param sessions n, from 2. @returns 0.078 at 2, rising to 0.145.
 * @see Yang and Zhang (2000), eq. 11 (from memory), with their 1.34 for any drift.
 */
export function yangZhangWeight(sessions: number): number {
  return 0.34 / (1.34 + (sessions + 1) / (sessions - 1));
}
