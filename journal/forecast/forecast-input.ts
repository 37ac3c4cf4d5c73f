import { type PlannedLeg } from '@/journal/contracts/planned-leg';
import { type Drift } from '@/journal/odds/log-drift';

/** What a forecast needs to know of the underlying. */
export interface ForecastUnderlying {
  readonly symbol: string;
  readonly style: 'european' | 'american';
  readonly settlement: 'cash' | 'physical';
  /** When the value that settles an expiring option is fixed: at the close, or from the openings of the last day. */
  readonly settlementTime: 'pm' | 'am';
  /** Decimal text, shares a contract. */
  readonly multiplier: string;
  /** Continuous, a fraction per calendar year. */
  readonly dividendYield: number;
}

/** The daily volatility a forecast rests on, as low, base and high. */
export interface ForecastVolatility {
  readonly source: 'window' | 'ewma' | 'typed';
  /** Returns in the window; null unless `source` is 'window'. */
  readonly window: number | null;
  /** Decay; null unless `source` is 'ewma'. */
  readonly lambda: number | null;
  /** Fractions per session, 0 < low <= base <= high. */
  readonly low: number;
  readonly base: number;
  readonly high: number;
  /** Session date of the last close used; null when typed. */
  readonly lastSessionDate: string | null;
}

/** Everything that goes into a forecast: plain data, complete, with no reference to a clock or a store. */
export interface ForecastInput {
  readonly underlying: ForecastUnderlying;
  readonly spot: { readonly price: string; readonly at: string; readonly source: 'bar' | 'typed' };
  /** At least one; all of one expiry. */
  readonly legs: readonly PlannedLeg[];
  readonly holding: { readonly kind: 'toExpiry' } | { readonly kind: 'sessions'; readonly sessions: number };
  readonly volatility: ForecastVolatility;
  readonly drift: Drift;
  /** Continuous, a fraction per calendar year. */
  readonly ratePerYear: number;
  /** Share of a session's variance that falls before its open, 0 to 1. */
  readonly overnightShare: number;
  /** Decimal text, per contract and side. */
  readonly feePerContract: string;
  /** Levels of the underlying, decimal text; null where the plan has none. */
  readonly targetPrice: string | null;
  readonly stopPrice: string | null;
}
