import { normalCumulative } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';

export interface RealisedMoveQuestion {
  /** Price at the start of the hold, above 0. */
  readonly startPrice: number;
  /** Price at its end, above 0, on the same basis (splits adjusted). */
  readonly endPrice: number;
  /** The forecast's standard deviation of one session's log return, a fraction above 0. */
  readonly dailyVolatility: number;
  /** Sessions of the hold, above 0, fractions allowed. */
  readonly sessions: number;
  /** The forecast's mean of the log price change over the hold. */
  readonly logDrift: number;
}

export interface RealisedMove {
  /** ln(end / start). */
  readonly logReturn: number;
  /** The log return in standard deviations of the hold; no drift is taken off. */
  readonly inSigmas: number;
  /** Place of the end price in the forecast's lognormal distribution, with its drift, 0 to 1. */
  readonly percentile: number;
}

/**
 * Sets the move that came against the one that was forecast.
 * @throws {DomainError} `realised-move-invalid` with the inputs.
 * @see The probability integral transform of Dawid (1984), J. Royal Statistical Society A 147(2), 278-292, for the percentile.
 */
export function realisedMove(question: RealisedMoveQuestion): RealisedMove {
  const { startPrice, endPrice, dailyVolatility, sessions, logDrift } = question;
  const arePositive = [startPrice, endPrice, dailyVolatility, sessions].every((value) => value > 0 && value < Infinity);
  if (!(arePositive && Number.isFinite(logDrift))) throw new DomainError('realised-move-invalid', { ...question });
  const totalDeviation = dailyVolatility * Math.sqrt(sessions);
  const logReturn = Math.log(endPrice / startPrice);
  return {
    logReturn,
    inSigmas: logReturn / totalDeviation,
    percentile: normalCumulative((logReturn - logDrift) / totalDeviation),
  };
}
