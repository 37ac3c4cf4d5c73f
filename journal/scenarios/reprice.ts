import { DomainError } from '@/journal/errors/domain-error';
import { outOfTheMoneyPrice } from '@/journal/pricing/out-of-the-money';

/** A leg with the volatility it is repriced at. */
export interface RepricedLeg {
  readonly type: 'call' | 'put';
  readonly strikePrice: number;
  readonly signedShares: number;
  /** Fraction per session. */
  readonly dailyVolatility: number;
  /** Sessions and calendar years of its life beyond the first expiry of the position, 0 when left out. */
  readonly sessionsBeyond?: number;
  readonly yearsBeyond?: number;
}

/** What is the same for every price of the underlying at one moment. */
export interface RepriceMoment {
  /** Sessions of variance left to the first expiry, 0 or more. */
  readonly sessions: number;
  /** Calendar years left to the first expiry, 0 or more. */
  readonly years: number;
  readonly ratePerYear: number;
  readonly dividendYield: number;
}

/**
 * The value of a set of options as a function of the spot price, at one moment: what does not depend on the spot is worked
 * out once, since lattices and exit distributions ask for hundreds of prices.
 * @param shares of the underlying held beside the options, negative when short.
 * @returns currency, positive when the position is worth something to its owner.
 * @throws {DomainError} `reprice-input-invalid` with the leg's index.
 * @see Black and Scholes (1973), Merton (1973), repriced in full.
 */
export function valueAtMoment(
  legs: readonly RepricedLeg[],
  moment: RepriceMoment,
  shares = 0,
): (spotPrice: number) => number {
  const prepared = legs.map((leg, legIndex) => {
    checkLeg(leg, moment, legIndex);
    const years = moment.years + (leg.yearsBeyond ?? 0);
    return {
      direction: leg.type === 'call' ? 1 : -1,
      carry: Math.exp(-moment.dividendYield * years),
      presentStrike: leg.strikePrice * Math.exp(-moment.ratePerYear * years),
      totalDeviation: leg.dailyVolatility * Math.sqrt(moment.sessions + (leg.sessionsBeyond ?? 0)) + 0, // never -0
      signedShares: leg.signedShares,
    };
  });
  return (spotPrice) => {
    let value = shares * spotPrice;
    for (const leg of prepared) {
      const presentSpot = spotPrice * leg.carry;
      const intrinsic = leg.direction * (presentSpot - leg.presentStrike);
      const timeValue = outOfTheMoneyPrice(presentSpot, leg.presentStrike, leg.totalDeviation);
      value += leg.signedShares * (intrinsic > 0 ? intrinsic + timeValue : timeValue);
    }
    return value;
  };
}

function checkLeg(leg: RepricedLeg, moment: RepriceMoment, legIndex: number): void {
  const { strikePrice, signedShares, dailyVolatility } = leg;
  const years = moment.years + (leg.yearsBeyond ?? 0);
  const sessions = moment.sessions + (leg.sessionsBeyond ?? 0);
  const growth = Math.exp((Math.abs(moment.ratePerYear) + Math.abs(moment.dividendYield)) * years);
  const isValid = strikePrice > 0 && dailyVolatility >= 0 && years >= 0 && sessions >= 0;
  const size = strikePrice * growth * Math.abs(signedShares) + dailyVolatility * Math.sqrt(sessions);
  if (!(isValid && growth < Infinity && size < Infinity))
    throw new DomainError('reprice-input-invalid', {
      legIndex,
      strikePrice,
      signedShares,
      dailyVolatility,
      years,
      sessions,
    });
}
