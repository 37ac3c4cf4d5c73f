import { type DecimalText } from '@/journal/money/decimal';
import { type EuropeanOption } from '@/journal/pricing/european-option';

/** What the market and the clocks said at one moment of a leg. */
export interface MarketState {
  /** Of the underlying, above 0. */
  readonly spotPrice: number;
  /** Sessions and calendar years left to the option's expiry, 0 or more; any number for stock. */
  readonly sessions: number;
  readonly years: number;
  /** Continuous, fractions per calendar year. */
  readonly ratePerYear: number;
  readonly dividendYield: number;
}

/** One end of a leg. */
export interface LegEnd {
  readonly state: MarketState;
  /** What was traded at, per share; at expiry the settlement value of the option. */
  readonly fillPrice: DecimalText;
  /** Middle of bid and ask when it was decided to trade; null where it was not noted, and the fill stands in. */
  readonly midPrice: DecimalText | null;
  /** Currency; a rebate is negative. */
  readonly fees: DecimalText;
  /** Fraction per session, above 0; null to take the one implied by the middle price. */
  readonly dailyVolatility: number | null;
}

/** A quantity that was opened and closed: a closed lot with what was known at both its ends. */
export interface AttributedLeg {
  readonly legId: string;
  readonly instrument:
    | { readonly kind: 'option'; readonly type: 'call' | 'put'; readonly strikePrice: number }
    | { readonly kind: 'stock' };
  /** Contracts or shares, long positive, short negative, not 0. */
  readonly signedQuantity: DecimalText;
  /** Above 0. */
  readonly multiplier: DecimalText;
  readonly entry: LegEnd;
  readonly exit: LegEnd;
}

export interface AttributionOptions {
  /** Stands in where no volatility is given and none implied, a fraction per session above 0: the plan's base. */
  readonly fallbackDailyVolatility: number;
  /** Price of an option in one state; the European formula by default. */
  readonly priceOption?: (option: EuropeanOption) => number;
  /** Decimals a price is rounded to at every corner, so that the parts can be checked by hand from prices shown; by default none. */
  readonly cornerPlaces?: number;
}
