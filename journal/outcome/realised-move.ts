import { normalCumulative } from '@/journal/distributions/normal-distribution';
import { studentCumulative } from '@/journal/distributions/student-distribution';
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
  /** Of the estimate of the volatility (returns less one where a mean was taken off), from 0.1 to 1e6; null when it is not an estimate. */
  readonly degreesOfFreedom?: number | null;
}

export interface RealisedMove {
  /** ln(end / start). */
  readonly logReturn: number;
  /** The log return in standard deviations of the hold; no drift is taken off. */
  readonly inSigmas: number;
  /** Place of the end price in the forecast's lognormal distribution, with its drift, 0 to 1. */
  readonly percentile: number;
  /** The same where the volatility is an estimate from few returns: in Student's t distribution. Null without degrees of freedom. */
  readonly studentPercentile: number | null;
}

/** With more, Student's distribution is the normal one to every digit shown. */
const MOST_DEGREES = 1e6;
const LEAST_DEGREES = 0.1;

/**
 * Sets the move that came against the one that was forecast.
 * @throws {DomainError} `realised-move-invalid` with the inputs, `degrees-of-freedom-invalid`.
 * @see The probability integral transform of Dawid (1984), J. Royal Statistical Society A 147(2), 278-292, for the percentile; Student's
 *   t for a deviation whose scale is estimated from normal returns, any statistics text.
 */
export function realisedMove(question: RealisedMoveQuestion): RealisedMove {
  const { startPrice, endPrice, dailyVolatility, sessions, logDrift, degreesOfFreedom = null } = question;
  const arePositive = [startPrice, endPrice, dailyVolatility, sessions].every((value) => value > 0 && value < Infinity);
  if (!(arePositive && Number.isFinite(logDrift))) throw new DomainError('realised-move-invalid', { ...question });
  const hasDegrees =
    degreesOfFreedom === null || (degreesOfFreedom >= LEAST_DEGREES && degreesOfFreedom <= MOST_DEGREES);
  if (!hasDegrees) throw new DomainError('degrees-of-freedom-invalid', { degreesOfFreedom });
  const totalDeviation = dailyVolatility * Math.sqrt(sessions);
  const logReturn = Math.log(endPrice / startPrice);
  const deviations = (logReturn - logDrift) / totalDeviation;
  // Prices or a volatility so extreme that their quotient leaves the range of a double.
  if (!(Number.isFinite(logReturn / totalDeviation) && Number.isFinite(deviations)))
    throw new DomainError('realised-move-invalid', { ...question });
  return {
    logReturn,
    inSigmas: logReturn / totalDeviation,
    percentile: normalCumulative(deviations),
    studentPercentile: degreesOfFreedom === null ? null : studentCumulative(deviations, degreesOfFreedom),
  };
}
