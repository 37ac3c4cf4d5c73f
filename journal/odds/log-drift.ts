import { DomainError } from '@/journal/errors/domain-error';

/** What the underlying is expected to do, stated beside every odds figure. */
export type Drift =
  /** The expected price is today's price: the default for a trader's own odds. */
  | { readonly kind: 'zeroReturn' }
  /** The expected price is the forward price: always used for prices. */
  | { readonly kind: 'riskNeutral' }
  /** ln(E[S]/S) per session, the trader's own view. */
  | { readonly kind: 'ownView'; readonly expectedLogReturnPerSession: number };

export interface LogDriftQuestion {
  readonly drift: Drift;
  /** Variance of the log price over the period, 0 or more. */
  readonly totalVariance: number;
  readonly sessions: number;
  readonly years: number;
  readonly ratePerYear: number;
  readonly dividendYield: number;
}

/**
 * Mean of ln(S_T/S) over a period under a stated drift.
 * @returns zero return −w/2; risk-neutral (r − q)·years − w/2; own view m·sessions − w/2, with w the total variance.
 * @throws {DomainError} `drift-invalid` when a number is not finite or the variance is negative.
 * @see Harrison and Kreps (1979), J. Economic Theory 20, for the risk-neutral case; the others by Jensen's correction.
 */
export function logDrift({
  drift,
  totalVariance,
  sessions,
  years,
  ratePerYear,
  dividendYield,
}: LogDriftQuestion): number {
  const expected =
    drift.kind === 'zeroReturn'
      ? 0
      : drift.kind === 'riskNeutral'
        ? (ratePerYear - dividendYield) * years
        : drift.expectedLogReturnPerSession * sessions;
  const isValid = totalVariance >= 0 && Math.abs(expected) < Infinity && totalVariance < Infinity;
  if (!isValid) throw new DomainError('drift-invalid', { kind: drift.kind, totalVariance, expected });
  return expected - totalVariance / 2;
}
