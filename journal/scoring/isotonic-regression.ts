import { DomainError } from '@/journal/errors/domain-error';

export interface WeightedValue {
  readonly value: number;
  /** Above 0. */
  readonly weight: number;
}

/**
 * The non-decreasing sequence nearest to the values in weighted squares, by pooling adjacent violators.
 * @param values in the order of what they must not fall along.
 * @returns one fitted value for each.
 * @throws {DomainError} `weighted-value-invalid` with the index.
 * @see Ayer, Brunk, Ewing, Reid and Silverman (1955), Annals of Mathematical Statistics 26(4), 641-647.
 */
export function isotonicRegression(values: readonly WeightedValue[]): number[] {
  const pools: { mean: number; weight: number; size: number }[] = [];
  for (const [index, { value, weight }] of values.entries()) {
    const isValid = Number.isFinite(value) && weight > 0 && weight < Infinity;
    if (!isValid) throw new DomainError('weighted-value-invalid', { index, value, weight });
    let pool = { mean: value, weight, size: 1 };
    for (let last = pools.at(-1); last !== undefined && last.mean >= pool.mean; last = pools.at(-1)) {
      const joined = last.weight + pool.weight;
      const mean = (last.mean * last.weight + pool.mean * pool.weight) / joined;
      pool = { mean, weight: joined, size: last.size + pool.size };
      pools.pop();
    }
    pools.push(pool);
  }
  return pools.flatMap(({ mean, size }) => new Array<number>(size).fill(mean));
}
