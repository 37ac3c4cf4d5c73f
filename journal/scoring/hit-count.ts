import { DomainError } from '@/journal/errors/domain-error';

/**
 * Checks a count of hits among a count of cases.
 * @throws {DomainError} `hit-count-invalid`.
 */
export function requireHits({ hits, count }: { hits: number; count: number }): void {
  const isValid = Number.isInteger(hits) && Number.isInteger(count) && count >= 1 && hits >= 0 && hits <= count;
  if (!isValid) throw new DomainError('hit-count-invalid', { hits, count });
}

/**
 * Checks a confidence: strictly between 0 and 1.
 * @throws {DomainError} `confidence-invalid`.
 */
export function requireConfidence(confidence: number): void {
  if (!(confidence > 0 && confidence < 1)) throw new DomainError('confidence-invalid', { confidence });
}

/**
 * Checks a probability that is compared with a frequency: 0 to 1.
 * @throws {DomainError} `probability-invalid`.
 */
export function requireProbability(probability: number): void {
  if (!(probability >= 0 && probability <= 1)) throw new DomainError('probability-invalid', { probability });
}
