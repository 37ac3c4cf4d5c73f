import { DomainError } from '@/journal/errors/domain-error';

/** Total implied variance of one expiry after an event. */
export interface ExpiryVariance {
  /** Squared total deviation, a fraction squared, 0 or more. */
  readonly totalVariance: number;
  /** Sessions to it, above 0. */
  readonly sessions: number;
}

/**
 * Variance of a hold with events in it: dailyVolatility²·sessions plus each event's own variance.
 * @param question.dailyVolatility without events, a fraction, 0 or more. @param question.sessions 0 or more.
 * @param question.eventDeviations deviation of each event's move, a fraction, 0 or more.
 * @returns variance of the log price, 0 or more.
 * @throws {DomainError} `hold-variance-invalid`, `event-deviation-invalid` with the index.
 * @see Dubinsky, Johannes, Kaeck and Seeger (2019), Review of Financial Studies 32; Patell and Wolfson (1979), J. Accounting and
 *   Economics 1. Takes events as independent of the base.
 */
export function holdVariance({
  dailyVolatility,
  sessions,
  eventDeviations,
}: {
  readonly dailyVolatility: number;
  readonly sessions: number;
  readonly eventDeviations: readonly number[];
}): number {
  let variance = dailyVolatility * dailyVolatility * sessions;
  if (!(dailyVolatility >= 0 && sessions >= 0 && variance < Infinity))
    throw new DomainError('hold-variance-invalid', { dailyVolatility, sessions });
  for (const [index, deviation] of eventDeviations.entries()) {
    variance += deviation * deviation;
    if (!(deviation >= 0 && variance < Infinity))
      throw new DomainError('event-deviation-invalid', { index, deviation });
  }
  return variance;
}

/**
 * Base volatility and event deviation that two expiries after the same event imply.
 * @param near the earlier expiry. @param far the later one.
 * @returns `dailyVolatility` and `eventDeviation`, fractions, 0 or more.
 * @throws {DomainError} `expiry-variance-invalid`, `expiries-out-of-order`; `base-variance-negative` when the later expiry holds less
 *   variance, `event-variance-negative` when the base leaves none for the event.
 * @see as holdVariance: base² = (w2 − w1)/(N2 − N1), event² = w1 − N1·base².
 */
export function eventFromTwoExpiries({ near, far }: { readonly near: ExpiryVariance; readonly far: ExpiryVariance }): {
  readonly dailyVolatility: number;
  readonly eventDeviation: number;
} {
  for (const { totalVariance, sessions } of [near, far]) {
    const isValid = totalVariance >= 0 && totalVariance < Infinity && sessions > 0 && sessions < Infinity;
    if (!isValid) throw new DomainError('expiry-variance-invalid', { totalVariance, sessions });
  }
  const between = far.sessions - near.sessions;
  if (!(between > 0)) throw new DomainError('expiries-out-of-order', { near: near.sessions, far: far.sessions });
  const base = (far.totalVariance - near.totalVariance) / between;
  if (!(base >= 0)) throw new DomainError('base-variance-negative', { baseVariance: base });
  const event = near.totalVariance - near.sessions * base;
  if (!(event >= 0)) throw new DomainError('event-variance-negative', { eventVariance: event });
  return { dailyVolatility: Math.sqrt(base), eventDeviation: Math.sqrt(event) };
}
