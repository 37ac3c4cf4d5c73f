import { centredSample, requireMagnitude } from '@/journal/returns/centred-sample';
import { quantile } from '@/journal/returns/quantile';

export interface Histogram {
  /** The rule the width came from; `single` when all values are the same. */
  readonly rule: 'freedman-diaconis' | 'scott' | 'single';
  /** One more than there are bins, rising; bins are equal, from the least value to the largest. */
  readonly edges: readonly number[];
  /** Values in each bin; a value on an inner edge counts in the bin above it. */
  readonly counts: readonly number[];
}

/** Far outliers beside a narrow middle would ask for more bins than anyone can read. */
const MOST_BINS = 200;
/** Twice this is still a double. */
const LARGEST_VALUE = 8e307;

/**
 * Histogram with bins of a width that the sample itself asks for: 2·IQR/∛n, or 3.49·s/∛n where the quartiles are the same (or asked
 * for); then shrunk so that a whole number of bins spans the values, at most 200.
 * @param values at least 2, of a magnitude up to 8e307.
 * @throws {DomainError} `too-few-values`, `value-invalid`.
 * @see Freedman and Diaconis (1981), Zeitschrift für Wahrscheinlichkeitstheorie 57, 453-476, quartiles of type 7; Scott (1979),
 *   Biometrika 66(3), 605-610, with s of n − 1.
 */
export function histogram(
  values: readonly number[],
  rule: 'freedman-diaconis' | 'scott' = 'freedman-diaconis',
): Histogram {
  const { count, unit, squares } = centredSample(values);
  requireMagnitude(values, LARGEST_VALUE);
  const least = quantile(values, 0);
  const most = quantile(values, 1);
  if (least === most) return { rule: 'single', edges: [least, most], counts: [count] };
  const standardDeviation = Math.sqrt(squares / (count - 1)) * unit;
  const quartileWidth =
    rule === 'scott' ? 0 : (2 * (quantile(values, 0.75) - quantile(values, 0.25))) / Math.cbrt(count);
  const used = quartileWidth > 0 ? 'freedman-diaconis' : 'scott';
  const width =
    quartileWidth > 0 ? quartileWidth : (Math.cbrt(24 * Math.sqrt(Math.PI)) * standardDeviation) / Math.cbrt(count);
  const range = most - least;
  const bins = Math.min(MOST_BINS, Math.max(1, Math.ceil(range / width)));
  const edges = Array.from({ length: bins + 1 }, (_, at) => (at === bins ? most : least + range * (at / bins)));
  return { rule: used, edges, counts: countBetween(values, edges) };
}

/** Values from each edge to the next; the last bin holds the last edge too. */
function countBetween(values: readonly number[], edges: readonly number[]): number[] {
  const bins = edges.length - 1;
  const [least = 0, most = 0] = [edges[0], edges[bins]];
  const counts = new Array<number>(bins).fill(0);
  for (const value of values) {
    // The quotient may round to the bin beside; the edges decide.
    let bin = Math.min(bins - 1, Math.floor(((value - least) / (most - least)) * bins));
    if (bin > 0 && value < (edges[bin] ?? least)) bin -= 1;
    else if (bin < bins - 1 && value >= (edges[bin + 1] ?? most)) bin += 1;
    counts[bin] = (counts[bin] ?? 0) + 1;
  }
  return counts;
}
