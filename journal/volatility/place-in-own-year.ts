import { logReturns } from '@/journal/returns/log-returns';
import { quantile } from '@/journal/returns/quantile';
import { closeDailyVolatility } from '@/journal/volatility/close-daily-volatility';
import { requireWindow } from '@/journal/volatility/volatility-method';

export interface PlaceInOwnYear {
  /** Share of the past values at or below the current one, 0 to 100. */
  readonly percentile: number;
  readonly fifthPercentile: number;
  readonly lowerQuartile: number;
  readonly median: number;
  readonly upperQuartile: number;
  readonly ninetyFifthPercentile: number;
  readonly lowest: number;
  readonly highest: number;
  readonly current: number;
  /** Values compared, the current one included, at most 252. */
  readonly count: number;
}

export const SESSIONS_IN_A_YEAR = 252;
const FEWEST_VALUES = 20;

/**
 * Where the present volatility of a window stands among its own values of the past year.
 * @param closes oldest first.
 * @param window returns in the window, from 2.
 * @returns the place, or null with fewer than 20 values to compare: a place among few says nothing.
 * @throws {DomainError} `window-invalid`, `too-few-returns` for a window of 1, `close-invalid`.
 * @see common practice (empirical distribution of rolling estimates).
 */
export function placeInOwnYear(closes: readonly number[], window = 21): PlaceInOwnYear | null {
  requireWindow(window);
  if (closes.length < window + FEWEST_VALUES) return null;
  const returns = logReturns(closes.slice(-(SESSIONS_IN_A_YEAR + window)));
  const values: number[] = [];
  for (let end = window; end <= returns.length; end += 1) {
    values.push(closeDailyVolatility(returns.slice(end - window, end), { mean: 'sample' }));
  }
  return placeAmong(values);
}

/**
 * Where the last of some values stands among them all; quantiles of type 7.
 * @param values finite, oldest first. @returns null with fewer than 20.
 * @see common practice.
 */
export function placeAmong(values: readonly number[]): PlaceInOwnYear | null {
  const current = values.at(-1);
  if (current === undefined || values.length < FEWEST_VALUES) return null;
  return {
    percentile: (100 * values.filter((value) => value <= current).length) / values.length,
    fifthPercentile: quantile(values, 0.05),
    lowerQuartile: quantile(values, 0.25),
    median: quantile(values, 0.5),
    upperQuartile: quantile(values, 0.75),
    ninetyFifthPercentile: quantile(values, 0.95),
    lowest: quantile(values, 0),
    highest: quantile(values, 1),
    current,
    count: values.length,
  };
}
