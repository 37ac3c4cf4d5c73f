import { centredSample, rootMeanSquare, sumOfPowers } from '@/journal/returns/centred-sample';
import { exactSum } from '@/journal/returns/exact-sum';

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
  const { count, mean, unit, centred, squares } = centredSample(values);
  const hasSpread = squares > 0;
  const secondMoment = squares / count;
  const skewness = hasSpread ? sumOfPowers(centred, 3) / count / secondMoment ** 1.5 : 0;
  const excessKurtosis = hasSpread ? sumOfPowers(centred, 4) / count / secondMoment ** 2 - 3 : 0;
  const neighbours = centred.slice(1).map((deviation, index) => deviation * (centred[index] ?? 0));
  const jarqueBera = (count / 6) * (skewness ** 2 + excessKurtosis ** 2 / 4);
  return {
    count,
    mean,
    standardDeviation: Math.sqrt(squares / (count - 1)) * unit,
    rootMeanSquare: rootMeanSquare(values),
    skewness,
    excessKurtosis,
    lagOneAutocorrelation: hasSpread ? exactSum(neighbours) / squares : 0,
    jarqueBera,
    jarqueBeraPValue: Math.exp(-jarqueBera / 2),
  };
}
