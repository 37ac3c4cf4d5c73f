import { logReturns } from '@/journal/returns/log-returns';
import { overlappingVariance, requireHorizon } from '@/journal/returns/overlapping-variance';
import { DomainError } from '@/journal/errors/domain-error';
import { type PlaceInOwnYear, placeAmong, SESSIONS_IN_A_YEAR } from '@/journal/volatility/place-in-own-year';

export interface HorizonVolatility {
  /** The horizon q. */
  readonly sessions: number;
  /** Standard deviation of the log return over q sessions, from all overlapping ones of the window. */
  readonly deviation: number;
  /** What the square root of time makes of the one-session deviation of the same window. */
  readonly squareRootOfTime: number;
  /** (deviation / squareRootOfTime)²; 1 by convention where there is no spread at all. */
  readonly varianceRatio: number;
  /** The deviation among those of the windows that ended in the past year; null with fewer than 20. */
  readonly past: PlaceInOwnYear | null;
}

/** The horizons shown side by side, in sessions. */
export const defaultHorizons: readonly number[] = [1, 2, 3, 5, 10, 21];

/**
 * Volatility over several horizons beside the line of the square root of time, each with its place among its own past values.
 * @param closes oldest first, adjusted for splits and dividends; more than `window`.
 * @param options.horizons whole numbers of sessions from 1, each below the window; `window` returns an estimate rests on, from 2.
 * @returns one a horizon, in their order. With 252 + window closes the past year is whole; with fewer, as far as they go.
 * @throws {DomainError} `horizon-invalid`, `too-few-returns`, `close-invalid`.
 * @see overlapping returns with the correction of Lo and MacKinlay (1988), Review of Financial Studies 1(1); percentiles of the past
 *   by horizon: Burghardt and Lane (1990), J. Portfolio Management 16(2), 15-19, from memory.
 */
export function volatilityByHorizon(
  closes: readonly number[],
  { horizons = defaultHorizons, window = 63 }: { readonly horizons?: readonly number[]; readonly window?: number } = {},
): HorizonVolatility[] {
  for (const sessions of horizons) requireHorizon(sessions, 1);
  const required = Math.max(2, window, ...horizons.map((sessions) => sessions + 1));
  if (!(required === window && Number.isSafeInteger(window)))
    throw new DomainError('window-invalid', { window, least: required });
  if (closes.length <= window)
    throw new DomainError('too-few-returns', { required: window, received: Math.max(0, closes.length - 1) });
  const returns = logReturns(closes.slice(-(SESSIONS_IN_A_YEAR + window)));
  const latest = returns.slice(-window);
  return horizons.map((sessions) => {
    const deviationOf = (some: readonly number[], horizon: number) =>
      Math.sqrt(horizon * overlappingVariance(some, horizon));
    const past: number[] = [];
    for (let end = window; end <= returns.length; end += 1)
      past.push(deviationOf(returns.slice(end - window, end), sessions));
    const deviation = deviationOf(latest, sessions);
    const squareRootOfTime = deviationOf(latest, 1) * Math.sqrt(sessions);
    return {
      sessions,
      deviation,
      squareRootOfTime,
      varianceRatio: squareRootOfTime > 0 ? (deviation / squareRootOfTime) ** 2 : 1,
      past: placeAmong(past),
    };
  });
}
