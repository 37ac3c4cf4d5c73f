import { normalCumulative, normalDensity } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';

/**
 * Continuous ranked probability score of a normal forecast: the Brier score summed over all thresholds. In the outcome's own unit,
 * 0 is best; for a forecast without spread it is the absolute error.
 * @param mean finite. @param standardDeviation above 0, finite. @param observed finite; all in one unit (say log return).
 * @throws {DomainError} `normal-forecast-invalid`.
 * @see Gneiting and Raftery (2007), J. American Statistical Association 102, 359-378, eq. 21 (with the sign that makes less better).
 */
export function normalRankedScore({
  mean,
  standardDeviation,
  observed,
}: {
  mean: number;
  standardDeviation: number;
  observed: number;
}): number {
  const isValid =
    Number.isFinite(mean) && Number.isFinite(observed) && standardDeviation > 0 && standardDeviation < Infinity;
  if (!isValid) throw new DomainError('normal-forecast-invalid', { mean, standardDeviation, observed });
  const z = (observed - mean) / standardDeviation;
  return standardDeviation * (z * (2 * normalCumulative(z) - 1) + 2 * normalDensity(z) - 1 / Math.sqrt(Math.PI));
}
