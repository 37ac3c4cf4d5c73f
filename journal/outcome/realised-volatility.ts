import { DomainError } from '@/journal/errors/domain-error';
import { varianceRatioQuantile } from '@/journal/outcome/variance-ratio-quantile';
import { volatilityInterval } from '@/journal/volatility/volatility-interval';

/** One return of the hold. */
export interface WeightedReturn {
  readonly logReturn: number;
  /** Sessions the return covers, above 0: 1 for a full one, a part for a day entered or left midway, 0.6769 for an early close. */
  readonly sessions: number;
}

export interface RealisedVolatility {
  /** Fraction per session, 0 or more. */
  readonly dailyVolatility: number;
  /** Sum of the returns' sessions. */
  readonly sessions: number;
  /** Full returns that carry as much information: their number where all cover the same time, fewer where they do not. */
  readonly degreesOfFreedom: number;
  /** Interval of the volatility that stood behind it. */
  readonly low: number;
  readonly high: number;
  readonly confidence: number;
}

/**
 * Volatility that came over the hold: sqrt(sum of squared log returns / sum of sessions), with the mean taken as 0.
 * @param returns at least one. @param confidence above 0 and below 1; 0.95 by default.
 * @throws {DomainError} `returns-missing`, `return-invalid` with the index, `confidence-out-of-range`,
 *   `returns-overflow` when their sums leave the range of a double.
 * @see Common practice: over a short hold the mean is too poorly known to be taken off. The interval is that of chi-square, with
 *   (sum of weights)² / (sum of squared weights) degrees of freedom: Satterthwaite (1946), Biometrics Bulletin 2(6), 110-114; normal
 *   independent returns, and fat tails widen it.
 */
export function realisedVolatility(returns: readonly WeightedReturn[], confidence = 0.95): RealisedVolatility {
  if (returns.length === 0) throw new DomainError('returns-missing');
  let [squares, total, greatest] = [0, 0, 0];
  for (const [index, { logReturn, sessions }] of returns.entries()) {
    const isValid = Number.isFinite(logReturn) && sessions > 0 && sessions < Infinity;
    if (!isValid) throw new DomainError('return-invalid', { index, logReturn, sessions });
    squares += logReturn ** 2;
    total += sessions;
    greatest = Math.max(greatest, sessions);
  }
  const dailyVolatility = Math.sqrt(squares / total);
  const squaredShares = returns.reduce((sum, { sessions }) => sum + (sessions / greatest) ** 2, 0);
  const degreesOfFreedom = (total / greatest) ** 2 / squaredShares;
  if (!(Number.isFinite(dailyVolatility) && Number.isFinite(degreesOfFreedom)))
    throw new DomainError('returns-overflow');
  const interval = volatilityInterval({ dailyVolatility, degreesOfFreedom, confidence });
  return { dailyVolatility, sessions: total, degreesOfFreedom, ...interval, confidence };
}

/**
 * The range in which realised volatility / estimated volatility falls by chance alone when the true volatility never changed:
 * both are estimates, and their squared ratio follows the F distribution.
 * @param returnsRealised full returns of the hold, from 0.1; fractions allowed. @param degreesOfFreedom of the estimate (returns less one), from 0.1.
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
