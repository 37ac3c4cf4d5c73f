import { estimateVolatility } from '@/journal/volatility/estimate-volatility';
import { type VolatilityEstimate, type VolatilityMethod } from '@/journal/volatility/volatility-method';

/** The methods shown side by side: short windows follow change but are noisy, long ones are steadier but stale. */
export const ladderMethods: readonly VolatilityMethod[] = [
  ...[10, 21, 63, 126, 252].map((window) => ({ kind: 'window', window }) as const),
  { kind: 'ewma', lambda: 0.94 },
];

/**
 * Volatility by every method of the ladder that the closes suffice for.
 * @param closes oldest first, at least 2.
 * @returns in the order of {@link ladderMethods}; a window without enough returns is left out.
 * @throws {DomainError} `too-few-closes`, `close-invalid`, `confidence-out-of-range`.
 */
export function volatilityLadder(closes: readonly number[], confidence?: number): VolatilityEstimate[] {
  return ladderMethods
    .filter((method) => closes.length - 1 >= (method.kind === 'window' ? method.window : 1))
    .map((method) => estimateVolatility(closes, method, confidence));
}
