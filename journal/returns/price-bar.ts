import { DomainError } from '@/journal/errors/domain-error';

/** The four prices of one session, each above 0 and finite, in one currency and adjusted alike. */
export interface PriceBar {
  readonly open: number;
  readonly high: number;
  readonly low: number;
  readonly close: number;
}

/** Whether the prices are positive and finite, and none lies outside the range from low to high. */
export function isPriceBar({ open, high, low, close }: PriceBar): boolean {
  return low > 0 && high < Infinity && open >= low && open <= high && close >= low && close <= high;
}

/**
 * Checks bars before they are used.
 * @param least how many there must be. @param first row of the first to be checked, 0 by default.
 * @throws {DomainError} `too-few-bars`, or `bar-invalid` with the row (from 0) and its prices.
 */
export function requireBars(bars: readonly PriceBar[], least: number, first = 0): void {
  if (!(bars.length >= least)) throw new DomainError('too-few-bars', { required: least, received: bars.length });
  for (const [row, bar] of bars.entries()) {
    if (row < first || isPriceBar(bar)) continue;
    const { open, high, low, close } = bar;
    throw new DomainError('bar-invalid', { row, open, high, low, close });
  }
}
