import { DomainError } from '@/journal/errors/domain-error';

/**
 * Empirical quantile by linear interpolation between order statistics.
 * @param values at least one finite number, in any order.
 * @param probability 0 to 1.
 * @returns a value from the least to the largest.
 * @throws {DomainError} `too-few-values`, `probability-out-of-range`, or `value-invalid` with the index.
 * @see Hyndman and Fan (1996), American Statistician 50, type 7.
 */
export function quantile(values: readonly number[], probability: number): number {
  if (values.length === 0) throw new DomainError('too-few-values', { required: 1, received: 0 });
  if (!(probability >= 0 && probability <= 1)) throw new DomainError('probability-out-of-range', { probability });
  const invalid = values.findIndex((value) => !Number.isFinite(value));
  if (invalid >= 0) throw new DomainError('value-invalid', { index: invalid, value: values[invalid] ?? null });
  const sorted = [...values].sort((left, right) => left - right);
  const position = (sorted.length - 1) * probability;
  const below = Math.floor(position);
  const low = sorted[below] ?? Number.NaN;
  const high = sorted[Math.min(below + 1, sorted.length - 1)] ?? low;
  const weight = position - below;
  const between = low + weight * (high - low);
  // The distance of two huge values of unlike sign is past all doubles; their shares are not.
  return Number.isFinite(between) ? between : low * (1 - weight) + high * weight;
}
