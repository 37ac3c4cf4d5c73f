import { logReturns } from '@/journal/returns/log-returns';
import { quantile } from '@/journal/returns/quantile';
import { closeDailyVolatility } from '@/journal/volatility/close-daily-volatility';

export interface PlaceInOwnYear {
  /** Share of the past values at or below the current one, 0 to 100. */
  readonly percentile: number;
  readonly lowerQuartile: number;
  readonly upperQuartile: number;
  readonly lowest: number;
  readonly highest: number;
  readonly current: number;
  /** Values compared, the current one included, at most 252. */
  readonly count: number;
}

const SESSIONS_IN_A_YEAR = 252;
const FEWEST_VALUES = 20;

/**
 * Where the present volatility of a window stands among its own values of the past year.
 * @param closes oldest first.
 * @param window returns in the window, from 2.
 * @returns the place, or null with fewer than 20 values to compare: a place among few says nothing.
 * @throws {DomainError} `close-invalid`.
 * @see common practice (empirical distribution of rolling estimates).
 */
export function placeInOwnYear(closes: readonly number[], window = 21): PlaceInOwnYear | null {
  if (closes.length < window + FEWEST_VALUES) return null;
  const returns = logReturns(closes.slice(-(SESSIONS_IN_A_YEAR + window)));
  const values: number[] = [];
  for (let end = window; end <= returns.length; end += 1) {
    values.push(closeDailyVolatility(returns.slice(end - window, end), { mean: 'sample' }));
  }
  const current = values.at(-1) ?? 0;
  return {
    percentile: (100 * values.filter((value) => value <= current).length) / values.length,
    lowerQuartile: quantile(values, 0.25),
    upperQuartile: quantile(values, 0.75),
    lowest: Math.min(...values),
    highest: Math.max(...values),
    current,
    count: values.length,
  };
}
