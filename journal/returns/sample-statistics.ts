import { DomainError } from '@/journal/errors/domain-error';
import { exactSum } from '@/journal/returns/exact-sum';
import { scaleUnit } from '@/journal/returns/scale-unit';

const LARGEST_VALUE = 1e308;

export interface SampleStatistics {
  readonly count: number;
  readonly mean: number;
  /** Sample mean removed, denominator n − 1. */
  readonly standardDeviation: number;
  /** Zero mean, denominator n. */
  readonly rootMeanSquare: number;
  /** Type 1: m3 / m2^1.5. */
  readonly skewness: number;
  /** Type 1: m4 / m2² − 3. */
  readonly excessKurtosis: number;
  readonly lagOneAutocorrelation: number;
  readonly jarqueBera: number;
  /** P(chi-square with 2 degrees > jarqueBera). */
  readonly jarqueBeraPValue: number;
}

/**
 * Summary of a sample in two passes: first the mean, then moments about it.
 * @param values at least 2 numbers of a magnitude up to 1e308.
 * @returns moments and the Jarque-Bera statistic; NaN never: a sample without spread has skewness, kurtosis and
 *   autocorrelation 0 by convention.
 * @throws {DomainError} `too-few-values`, or `value-invalid` with the index.
 * @see Chan, Golub and LeVeque (1983), American Statistician 37, on two passes; Jarque and Bera (1980), Economics Letters 6.
 */
export function sampleStatistics(values: readonly number[]): SampleStatistics {
  if (values.length < 2) throw new DomainError('too-few-values', { required: 2, received: values.length });
  const invalid = values.findIndex((value) => !(Math.abs(value) <= LARGEST_VALUE));
  if (invalid >= 0) throw new DomainError('value-invalid', { index: invalid, value: values[invalid] ?? null });

  const count = values.length;
  const unit = scaleUnit(values);
  const scaled = unit === 1 ? values : values.map((value) => value / unit);
  const mean = exactSum(scaled) / count;
  const deviations = scaled.map((value) => value - mean);
  // What rounding left in the mean shows as a mean of the deviations; taking it out is the corrected two-pass form.
  const residue = exactSum(deviations) / count;
  const centred = deviations.map((deviation) => deviation - residue);
  const powerSum = (power: number) => exactSum(centred.map((deviation) => deviation ** power));
  const squares = powerSum(2);
  const hasSpread = squares > 0;
  const secondMoment = squares / count;
  const skewness = hasSpread ? powerSum(3) / count / secondMoment ** 1.5 : 0;
  const excessKurtosis = hasSpread ? powerSum(4) / count / secondMoment ** 2 - 3 : 0;
  const neighbours = centred.slice(1).map((deviation, index) => deviation * (centred[index] ?? 0));
  const jarqueBera = (count / 6) * (skewness ** 2 + excessKurtosis ** 2 / 4);
  return {
    count,
    mean: (mean + residue) * unit,
    standardDeviation: Math.sqrt(squares / (count - 1)) * unit,
    rootMeanSquare: Math.sqrt(exactSum(scaled.map((value) => value ** 2)) / count) * unit,
    skewness,
    excessKurtosis,
    lagOneAutocorrelation: hasSpread ? exactSum(neighbours) / squares : 0,
    jarqueBera,
    jarqueBeraPValue: Math.exp(-jarqueBera / 2),
  };
}
