import { DomainError } from '@/journal/errors/domain-error';
import { varianceRatioQuantile } from '@/journal/outcome/variance-ratio-quantile';

/** One return of the hold. */
export interface WeightedReturn {
  readonly logReturn: number;
  /** Sessions the return covers, above 0: 1 for a full one, a part for a day entered or left midway, 0.6769 for an early close. */
  readonly sessions: number;
}

/**
 * Volatility that came over the hold: sqrt(sum of squared log returns / sum of sessions), with the mean taken as 0.
 * @param returns at least one.
 * @returns dailyVolatility as a fraction per session, 0 or more; sessions, their sum.
 * @throws {DomainError} `returns-missing`, `return-invalid` with the index.
 * @see Common practice: over a short hold the mean is too poorly known to be taken off.
 */
export function realisedVolatility(returns: readonly WeightedReturn[]): { dailyVolatility: number; sessions: number } {
  if (returns.length === 0) throw new DomainError('returns-missing');
  let squares = 0;
  let total = 0;
  for (const [index, { logReturn, sessions }] of returns.entries()) {
    const isValid = Number.isFinite(logReturn) && sessions > 0 && sessions < Infinity;
    if (!isValid) throw new DomainError('return-invalid', { index, logReturn, sessions });
    squares += logReturn ** 2;
    total += sessions;
  }
  return { dailyVolatility: Math.sqrt(squares / total), sessions: total };
}

/**
 * The range in which realised volatility / estimated volatility falls by chance alone when the true volatility never changed:
 * both are estimates, and their squared ratio follows the F distribution.
 * @param returnsRealised number of returns of the hold, above 0. @param degreesOfFreedom of the estimate (returns less one), above 0.
 * @param confidence above 0 and below 1; 0.95 by default.
 * @throws {DomainError} `confidence-invalid`, `variance-ratio-invalid`.
 * @see The F ratio of two normal sample variances, any statistics text. Independent normal returns: fat tails widen it.
 */
export function volatilityRatioRange({
  returnsRealised,
  degreesOfFreedom,
  confidence = 0.95,
}: {
  returnsRealised: number;
  degreesOfFreedom: number;
  confidence?: number;
}): { low: number; high: number } {
  if (!(confidence > 0 && confidence < 1)) throw new DomainError('confidence-invalid', { confidence });
  const ratioAt = (probability: number) =>
    Math.sqrt(
      varianceRatioQuantile({ probability, numeratorDegrees: returnsRealised, denominatorDegrees: degreesOfFreedom }),
    );
  return { low: ratioAt((1 - confidence) / 2), high: ratioAt((1 + confidence) / 2) };
}
