import { chiSquareCumulative } from '@/journal/distributions/chi-square-distribution';
import { type KolmogorovSmirnov, kolmogorovSmirnovTest } from '@/journal/scoring/kolmogorov-smirnov';
import { inTenBins } from '@/journal/scoring/ten-bins';

export interface TransformUniformity {
  readonly count: number;
  readonly kolmogorovSmirnov: KolmogorovSmirnov;
  /** How many outcomes fell in each tenth of their forecast distribution. */
  readonly binCounts: readonly number[];
  /** Against equal counts in ten bins, 9 degrees of freedom; rough below about 50 outcomes (fewer than 5 expected in a bin). */
  readonly chiSquare: { readonly statistic: number; readonly pValue: number };
}

/**
 * Tests whether outcomes fell evenly over their forecast distributions, as they do when forecasts are calibrated.
 * @param places each outcome's place in its own forecast distribution, 0 to 1, at least one; taken as independent.
 * @throws {DomainError} `values-missing`, `probability-invalid` with the index.
 * @see Dawid (1984), J. Royal Statistical Society A 147(2), 278-292; Diebold, Gunther and Tay (1998), International Economic Review
 *   39(4), 863-883.
 */
export function transformUniformity(places: readonly number[]): TransformUniformity {
  const kolmogorovSmirnov = kolmogorovSmirnovTest(places);
  const binCounts = inTenBins(places, (place) => place).map((members) => members.length);
  const expected = places.length / binCounts.length;
  const statistic = binCounts.reduce((sum, count) => sum + (count - expected) ** 2 / expected, 0);
  return {
    count: places.length,
    kolmogorovSmirnov,
    binCounts,
    chiSquare: { statistic, pValue: 1 - chiSquareCumulative(statistic, binCounts.length - 1) },
  };
}
