import { estimateCloseVolatility } from '@/journal/volatility/estimate-close-volatility';
import { type CloseMethod, type VolatilityEstimate } from '@/journal/volatility/volatility-method';

/** The methods shown side by side: short windows follow change but are noisy, long ones are steadier but stale. */
export const ladderMethods: readonly CloseMethod[] = [
  ...[10, 21, 63, 126, 252].map((window) => ({ kind: 'close', window }) as const),
  { kind: 'ewma', lambda: 0.94 },
];

/**
 * Volatility by every method of the ladder that the closes suffice for.
 * @param closes oldest first.
 * @returns in the order of {@link ladderMethods}; a method without enough returns is left out.
 * @throws {DomainError} `close-invalid`, `confidence-out-of-range`.
 */
export function volatilityLadder(closes: readonly number[], confidence?: number): VolatilityEstimate<CloseMethod>[] {
  return ladderMethods
    .filter((method) => closes.length - 1 >= (method.kind === 'close' ? method.window : 1))
    .map((method) => estimateCloseVolatility(closes, method, confidence));
}
