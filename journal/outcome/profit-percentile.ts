import { DomainError } from '@/journal/errors/domain-error';

/** A distribution of profit that may hold point masses (the greatest loss, the greatest gain). */
export interface ProfitCumulative {
  /** P(profit < amount), 0 to 1. */
  below(amount: number): number;
  /** P(profit <= amount), 0 to 1, not less than below(amount). */
  atOrBelow(amount: number): number;
}

/**
 * The place of a realised profit in its forecast distribution. On a point mass it is an interval as wide as the mass: the profit
 * says no more than that the outcome was somewhere in it.
 * @param profit realised, in the distribution's unit, finite.
 * @returns low <= middle <= high, each 0 to 1; low equals high where there is no point mass.
 * @throws {DomainError} `profit-not-finite`, `profit-distribution-invalid`.
 * @see Czado, Gneiting and Held (2009), Biometrics 65(4), 1254-1261: the interval, and its middle as the non-random version.
 */
export function profitPercentile({ profit, distribution }: { profit: number; distribution: ProfitCumulative }): {
  low: number;
  middle: number;
  high: number;
} {
  if (!Number.isFinite(profit)) throw new DomainError('profit-not-finite', { profit });
  const low = distribution.below(profit);
  const high = distribution.atOrBelow(profit);
  if (!(0 <= low && low <= high && high <= 1))
    throw new DomainError('profit-distribution-invalid', { profit, low, high });
  return { low, middle: (low + high) / 2, high };
}
