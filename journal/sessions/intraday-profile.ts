import { DomainError } from '@/journal/errors/domain-error';

/** Variance of the open hours by equal parts of them, first to last, in any unit: only the proportions count. */
export interface IntradayProfile {
  readonly weights: readonly number[];
}

/**
 * A session busy at its ends: thirteen half hours. The shape, high after the open, low at midday, rising to the close, is that of
 * Wood, McInish and Ord (1985), J. Finance 40, and Andersen and Bollerslev (1997), J. Empirical Finance 4; the numbers are round ones
 * from memory of it, no published table.
 */
export const uShapedProfile: IntradayProfile = { weights: [20, 12, 9, 7, 6, 5, 5, 5, 5, 6, 6, 7, 10] };

/** @throws {DomainError} `intraday-profile-invalid` unless 1 to 1,440 weights from 0 to 1e9 make a sum of at least 1e-9. */
export function checkIntradayProfile({ weights }: IntradayProfile): void {
  const isValid =
    weights.length >= 1 && weights.length <= 1440 && weights.every((weight) => weight >= 0 && weight <= 1e9);
  const sum = isValid ? sumOf(weights) : 0;
  if (!(sum >= 1e-9)) throw new DomainError('intraday-profile-invalid', { parts: weights.length });
}

/**
 * Share of the open hours' variance spent when a share of their time has passed.
 * @param elapsed 0 to 1. @returns 0 to 1; straight within a part.
 */
export function varianceShareAt({ weights }: IntradayProfile, elapsed: number): number {
  if (elapsed >= 1) return 1;
  const place = Math.max(0, elapsed) * weights.length;
  const part = Math.floor(place);
  return (sumOf(weights.slice(0, part)) + (weights[part] ?? 0) * (place - part)) / sumOf(weights);
}

/**
 * The other way: share of time passed when a share of the variance is spent, the earliest there is.
 * @param spent 0 to 1. @returns 0 to 1.
 */
export function elapsedShareAt({ weights }: IntradayProfile, spent: number): number {
  let left = spent * sumOf(weights);
  for (const [part, weight] of weights.entries()) {
    if (left <= weight)
      return weight > 0 ? (part + Math.max(0, left) / weight) / weights.length : part / weights.length;
    left -= weight;
  }
  return 1;
}

function sumOf(weights: readonly number[]): number {
  return weights.reduce((sum, weight) => sum + weight, 0);
}
