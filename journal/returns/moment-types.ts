import { DomainError } from '@/journal/errors/domain-error';

/** The three definitions of sample skewness and excess kurtosis in use. */
export interface MomentTypes {
  /** The moment ratio itself, m3 / m2^1.5 or m4 / m2² − 3. */
  readonly type1: number;
  /** Unbiased under normality; as most statistics packages and spreadsheets print it. */
  readonly type2: number;
  /** With the sample variance of denominator n − 1 in the moment ratio. */
  readonly type3: number;
}

/**
 * The other definitions of skewness from the first.
 * @param skewness type 1. @param count values in the sample, from 3.
 * @throws {DomainError} `too-few-values`.
 * @see Joanes and Gill (1998), The Statistician 47, 183-189.
 */
export function skewnessTypes(skewness: number, count: number): MomentTypes {
  if (!(count >= 3)) throw new DomainError('too-few-values', { required: 3, received: count });
  return {
    type1: skewness,
    type2: (skewness * Math.sqrt(count * (count - 1))) / (count - 2),
    type3: skewness * ((count - 1) / count) ** 1.5,
  };
}

/**
 * The other definitions of excess kurtosis from the first.
 * @param excessKurtosis type 1. @param count values in the sample, from 4.
 * @throws {DomainError} `too-few-values`.
 * @see Joanes and Gill (1998), The Statistician 47, 183-189.
 */
export function kurtosisTypes(excessKurtosis: number, count: number): MomentTypes {
  if (!(count >= 4)) throw new DomainError('too-few-values', { required: 4, received: count });
  return {
    type1: excessKurtosis,
    type2: (((count + 1) * excessKurtosis + 6) * (count - 1)) / ((count - 2) * (count - 3)),
    type3: (excessKurtosis + 3) * (1 - 1 / count) ** 2 - 3,
  };
}
