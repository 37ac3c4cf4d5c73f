import { DomainError } from '@/journal/errors/domain-error';
import { type EwmaStart } from '@/journal/volatility/ewma-daily-volatility';

/** How a daily volatility is estimated from closes. */
export type CloseMethod =
  /** The last `window` log returns; with its mean removed and n − 1 (the default), or the mean taken as 0 and n. */
  | { readonly kind: 'close'; readonly window: number; readonly mean?: 'sample' | 'zero' }
  /** Exponentially weighted squared returns, zero mean; started at the first squared return unless stated. */
  | { readonly kind: 'ewma'; readonly lambda: number; readonly start?: EwmaStart };

/** How a daily volatility is estimated from the open, high, low and close of the last `window` sessions. */
export interface RangeMethod {
  readonly kind: 'parkinson' | 'garmanKlass' | 'rogersSatchell' | 'garmanKlassYangZhang' | 'yangZhang';
  readonly window: number;
}

export type VolatilityMethod = CloseMethod | RangeMethod;

export interface VolatilityEstimate<Method extends VolatilityMethod = VolatilityMethod> {
  readonly method: Method;
  /** Standard deviation of the log return of one session, a fraction; of its open-to-close part where the method covers no nights. */
  readonly dailyVolatility: number;
  /** Mean log return that was removed; 0 for a method that takes it as 0 or does not need it. */
  readonly mean: number;
  /** Interval of the volatility at `confidence`. */
  readonly low: number;
  readonly high: number;
  readonly confidence: number;
  /** As many independent normal returns of known mean would tell as much about the volatility. */
  readonly degreesOfFreedom: number;
  /** Returns, or sessions of a range method, that the estimate rests on. */
  readonly returnsUsed: number;
}

/**
 * Checks a window.
 * @throws {DomainError} `window-invalid` unless it is a whole number from 1.
 */
export function requireWindow(window: number): void {
  if (!(Number.isSafeInteger(window) && window >= 1)) throw new DomainError('window-invalid', { window });
}
