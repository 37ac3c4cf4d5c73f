import { DomainError } from '@/journal/errors/domain-error';
import { type PriceBar } from '@/journal/returns/price-bar';
import { defaultConfidence, estimateCloseVolatility } from '@/journal/volatility/estimate-close-volatility';
import { estimateRangeVolatility, rangeSessions } from '@/journal/volatility/estimate-range-volatility';
import { type VolatilityEstimate, type VolatilityMethod } from '@/journal/volatility/volatility-method';

/** Prices oldest first, adjusted for splits: closes alone, or whole bars. */
export type PriceHistory = { readonly closes: readonly number[] } | { readonly bars: readonly PriceBar[] };

/**
 * Daily volatility with its interval by any method; methods of closes take those of the bars.
 * @throws {DomainError} `bars-missing` for a range method with closes only; otherwise as estimateCloseVolatility and
 *   estimateRangeVolatility.
 * @see the methods' own files.
 */
export function estimateVolatility(
  prices: PriceHistory,
  method: VolatilityMethod,
  confidence: number = defaultConfidence,
): VolatilityEstimate {
  if (method.kind === 'close' || method.kind === 'ewma')
    return estimateCloseVolatility(closesOf(prices), method, confidence);
  if (!('bars' in prices)) throw new DomainError('bars-missing', { method: method.kind });
  return estimateRangeVolatility(prices.bars, method, confidence);
}

/** The largest window a method can have over these prices: returns, or sessions for a range method; 1 where there are none. */
export function largestWindow(prices: PriceHistory, kind: VolatilityMethod['kind']): number {
  const count = 'bars' in prices ? prices.bars.length : prices.closes.length;
  return Math.max(1, kind === 'close' || kind === 'ewma' ? count - 1 : rangeSessions(kind, count));
}

function closesOf(prices: PriceHistory): readonly number[] {
  return 'bars' in prices ? prices.bars.map(({ close }) => close) : prices.closes;
}
