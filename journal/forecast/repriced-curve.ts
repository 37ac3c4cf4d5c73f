import { type ProfitCurve } from '@/journal/forecast/curved-profit-law';
import { type RepricedLeg, type RepriceMoment, valueAtMoment } from '@/journal/scenarios/reprice';

/** Rounding of a value, as a share of the strikes it is made of. */
const ROUNDING = 2e-14;
const NEAR_NOTHING = 1e-200;

/**
 * Profit of options and shares at one moment, as a curve over the price of the underlying.
 * @param question.costs everything paid to open and to close, currency; `shares` held beside the options, negative when short.
 * @see valueAtMoment.
 */
export function repricedCurve(question: {
  readonly legs: readonly RepricedLeg[];
  readonly moment: RepriceMoment;
  readonly costs: number;
  readonly shares?: number;
}): ProfitCurve {
  const { legs, moment, costs, shares = 0 } = question;
  const valueAt = valueAtMoment(legs, moment, shares);
  const profitAt = (spotPrice: number) => valueAt(spotPrice) - costs;
  const gross = legs.reduce((sum, leg) => sum + Math.abs(leg.signedShares) * leg.strikePrice, Math.abs(costs));
  return {
    profitAt,
    bends: legs.map((leg) => ({
      price: leg.strikePrice,
      width: leg.dailyVolatility * Math.sqrt(moment.sessions + (leg.sessionsBeyond ?? 0)),
    })),
    resolution: Math.max(ROUNDING * gross, Number.MIN_VALUE),
    limits: { atNothing: profitAt(NEAR_NOTHING), atInfinity: limitAtInfinity(legs, moment, shares) - costs },
  };
}

/** What the position tends to as the price grows: without end, or to what the strikes of its calls come to. */
function limitAtInfinity(
  legs: readonly RepricedLeg[],
  { years, ratePerYear, dividendYield }: RepriceMoment,
  shares: number,
): number {
  let slope = shares;
  let limit = 0;
  for (const { type, signedShares, strikePrice, yearsBeyond = 0 } of legs) {
    if (type === 'put') continue;
    slope += signedShares * Math.exp(-dividendYield * (years + yearsBeyond));
    limit -= signedShares * strikePrice * Math.exp(-ratePerYear * (years + yearsBeyond));
  }
  const isLevel = Math.abs(slope) < 1e-9;
  return isLevel ? limit : slope * Infinity;
}
