import { DomainError } from '@/journal/errors/domain-error';

/**
 * Empirical quantile by linear interpolation between order statistics.
 * @param values at least one finite number, in any order.
 * @param probability 0 to 1.
 * @throws {DomainError} `too-few-values`, `probability-out-of-range`.
 * @see Hyndman and Fan (1996), American Statistician 50, type 7.
 */
export function quantile(values: readonly number[], probability: number): number {
  if (values.length === 0) throw new DomainError('too-few-values', { required: 1, received: 0 });
  if (!(probability >= 0 && probability <= 1)) throw new DomainError('probability-out-of-range', { probability });
  const sorted = [...values].sort((left, right) => left - right);
  const position = (sorted.length - 1) * probability;
  const below = Math.floor(position);
  const low = sorted[below] ?? Number.NaN;
  const high = sorted[Math.min(below + 1, sorted.length - 1)] ?? low;
  return low + (position - below) * (high - low);
}
