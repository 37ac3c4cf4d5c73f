import { normalQuantile } from '@/journal/distributions/normal-distribution';
import { sampleStatistics } from '@/journal/returns/sample-statistics';

export interface QuantilePair {
  /** Plotting position of the value, strictly between 0 and 1. */
  readonly probability: number;
  /** Quantile of the standard normal at the position, in deviations. */
  readonly deviations: number;
  /** What the value would be if the sample followed the normal with its own mean and deviation exactly. */
  readonly expected: number;
  readonly observed: number;
}

/** What is taken from the rank in the position (rank − a)/(n + 1 − 2a). */
const offsets = { hazen: 0.5, blom: 3 / 8 } as const;

/**
 * The values of a sample beside those of the normal law at the same places, smallest first: on a straight line when the law fits.
 * @param values at least 2, of a magnitude up to 1e308.
 * @param position hazen: (rank − 0.5)/n, the default; blom: (rank − 0.375)/(n + 0.25).
 * @throws {DomainError} `too-few-values`, `value-invalid`.
 * @see Hazen (1914), Transactions ASCE 77; Blom (1958), Statistical Estimates and Transformed Beta-Variables.
 */
export function quantilePairs(values: readonly number[], position: keyof typeof offsets = 'hazen'): QuantilePair[] {
  const { count, mean, standardDeviation } = sampleStatistics(values);
  const offset = offsets[position];
  return [...values]
    .sort((left, right) => left - right)
    .map((observed, at) => {
      const probability = (at + 1 - offset) / (count + 1 - 2 * offset);
      const deviations = normalQuantile(probability);
      return { probability, deviations, expected: mean + standardDeviation * deviations, observed };
    });
}
