import jstat from 'jstat';
import { normalQuantile } from '@/journal/distributions/normal-distribution';
import { searchQuantile } from '@/journal/distributions/quantile-search';
import { DomainError } from '@/journal/errors/domain-error';

const MANY_DEGREES = 1e6;

/**
 * Distribution function of chi-square.
 * @param x 0 or more.
 * @param degreesOfFreedom above 0, fractions allowed.
 * @throws {DomainError} `degrees-of-freedom-invalid`.
 * @see regularised incomplete gamma function of jstat.
 */
export function chiSquareCumulative(x: number, degreesOfFreedom: number): number {
  checkDegrees(degreesOfFreedom);
  return x <= 0 ? 0 : jstat.jStat.lowRegGamma(degreesOfFreedom / 2, x / 2);
}

/**
 * Quantile of chi-square.
 * @param probability strictly between 0 and 1, from below.
 * @param degreesOfFreedom above 0, fractions allowed.
 * @returns the value, relative accuracy about 1e-12.
 * @see inversion of the distribution function; past a million degrees, where that takes long, the expansion of Fisher and Cornish
 *   (1960), Technometrics 2(2), 209-225, whose next term is below 1e-13 of the value there.
 * @throws {DomainError} `probability-out-of-range`, `degrees-of-freedom-invalid`.
 */
export function chiSquareQuantile(probability: number, degreesOfFreedom: number): number {
  checkDegrees(degreesOfFreedom);
  if (degreesOfFreedom > MANY_DEGREES) return expandedQuantile(normalQuantile(probability), degreesOfFreedom);
  return searchQuantile({
    probability,
    cumulative: (x) => chiSquareCumulative(x, degreesOfFreedom),
    density: (x) => jstat.jStat.chisquare.pdf(x, degreesOfFreedom),
    start: degreesOfFreedom,
    least: 0,
    most: degreesOfFreedom + 100 * Math.sqrt(degreesOfFreedom) + 100,
  });
}

function expandedQuantile(z: number, degreesOfFreedom: number): number {
  const root = Math.sqrt(2 * degreesOfFreedom);
  const third = (z ** 3 - 7 * z) / (9 * root);
  const fourth = (6 * z ** 4 + 14 * z ** 2 - 32) / (405 * degreesOfFreedom);
  return degreesOfFreedom + root * z + (2 / 3) * (z ** 2 - 1) + third - fourth;
}

function checkDegrees(degreesOfFreedom: number): void {
  const isValid = degreesOfFreedom > 0 && degreesOfFreedom < Infinity;
  if (!isValid) throw new DomainError('degrees-of-freedom-invalid', { degreesOfFreedom });
}
