import { DomainError } from '@/journal/errors/domain-error';
import { type EuropeanOption } from '@/journal/pricing/european-option';
import { outOfTheMoneyTerms } from '@/journal/pricing/out-of-the-money';

export type ImpliedQuestion = Omit<EuropeanOption, 'dailyVolatility'> & {
  /** Currency per share; any finite number, so that a quote with no solution can be told apart. */
  readonly price: number;
};
export type ImpliedVolatility =
  | { readonly kind: 'found'; readonly dailyVolatility: number }
  | {
      readonly kind: 'none';
      /** The bound that was broken; a price exactly at its intrinsic value fits no volatility but 0. */
      readonly bound: 'below-intrinsic' | 'above-maximum' | 'no-time-left';
      /** Its value, currency per share; for `no-time-left` the intrinsic value. */
      readonly limit: number;
    };

const LARGEST_TOTAL_DEVIATION = 60;
const CLOSE_ENOUGH = 1e-7;
/** From then on only bisection, which is sure to end. */
const MOST_HALLEY_STEPS = 50;

/**
 * Daily volatility that reproduces a price on the session clock.
 * @returns the volatility, to the last digits the price can carry, or the bound that rules a solution out.
 * @throws {DomainError} `option-input-invalid` for numbers outside their range.
 * @see safeguarded Halley steps on the logarithm of the out-of-the-money price, after Manaster and Koehler (1982), J. Finance 37,
 *   and Jäckel (2015), Let's be rational, Wilmott; the bounds are Merton's (1973).
 */
export function impliedDailyVolatility(question: ImpliedQuestion): ImpliedVolatility {
  checkQuestion(question);
  const { type, price, spotPrice, strikePrice, sessions, years, ratePerYear, dividendYield } = question;
  const presentSpot = spotPrice * Math.exp(-dividendYield * years);
  const presentStrike = strikePrice * Math.exp(-ratePerYear * years);
  const forwardIntrinsic = type === 'call' ? presentSpot - presentStrike : presentStrike - presentSpot;
  const intrinsic = Math.max(forwardIntrinsic, 0);
  const most = type === 'call' ? presentSpot : presentStrike;
  if (sessions === 0) return { kind: 'none', bound: 'no-time-left', limit: intrinsic };
  const timeValue = price - intrinsic;
  if (!(timeValue > 0)) return { kind: 'none', bound: 'below-intrinsic', limit: intrinsic };
  if (!(price < most)) return { kind: 'none', bound: 'above-maximum', limit: most };
  const totalDeviation = solveTotalDeviation(presentSpot, presentStrike, timeValue);
  return { kind: 'found', dailyVolatility: totalDeviation / Math.sqrt(sessions) };
}

/**
 * Total deviation x at which the out-of-the-money option of the pair is worth `timeValue`. Solved as ln(price) in ln x, which is
 * nearly straight close to the money and nearly exponential far from it: Halley's step fits both.
 */
function solveTotalDeviation(presentSpot: number, presentStrike: number, timeValue: number): number {
  const moneyness = Math.log(presentSpot / presentStrike);
  const share = timeValue / Math.min(presentSpot, presentStrike);
  let low = 0;
  let high = LARGEST_TOTAL_DEVIATION;
  // At the money the price is about 0.4 S x; far from it ln(price) is about -(ln moneyness)²/(2x²).
  let x = Math.max(share * 2.5066, Math.abs(moneyness) / Math.sqrt(Math.max(1, -2 * Math.log(share))), 1e-12);
  for (let step = 1; ; step += 1) {
    const { price, spotDensity } = outOfTheMoneyTerms(presentSpot, presentStrike, x);
    const error = Math.log(price / timeValue); // -Infinity where the price underflows: then x is too small
    if (error > 0) high = x;
    else low = x;
    const elasticity = (x * spotDensity) / price; // d ln(price) / d ln(x)
    const curvature = 1 + (moneyness / x) ** 2 - x ** 2 / 4 - elasticity; // of the same, over the elasticity
    const newton = -error / elasticity;
    const halley = newton / Math.max(0.5, 1 + (newton * curvature) / 2);
    const next = x * Math.exp(halley);
    // Convergence is of third order: once a step is this small, what is left after it is below one rounding.
    if (Math.abs(halley) <= CLOSE_ENOUGH) return next;
    x = step < MOST_HALLEY_STEPS && next > low && next < high ? next : middle(low, high);
    if (x === low || x === high) return x; // neighbouring doubles: the price cannot tell more
  }
}

/** Between two brackets: geometric once both are positive, since the answer spans many orders of magnitude. */
function middle(low: number, high: number): number {
  return low > 0 ? Math.sqrt(low * high) : high / 16;
}

function checkQuestion({
  price,
  spotPrice,
  strikePrice,
  sessions,
  years,
  ratePerYear,
  dividendYield,
}: ImpliedQuestion): void {
  const isPositive = spotPrice > 0 && spotPrice < Infinity && strikePrice > 0 && strikePrice < Infinity;
  const isTime = sessions >= 0 && sessions < Infinity && years >= 0 && years < Infinity;
  const isFinite = Math.abs(price) < Infinity && Math.abs(ratePerYear) < Infinity && Math.abs(dividendYield) < Infinity;
  if (!(isPositive && isTime && isFinite)) {
    throw new DomainError('option-input-invalid', {
      price,
      spotPrice,
      strikePrice,
      sessions,
      years,
      ratePerYear,
      dividendYield,
    });
  }
}
