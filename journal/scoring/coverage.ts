import { binomialProbabilities } from '@/journal/scoring/event-count-distribution';
import { requireConfidence, requireHits, requireProbability } from '@/journal/scoring/hit-count';

/**
 * Chance, were the stated coverage true, of a count at most as likely as the one seen (exact two-sided binomial test).
 * @param hits whole number from 0 to count. @param count whole number from 1. @param stated stated coverage, 0 to 1.
 * @returns 0 to 1.
 * @throws {DomainError} `hit-count-invalid`, `probability-invalid`.
 * @see The form that sums all counts no more likely than the one seen (R's binom.test), not twice the smaller tail; common practice.
 */
export function exactCoverageTest({ hits, count, stated }: { hits: number; count: number; stated: number }): number {
  requireHits({ hits, count });
  requireProbability(stated);
  const probabilities = binomialProbabilities({ count, probability: stated });
  // Counts that are equally likely but for rounding belong to the sum.
  const limit = (probabilities[hits] ?? 0) * (1 + 1e-7);
  return Math.min(
    1,
    probabilities.reduce((sum, one) => (one <= limit ? sum + one : sum), 0),
  );
}

/**
 * Exact interval for a frequency: never covers less than it says, and so is wide.
 * @param hits whole number from 0 to count. @param count whole number from 1.
 * @param confidence above 0 and below 1; 0.95 by default.
 * @throws {DomainError} `hit-count-invalid`, `confidence-invalid`.
 * @see Clopper and Pearson (1934), Biometrika 26(4), 404-413.
 */
export function exactInterval({
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
  const tail = (1 - confidence) / 2;
  const atLeast = (least: number, probability: number) =>
    binomialProbabilities({ count, probability })
      .slice(least)
      .reduce((sum, one) => sum + one, 0);
  return {
    low: hits === 0 ? 0 : bisect((probability) => atLeast(hits, probability) >= tail),
    high: hits === count ? 1 : bisect((probability) => atLeast(hits + 1, probability) >= 1 - tail),
  };
}

/** The probability at which a claim that is false at 0 and true at 1 becomes true. */
function bisect(isReached: (probability: number) => boolean): number {
  let [low, high] = [0, 1];
  for (let middle = 0.5; middle > low && middle < high; middle = low + (high - low) / 2) {
    if (isReached(middle)) high = middle;
    else low = middle;
  }
  return high;
}
