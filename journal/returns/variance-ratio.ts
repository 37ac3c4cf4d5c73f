import { normalQuantile, normalUpperTail } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';
import { centredSample } from '@/journal/returns/centred-sample';
import { exactSum } from '@/journal/returns/exact-sum';
import { overlappingVariance, requireHorizon } from '@/journal/returns/overlapping-variance';

export interface VarianceRatio {
  readonly sessions: number;
  /** Variance over q sessions by q times that of one: 1 when returns are uncorrelated. */
  readonly ratio: number;
  /** (ratio − 1) by its standard error when returns are independent and equally spread. */
  readonly plainZ: number;
  /** The same with a standard error that allows for changing volatility; null where the sample gives none. */
  readonly robustZ: number | null;
  /** Two-sided, of `robustZ`. */
  readonly pValue: number | null;
  /** Interval of the ratio by the robust standard error, low not below 0; null with it. */
  readonly interval: { readonly low: number; readonly high: number } | null;
  /** Whether the interval leaves 1 out: scaling with the square root of time is in doubt. */
  readonly isWarning: boolean;
  /** How far from 1 a ratio must lie to be noticed with so many returns. */
  readonly leastNoticed: number;
}

/**
 * Whether volatility grows with the square root of time: the variance of q-session returns against q times that of one-session returns.
 * A light to warn by, never a correction: its power is poor with a few hundred returns.
 * @param returns log returns of a magnitude up to 1e150, at least q + 1, not all the same.
 * @param question.sessions q, a whole number from 2; `confidence` strictly between 0 and 1.
 * @throws {DomainError} `horizon-invalid`, `too-few-returns`, `value-invalid`, `returns-without-spread`, `confidence-out-of-range`.
 * @see Lo and MacKinlay (1988), Review of Financial Studies 1(1), 41-66: overlapping, unbiased variances; robust z* with
 *   θ = Σ[2(q − j)/q]²·δ(j), δ(j) = T·Σd(t)²d(t − j)²/(Σd²)².
 */
export function varianceRatio(
  returns: readonly number[],
  { sessions, confidence = 0.95 }: { readonly sessions: number; readonly confidence?: number },
): VarianceRatio {
  requireHorizon(sessions, 2);
  const upper = (1 + confidence) / 2;
  if (!(confidence > 0 && upper < 1)) throw new DomainError('confidence-out-of-range', { confidence });
  const ratio = overlappingVariance(returns, sessions) / spreadOf(returns);
  const count = returns.length;
  const plainError = Math.sqrt((2 * (2 * sessions - 1) * (sessions - 1)) / (3 * sessions * count));
  const robustError = Math.sqrt(robustVariance(returns, sessions) / count);
  const deviations = normalQuantile(upper);
  const hasError = robustError > 0;
  const interval = hasError
    ? { low: Math.max(0, ratio - deviations * robustError), high: ratio + deviations * robustError }
    : null;
  const robustZ = hasError ? (ratio - 1) / robustError : null;
  return {
    sessions,
    ratio,
    plainZ: (ratio - 1) / plainError,
    robustZ,
    pValue: robustZ === null ? null : 2 * normalUpperTail(Math.abs(robustZ)),
    interval,
    isWarning: interval !== null && (interval.low > 1 || interval.high < 1),
    leastNoticed: deviations * plainError,
  };
}

function spreadOf(returns: readonly number[]): number {
  const variance = overlappingVariance(returns, 1);
  if (!(variance > 0)) throw new DomainError('returns-without-spread', { count: returns.length });
  return variance;
}

function robustVariance(returns: readonly number[], sessions: number): number {
  const { centred, squares: total } = centredSample(returns);
  const squares = centred.map((deviation) => deviation ** 2);
  const terms = Array.from({ length: sessions - 1 }, (_, at) => {
    const lag = at + 1;
    const products = squares.slice(lag).map((square, index) => (square / total) * ((squares[index] ?? 0) / total));
    return ((2 * (sessions - lag)) / sessions) ** 2 * returns.length * exactSum(products);
  });
  return exactSum(terms);
}

/**
 * The variance ratio that autocorrelations make: 1 + 2·Σ(1 − k/q)·ρ(k).
 * @param autocorrelations ρ(1), ρ(2), …, each from −1 to 1; those from lag q on count for nothing. @param sessions q, from 1.
 * @returns the ratio, above or below 1; below 0 only for autocorrelations that no series can have.
 * @throws {DomainError} `horizon-invalid`, `autocorrelation-out-of-range` with the lag.
 * @see Lo and MacKinlay (1988), Review of Financial Studies 1(1), 41-66.
 */
export function varianceRatioOfAutocorrelations(autocorrelations: readonly number[], sessions: number): number {
  requireHorizon(sessions, 1);
  const terms = autocorrelations.slice(0, sessions - 1).map((autocorrelation, at) => {
    if (!(Math.abs(autocorrelation) <= 1))
      throw new DomainError('autocorrelation-out-of-range', { lag: at + 1, autocorrelation });
    return 2 * (1 - (at + 1) / sessions) * autocorrelation;
  });
  return 1 + exactSum(terms);
}
