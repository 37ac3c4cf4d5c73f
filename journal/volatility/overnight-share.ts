import { bootstrapInterval } from '@/journal/random/bootstrap-interval';
import { exactSum } from '@/journal/returns/exact-sum';
import { logRatio } from '@/journal/returns/log-ratio';
import { type PriceBar, requireBars } from '@/journal/returns/price-bar';

/** Share of a session's variance that comes by night, where none has been estimated. Common practice. */
export const defaultOvernightShare = 0.3;

export interface OvernightShare {
  /** Σ ln(O/C′)² over the same with Σ ln(C/O)² added, 0 to 1. */
  readonly share: number;
  readonly low: number;
  readonly high: number;
  /** Nights, each with the day after it. */
  readonly nights: number;
}

const FEWEST_NIGHTS = 20;

interface NightAndDay {
  readonly night: number;
  readonly day: number;
}

/**
 * Share of the variance that comes between close and open, with a bootstrap interval over sessions.
 * @param bars one a session, oldest first, adjusted for splits and dividends.
 * @param options.seed whole number; `confidence` strictly between 0 and 1; `resamples` from 100.
 * @returns null with fewer than 20 nights or no movement at all: {@link defaultOvernightShare} stands in then.
 * @throws {DomainError} `bar-invalid` with the row, `seed-invalid`, `confidence-out-of-range`, `resamples-invalid`.
 * @see ratio of sums of squares: common practice; by hours: French and Roll (1986), J. Financial Economics 17, 5-26; interval:
 *   Efron (1987), bias corrected and accelerated.
 */
export function overnightShare(
  bars: readonly PriceBar[],
  options: { readonly seed: number | bigint; readonly confidence?: number; readonly resamples?: number },
): OvernightShare | null {
  requireBars(bars, 0);
  if (bars.length <= FEWEST_NIGHTS) return null;
  const squares = bars.slice(1).map(({ open, close }, row) => ({
    night: logRatio(open, bars[row]?.close ?? open) ** 2,
    day: logRatio(close, open) ** 2,
  }));
  if (squares.every(({ night, day }) => night + day === 0)) return null;
  const share = shareOf(squares, defaultOvernightShare);
  return { share, ...bootstrapInterval(squares, (sample) => shareOf(sample, share), options), nights: squares.length };
}

/** The share by night, or what is given for a sample in which nothing moved. */
function shareOf(squares: readonly NightAndDay[], ofNothing: number): number {
  const night = exactSum(squares.map((square) => square.night));
  const day = exactSum(squares.map((square) => square.day));
  return night + day > 0 ? night / (night + day) : ofNothing;
}
