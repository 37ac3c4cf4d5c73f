import { requireProbability } from '@/journal/scoring/hit-count';

/**
 * Which of many tests stand out when they are looked at together: among those picked, the expected share of false finds is at most
 * `rate`.
 * @param pValues each 0 to 1; may be none. @param rate 0 to 1.
 * @returns one flag a test, in their order.
 * @throws {DomainError} `probability-invalid`.
 * @see Benjamini and Hochberg (1995), J. Royal Statistical Society B 57(1), 289-300 (independent tests).
 */
export function standOut(pValues: readonly number[], rate = 0.05): boolean[] {
  requireProbability(rate);
  pValues.forEach(requireProbability);
  const sorted = [...pValues].sort((one, other) => one - other);
  const last = sorted.findLastIndex((pValue, index) => pValue <= (rate * (index + 1)) / sorted.length);
  const limit = sorted[last];
  return pValues.map((pValue) => limit !== undefined && pValue <= limit);
}
