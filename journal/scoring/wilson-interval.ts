import { normalQuantile } from '@/journal/distributions/normal-distribution';
import { requireConfidence, requireHits } from '@/journal/scoring/hit-count';

/**
 * Interval for a frequency that behaves at small counts and never leaves 0 to 1.
 * @param hits whole number from 0 to count. @param count whole number from 1.
 * @param confidence above 0 and below 1; 0.95 by default.
 * @throws {DomainError} `hit-count-invalid`, `confidence-invalid`.
 * @see Wilson (1927), J. American Statistical Association 22, 209-212; recommended by Brown, Cai and DasGupta (2001), Statistical
 *   Science 16(2), 101-133. Without continuity correction.
 */
export function wilsonInterval({
  hits,
  count,
  confidence = 0.95,
}: {
  hits: number;
  count: number;
  confidence?: number;
}): {
  low: number;
  high: number;
} {
  requireHits({ hits, count });
  requireConfidence(confidence);
  const z = normalQuantile((1 + confidence) / 2);
  const share = hits / count;
  const centre = share + z ** 2 / (2 * count);
  const halfWidth = z * Math.sqrt((share * (1 - share)) / count + z ** 2 / (4 * count ** 2));
  const scale = 1 + z ** 2 / count;
  return {
    low: hits === 0 ? 0 : (centre - halfWidth) / scale,
    high: hits === count ? 1 : (centre + halfWidth) / scale,
  };
}
