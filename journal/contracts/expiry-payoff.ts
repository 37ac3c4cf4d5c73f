import { DomainError } from '@/journal/errors/domain-error';

/** One straight piece of profit as a function of the underlying: value = intercept + slope·price on (from, to]. */
export interface PayoffSegment {
  readonly from: number;
  /** Infinity for the last one. */
  readonly to: number;
  readonly intercept: number;
  readonly slope: number;
}

export interface ExpiryPayoff {
  readonly segments: readonly PayoffSegment[];
  /** Prices where the profit crosses 0, lowest first. */
  readonly breakEvens: readonly number[];
  /** null: without limit. */
  readonly greatestGain: number | null;
  readonly greatestLoss: number | null;
}

interface PayoffQuestion {
  readonly legs: readonly {
    readonly type: 'call' | 'put';
    readonly strikePrice: number;
    readonly signedShares: number;
  }[];
  /** Shares held beside the options, negative when short; their cost belongs in `cost`. */
  readonly shares?: number;
  /** Everything paid to open, fees included, currency; negative when received. */
  readonly cost: number;
}

/**
 * Exact pay-off at expiry of options of one expiry, with shares: straight between strikes, so that its ends and break-evens
 * follow from the values at 0 and each strike and from the slope beyond the last.
 * @throws {DomainError} `payoff-input-invalid`.
 * @see Hull, Options, Futures, and Other Derivatives, chapter on trading strategies; common practice.
 */
export function expiryPayoff({ legs, shares = 0, cost }: PayoffQuestion): ExpiryPayoff {
  const isValid =
    Number.isFinite(cost) &&
    Number.isFinite(shares) &&
    legs.every((leg) => leg.strikePrice > 0 && leg.strikePrice < Infinity && Number.isFinite(leg.signedShares));
  if (!isValid) throw new DomainError('payoff-input-invalid', { cost, shares, legs: legs.length });
  const strikes = [...new Set(legs.map((leg) => leg.strikePrice))].sort((left, right) => left - right);
  const knots = [0, ...strikes];
  const segments = knots.map((from, index): PayoffSegment => {
    const to = knots[index + 1] ?? Infinity;
    let intercept = -cost;
    let slope = shares;
    for (const leg of legs) {
      const isInTheMoney = leg.type === 'call' ? leg.strikePrice <= from : leg.strikePrice >= to;
      if (!isInTheMoney) continue;
      const direction = leg.type === 'call' ? 1 : -1;
      slope += direction * leg.signedShares;
      intercept -= direction * leg.signedShares * leg.strikePrice;
    }
    return { from, to, intercept, slope };
  });
  // Amounts that overflow together would make the pay-off the difference of two infinities.
  const isWithin = segments.every(({ from, intercept, slope }) => Number.isFinite(intercept + slope * from));
  if (!isWithin) throw new DomainError('payoff-input-invalid', { cost, shares, legs: legs.length });
  const last = segments[segments.length - 1];
  const corners = segments.map((segment) => segment.intercept + segment.slope * segment.from);
  const finalSlope = last?.slope ?? 0;
  return {
    segments,
    breakEvens: breakEvensOf(segments),
    greatestGain: finalSlope > 0 ? null : Math.max(...corners),
    greatestLoss: finalSlope < 0 ? null : Math.min(...corners),
  };
}

/** Profit at one price of the underlying. */
export function payoffAt({ segments }: Pick<ExpiryPayoff, 'segments'>, price: number): number {
  const segment = segments.find(({ to }) => price <= to) ?? segments[segments.length - 1];
  return segment === undefined ? 0 : segment.intercept + segment.slope * price;
}

function breakEvensOf(segments: readonly PayoffSegment[]): number[] {
  const roots: number[] = [];
  for (const { from, to, intercept, slope } of segments) {
    if (slope === 0) continue;
    const root = -intercept / slope;
    const isNew = roots.length === 0 || Math.abs(root - (roots[roots.length - 1] ?? 0)) > 1e-9 * Math.max(1, root);
    if (root >= from && root <= to && root > 0 && isNew) roots.push(root);
  }
  return roots;
}
