import { normalQuantile } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';
import { requireConfidence } from '@/journal/scoring/hit-count';

/**
 * Cases needed to know a frequency to within a margin, whatever it is.
 * @param margin half width of the interval, above 0 and below 0.5. @param confidence 0.95 by default.
 * @throws {DomainError} `margin-invalid`, `confidence-invalid`.
 * @see The normal interval at a frequency of one half; any text of statistics, common practice.
 */
export function casesForMargin(margin: number, confidence = 0.95): number {
  requireConfidence(confidence);
  if (!(margin > 0 && margin < 0.5)) throw new DomainError('margin-invalid', { margin });
  return Math.ceil((normalQuantile((1 + confidence) / 2) / (2 * margin)) ** 2);
}

export interface TestStrength {
  /** Two-sided level of the test, above 0 and below 1; 0.05 by default. */
  readonly level?: number;
  /** Chance to notice, above 0 and below 1; 0.8 by default. */
  readonly power?: number;
}

/**
 * Cases needed to tell a true frequency from a stated one.
 * @param stated, actual above 0 and below 1, not equal.
 * @throws {DomainError} `frequencies-invalid`, `confidence-invalid`.
 * @see One-sample test of a proportion, normal approximation: Fleiss, Levin and Paik (2003), Statistical Methods for Rates and
 *   Proportions, section 2.6 (from memory).
 */
export function casesToTellFrequency(
  { stated, actual }: { stated: number; actual: number },
  { level = 0.05, power = 0.8 }: TestStrength = {},
): number {
  requireConfidence(level);
  requireConfidence(power);
  const isValid = stated > 0 && stated < 1 && actual > 0 && actual < 1 && stated !== actual;
  if (!isValid) throw new DomainError('frequencies-invalid', { stated, actual });
  const reach =
    normalQuantile(1 - level / 2) * Math.sqrt(stated * (1 - stated)) +
    normalQuantile(power) * Math.sqrt(actual * (1 - actual));
  return Math.ceil((reach / (stated - actual)) ** 2);
}

/**
 * Cases needed to tell a mean from zero.
 * @param mean not 0, finite; any unit. @param standardDeviation of one case, in the same unit, above 0.
 * @throws {DomainError} `mean-invalid`, `confidence-invalid`.
 * @see One-sample z test; any text of statistics, common practice.
 */
export function casesToTellMean(
  { mean, standardDeviation }: { mean: number; standardDeviation: number },
  { level = 0.05, power = 0.8 }: TestStrength = {},
): number {
  requireConfidence(level);
  requireConfidence(power);
  const isValid = Number.isFinite(mean) && mean !== 0 && standardDeviation > 0 && standardDeviation < Infinity;
  if (!isValid) throw new DomainError('mean-invalid', { mean, standardDeviation });
  return Math.ceil((((normalQuantile(1 - level / 2) + normalQuantile(power)) * standardDeviation) / mean) ** 2);
}
