import jstat from 'jstat';
import { searchQuantile } from '@/journal/distributions/quantile-search';
import { DomainError } from '@/journal/errors/domain-error';

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
 * @throws {DomainError} `probability-out-of-range`, `degrees-of-freedom-invalid`.
 */
export function chiSquareQuantile(probability: number, degreesOfFreedom: number): number {
  checkDegrees(degreesOfFreedom);
  return searchQuantile({
    probability,
    cumulative: (x) => chiSquareCumulative(x, degreesOfFreedom),
    density: (x) => jstat.jStat.chisquare.pdf(x, degreesOfFreedom),
    start: degreesOfFreedom,
    least: 0,
    most: degreesOfFreedom + 100 * Math.sqrt(degreesOfFreedom) + 100,
  });
}

function checkDegrees(degreesOfFreedom: number): void {
  const isValid = degreesOfFreedom > 0 && degreesOfFreedom < Infinity;
  if (!isValid) throw new DomainError('degrees-of-freedom-invalid', { degreesOfFreedom });
}
