import { DomainError } from '@/journal/errors/domain-error';
import { exactSum } from '@/journal/returns/exact-sum';
import { scaleUnit } from '@/journal/returns/scale-unit';

const LARGEST_VALUE = 1e308;

/** A sample about its mean, in a unit in which sums of its powers neither over- nor underflow. */
export interface CentredSample {
  readonly count: number;
  readonly mean: number;
  /** A power of two, 1 for ordinary samples. */
  readonly unit: number;
  /** Deviations from the mean, in `unit`. */
  readonly centred: readonly number[];
  /** Sum of their squares, in `unit`². */
  readonly squares: number;
}

/**
 * Takes the mean out of a sample in two passes.
 * @param values at least 2 numbers of a magnitude up to 1e308.
 * @throws {DomainError} `too-few-values`, or `value-invalid` with the index.
 * @see Chan, Golub and LeVeque (1983), American Statistician 37, on two passes.
 */
export function centredSample(values: readonly number[]): CentredSample {
  const count = values.length;
  if (count < 2) throw new DomainError('too-few-values', { required: 2, received: count });
  requireMagnitude(values, LARGEST_VALUE);
  const unit = scaleUnit(values);
  const scaled = unit === 1 ? values : values.map((value) => value / unit);
  const mean = exactSum(scaled) / count;
  const deviations = scaled.map((value) => value - mean);
  // What rounding left in the mean shows as a mean of the deviations; taking it out is the corrected two-pass form.
  const residue = exactSum(deviations) / count;
  const centred = deviations.map((deviation) => deviation - residue);
  return { count, mean: (mean + residue) * unit, unit, centred, squares: sumOfPowers(centred, 2) };
}

export function sumOfPowers(values: readonly number[], power: number): number {
  return exactSum(values.map((value) => value ** power));
}

/**
 * Root of the mean square about 0.
 * @param values at least 1 number of a magnitude up to 1e308.
 * @throws {DomainError} `too-few-values`, or `value-invalid` with the index.
 */
export function rootMeanSquare(values: readonly number[]): number {
  if (values.length === 0) throw new DomainError('too-few-values', { required: 1, received: 0 });
  requireMagnitude(values, LARGEST_VALUE);
  const unit = scaleUnit(values);
  const scaled = unit === 1 ? values : values.map((value) => value / unit);
  return Math.sqrt(sumOfPowers(scaled, 2) / values.length) * unit;
}

/**
 * Checks that values are numbers of a magnitude up to `most`.
 * @throws {DomainError} `value-invalid` with the index.
 */
export function requireMagnitude(values: readonly number[], most: number): void {
  const index = values.findIndex((value) => !(Math.abs(value) <= most));
  if (index >= 0) throw new DomainError('value-invalid', { index, value: values[index] ?? null });
}
