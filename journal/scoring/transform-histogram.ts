import { DomainError } from '@/journal/errors/domain-error';

/** Where an outcome fell in its forecast distribution: F just below it and F at it; equal when there is no lump at the outcome. */
export interface TransformInterval {
  readonly low: number;
  readonly high: number;
}

/**
 * Histogram of where outcomes fell, for distributions that have lumps (the greatest loss, say): an outcome on a lump is spread evenly
 * over the lump's share of 0 to 1, so that calibrated forecasts still give equal bins and nothing is drawn at random.
 * @param intervals each 0 <= low <= high <= 1, at least one.
 * @param bins whole number from 1; 10 by default.
 * @returns the (fractional) number of outcomes in each bin; they add up to the number of intervals.
 * @throws {DomainError} `values-missing`, `bins-invalid`, `transform-interval-invalid` with the index.
 * @see Czado, Gneiting and Held (2009), Biometrics 65(4), 1254-1261, eq. 2.
 */
export function transformHistogram(intervals: readonly TransformInterval[], bins = 10): number[] {
  if (intervals.length === 0) throw new DomainError('values-missing');
  if (!(Number.isInteger(bins) && bins >= 1)) throw new DomainError('bins-invalid', { bins });
  const counts = new Array<number>(bins).fill(0);
  for (const [index, { low, high }] of intervals.entries()) {
    if (!(low >= 0 && low <= high && high <= 1))
      throw new DomainError('transform-interval-invalid', { index, low, high });
    for (const bin of counts.keys()) counts[bin] = (counts[bin] ?? 0) + shareIn({ low, high }, bin, bins);
  }
  return counts;
}

/** The share of an interval that lies in a bin; a single point belongs to the bin above an edge, 1 to the last. */
function shareIn({ low, high }: TransformInterval, bin: number, bins: number): number {
  const [from, to] = [bin / bins, (bin + 1) / bins];
  if (low === high) return low >= from && (low < to || bin === bins - 1) ? 1 : 0;
  return Math.max(0, Math.min(high, to) - Math.max(low, from)) / (high - low);
}
