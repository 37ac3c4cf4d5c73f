import { DomainError } from '@/journal/errors/domain-error';
import { varianceRatioQuantile } from '@/journal/outcome/variance-ratio-quantile';
import { type ClusteredMean } from '@/journal/scoring/clustered-mean';
import { requireConfidence } from '@/journal/scoring/hit-count';

/** More degrees than this change nothing in the first nine digits. */
const MOST_DEGREES = 1e6;

/**
 * Interval of a mean whose cases may move together, from its clustered standard error and Student's t with clusters - 1 degrees.
 * @param estimate of clusteredMean or comparePaired. @param confidence above 0 and below 1; 0.95 by default.
 * @returns in the unit of the values; null where there is no standard error (a single cluster).
 * @throws {DomainError} `confidence-invalid`, `value-out-of-range` for a standard error below 0.
 * @see Student's t by the square root of F with 1 degree on top; any text of statistics. Liang and Zeger (1986) for the error.
 */
export function clusteredMeanInterval(
  { mean, standardError, clusterCount }: Pick<ClusteredMean, 'mean' | 'standardError' | 'clusterCount'>,
  confidence = 0.95,
): { low: number; high: number } | null {
  requireConfidence(confidence);
  if (standardError === null || clusterCount < 2) return null;
  if (!(standardError >= 0)) throw new DomainError('value-out-of-range', { standardError });
  const ratio = varianceRatioQuantile({
    probability: confidence,
    numeratorDegrees: 1,
    denominatorDegrees: Math.min(MOST_DEGREES, clusterCount - 1),
  });
  const halfWidth = Math.sqrt(ratio) * standardError;
  return { low: mean - halfWidth, high: mean + halfWidth };
}
