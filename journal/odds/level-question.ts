import { DomainError } from '@/journal/errors/domain-error';

/** A level of the underlying and the law of its log price over a period. */
export interface LevelQuestion {
  /** Above 0. */
  readonly spotPrice: number;
  /** Above 0. */
  readonly level: number;
  /** Standard deviation of the log price over the period, 0 to 1e100. */
  readonly totalDeviation: number;
  /** Mean of the log price change over the period, up to 1e100 in size. */
  readonly logDrift: number;
}

/** Far beyond any law of a price, and small enough that squares and their ratios stay finite. */
const LARGEST = 1e100;

/** @throws {DomainError} `level-question-invalid` naming every value. */
export function checkLevelQuestion({ spotPrice, level, totalDeviation, logDrift }: LevelQuestion): void {
  const isValid =
    spotPrice > 0 &&
    spotPrice < Infinity &&
    level > 0 &&
    level < Infinity &&
    totalDeviation >= 0 &&
    totalDeviation <= LARGEST &&
    Math.abs(logDrift) <= LARGEST;
  if (!isValid) throw new DomainError('level-question-invalid', { spotPrice, level, totalDeviation, logDrift });
}
