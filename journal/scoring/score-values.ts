import { DomainError } from '@/journal/errors/domain-error';

/** Far beyond any score or profit, and small enough that squares and their sums stay finite. */
const LARGEST = 1e100;

/**
 * Checks values that are averaged and squared: each from -1e100 to 1e100.
 * @throws {DomainError} `value-out-of-range` with the index; also for what is not a number.
 */
export function requireScoreValues(values: readonly number[]): void {
  for (const [index, value] of values.entries()) {
    if (!(Math.abs(value) <= LARGEST)) throw new DomainError('value-out-of-range', { index, value });
  }
}
