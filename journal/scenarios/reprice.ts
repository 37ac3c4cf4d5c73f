import { outOfTheMoneyPrice } from '@/journal/pricing/out-of-the-money';

/** A leg with the volatility it is repriced at. */
export interface RepricedLeg {
  readonly type: 'call' | 'put';
  readonly strikePrice: number;
  readonly signedShares: number;
  /** Fraction per session. */
  readonly dailyVolatility: number;
}

/** What is the same for every price of the underlying at one moment. */
export interface RepriceMoment {
  /** Sessions of variance left, 0 or more. */
  readonly sessions: number;
  /** Calendar years left, 0 or more. */
  readonly years: number;
  readonly ratePerYear: number;
  readonly dividendYield: number;
}

/**
 * The value of a set of options as a function of the spot price, at one moment: what does not depend on the spot is worked
 * out once, since lattices and exit distributions ask for hundreds of prices.
 * @returns currency, positive when the options are worth something to their owner.
 * @see Black and Scholes (1973), Merton (1973), repriced in full.
 */
export function valueAtMoment(legs: readonly RepricedLeg[], moment: RepriceMoment): (spotPrice: number) => number {
  const carry = Math.exp(-moment.dividendYield * moment.years);
  const discount = Math.exp(-moment.ratePerYear * moment.years);
  const rootSessions = Math.sqrt(moment.sessions);
  const prepared = legs.map(({ type, strikePrice, signedShares, dailyVolatility }) => ({
    direction: type === 'call' ? 1 : -1,
    presentStrike: strikePrice * discount,
    totalDeviation: dailyVolatility * rootSessions,
    signedShares,
  }));
  return (spotPrice) => {
    const presentSpot = spotPrice * carry;
    let value = 0;
    for (const leg of prepared) {
      const intrinsic = leg.direction * (presentSpot - leg.presentStrike);
      const timeValue = outOfTheMoneyPrice(presentSpot, leg.presentStrike, leg.totalDeviation);
      value += leg.signedShares * (intrinsic > 0 ? intrinsic + timeValue : timeValue);
    }
    return value;
  };
}
