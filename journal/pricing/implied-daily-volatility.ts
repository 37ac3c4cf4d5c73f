import { normalDensity } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';
import { type EuropeanOption } from '@/journal/pricing/european-option';
import { outOfTheMoneyPrice } from '@/journal/pricing/out-of-the-money';

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

/**
 * Daily volatility that reproduces a price on the session clock.
 * @returns the volatility, to the last digits the price can carry, or the bound that rules a solution out.
 * @throws {DomainError} `option-input-invalid` for numbers outside their range.
 * @see safeguarded Newton on the logarithm of the out-of-the-money price, after Manaster and Koehler (1982), J. Finance 37,
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

/** Total deviation at which the out-of-the-money option of the pair is worth `timeValue`. */
function solveTotalDeviation(presentSpot: number, presentStrike: number, timeValue: number): number {
  const logMoneyness = Math.log(presentSpot / presentStrike);
  const target = Math.log(timeValue);
  let low = 0;
  let high = LARGEST_TOTAL_DEVIATION;
  // At the money the price is about 0.4 S x; far from it ln(price) is about -(ln moneyness)²/(2x²).
  const nearGuess = (timeValue * 2.5066) / Math.min(presentSpot, presentStrike);
  const farGuess =
    Math.abs(logMoneyness) / Math.sqrt(Math.max(1, -2 * Math.log(timeValue / Math.min(presentSpot, presentStrike))));
  let x = Math.max(nearGuess, farGuess, 1e-12);
  for (let step = 0; step < 300; step += 1) {
    const value = outOfTheMoneyPrice(presentSpot, presentStrike, x);
    const error = Math.log(value) - target; // -Infinity where the price underflows: then x is too small
    if (error > 0) high = x;
    else low = x;
    const slope = (presentSpot * normalDensity(logMoneyness / x + x / 2)) / value;
    // In log x the log price is concave and nearly straight far out, so the step is taken there.
    const newton = x * Math.exp(-error / (slope * x));
    if (Math.abs(newton - x) <= 2e-16 * x) return newton;
    x = newton > low && newton < high ? newton : middle(low, high);
  }
  return x;
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
