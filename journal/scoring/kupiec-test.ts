import { chiSquareQuantile } from '@/journal/distributions/chi-square-distribution';
import { normalUpperTail } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';
import { requireConfidence, requireHits } from '@/journal/scoring/hit-count';

interface StatedShare {
  /** Whole number from 1. */
  readonly count: number;
  /** Stated coverage or exceedance probability, above 0 and below 1. */
  readonly stated: number;
}

/**
 * Likelihood-ratio test of a stated coverage (proportion of failures).
 * @param hits whole number from 0 to count.
 * @returns likelihoodRatio 0 or more; pValue from the chi-square distribution with 1 degree of freedom.
 * @throws {DomainError} `hit-count-invalid`, `probability-invalid`.
 * @see Kupiec (1995), J. Derivatives 3(2), 73-84.
 */
export function kupiecTest({ hits, count, stated }: StatedShare & { hits: number }): {
  likelihoodRatio: number;
  pValue: number;
} {
  requireHits({ hits, count });
  if (!(stated > 0 && stated < 1)) throw new DomainError('probability-invalid', { probability: stated });
  const share = hits / count;
  const term = (cases: number, seen: number, said: number) => (cases === 0 ? 0 : cases * Math.log(seen / said));
  const likelihoodRatio = Math.max(0, 2 * (term(hits, share, stated) + term(count - hits, 1 - share, 1 - stated)));
  return { likelihoodRatio, pValue: 2 * normalUpperTail(Math.sqrt(likelihoodRatio)) };
}

/**
 * The counts of hits with which the test does not reject the stated coverage.
 * @param confidence above 0 and below 1; 0.95 by default.
 * @returns lowest and highest such count, both included; null when there is none.
 * @throws {DomainError} `hit-count-invalid`, `probability-invalid`, `confidence-invalid`.
 */
export function kupiecAcceptedHits({ count, stated, confidence = 0.95 }: StatedShare & { confidence?: number }): {
  lowest: number;
  highest: number;
} | null {
  requireConfidence(confidence);
  requireHits({ hits: 0, count });
  const critical = chiSquareQuantile(confidence, 1);
  const accepted = Array.from({ length: count + 1 }, (_, hits) => hits).filter(
    (hits) => kupiecTest({ hits, count, stated }).likelihoodRatio <= critical,
  );
  const [lowest, highest] = [accepted[0], accepted.at(-1)];
  return lowest === undefined || highest === undefined ? null : { lowest, highest };
}
