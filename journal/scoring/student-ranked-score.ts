import jstat from 'jstat';
import { studentCumulative } from '@/journal/distributions/student-distribution';
import { DomainError } from '@/journal/errors/domain-error';

/**
 * Continuous ranked probability score of a forecast that follows Student's law, moved and stretched. In the outcome's own unit, 0 is
 * best.
 * @param forecast.location finite; `scale` above 0, finite (not the standard deviation); `degreesOfFreedom` from 1.01 to 1e6;
 *   `observed` finite; all but the degrees in one unit (say log return).
 * @throws {DomainError} `student-forecast-invalid`.
 * @see Jordan, Krüger and Lerch (2019), J. Statistical Software 90(12), appendix A.2 (Student's t).
 */
export function studentRankedScore(forecast: {
  readonly location: number;
  readonly scale: number;
  readonly degreesOfFreedom: number;
  readonly observed: number;
}): number {
  const { location, scale, degreesOfFreedom: degrees, observed } = forecast;
  const isValid =
    Number.isFinite(location) &&
    Number.isFinite(observed) &&
    scale > 0 &&
    scale < Infinity &&
    degrees >= 1.01 &&
    degrees <= 1e6;
  const z = (observed - location) / scale;
  if (!isValid || !(Math.abs(z) < 1e100)) throw new DomainError('student-forecast-invalid', { ...forecast });
  const { gammaln } = jstat.jStat;
  const logBeta = (half: number) => gammaln(0.5) + gammaln(half) - gammaln(half + 0.5);
  const density =
    Math.exp(-logBeta(degrees / 2) - ((degrees + 1) / 2) * Math.log1p((z * z) / degrees)) / Math.sqrt(degrees);
  const spread =
    ((2 * Math.sqrt(degrees)) / (degrees - 1)) * Math.exp(logBeta(degrees - 0.5) - 2 * logBeta(degrees / 2));
  const score =
    z * (2 * studentCumulative(z, degrees) - 1) + 2 * density * ((degrees + z * z) / (degrees - 1)) - spread;
  return scale * Math.max(score, 0);
}
