/** How a daily volatility is estimated from closes. */
export type VolatilityMethod =
  /** The last `window` log returns, sample mean removed. */
  | { readonly kind: 'window'; readonly window: number }
  /** Exponentially weighted squared returns, zero mean. */
  | { readonly kind: 'ewma'; readonly lambda: number };

export interface VolatilityEstimate {
  readonly method: VolatilityMethod;
  /** Standard deviation of the log return of one session, a fraction. */
  readonly dailyVolatility: number;
  /** Mean log return that was removed; 0 for a zero-mean method. */
  readonly mean: number;
  /** Interval of the volatility at `confidence`. */
  readonly low: number;
  readonly high: number;
  readonly confidence: number;
  readonly degreesOfFreedom: number;
  readonly returnsUsed: number;
}
