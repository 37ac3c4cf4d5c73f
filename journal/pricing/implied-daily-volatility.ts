import { exponential, exponentialLessOne } from '@/journal/distributions/exponential';
import { normalQuantile, normalUpperTail } from '@/journal/distributions/normal-distribution';
import { DomainError } from '@/journal/errors/domain-error';
import { type EuropeanOption } from '@/journal/pricing/european-option';
import { logRatio } from '@/journal/pricing/log-ratio';
import { fillOutOfTheMoney, outOfTheMoneyRows, Term } from '@/journal/pricing/out-of-the-money';

export type ImpliedQuestion = Omit<EuropeanOption, 'dailyVolatility'> & {
  /** Currency per share; any finite number, so that a quote with no solution can be told apart. */
  readonly price: number;
};
export type ImpliedVolatility =
  | { readonly kind: 'found'; readonly dailyVolatility: number }
  | {
      readonly kind: 'none';
      /** The bound that was broken; a price exactly at its intrinsic value, `no-time-value`, fits no volatility but 0. */
      readonly bound: 'below-intrinsic' | 'no-time-value' | 'above-maximum' | 'no-time-left';
      /** Its value, currency per share; for `no-time-left` the intrinsic value. */
      readonly limit: number;
    };

const ROOT_TWO_PI = 2.5066282746310002;
/** Past this share of its maximum a price is told from it by what is missing, not by what is there. */
const HALF = 0.5;
/** Steps converge with order four: once one is this small, what is left after it is below a rounding. */
const CLOSE_ENOUGH = 1e-4;
/** From then on only bisection, which is sure to end. */
const MOST_HOUSEHOLDER_STEPS = 20;

/**
 * Daily volatility that reproduces a price on the session clock.
 * @returns the volatility, to the last digits the price can carry, or the bound that rules a solution out.
 * @throws {DomainError} `option-input-invalid` for numbers outside their range; `option-value-out-of-range` where a present value or
 *   the volatility leaves the doubles.
 * @see Jäckel (2015), Let's be rational, Wilmott, for Householder steps on a transformed out-of-the-money price from a rational guess;
 *   guess and transformation are our own. The bounds are Merton's (1973).
 */
export function impliedDailyVolatility(question: ImpliedQuestion): ImpliedVolatility {
  checkQuestion(question);
  const { type, price, spotPrice, strikePrice, sessions, years, ratePerYear, dividendYield } = question;
  const interest = ratePerYear * years;
  const dividends = dividendYield * years;
  const spotLoss = spotPrice * exponentialLessOne(-dividends);
  const strikeLoss = strikePrice * exponentialLessOne(-interest);
  const presentSpot = spotPrice + spotLoss;
  const presentStrike = strikePrice + strikeLoss;
  const logMoneyness = logRatio(spotPrice, strikePrice) + (interest - dividends);
  const sign = type === 'call' ? 1 : -1;
  const forwardValue = sign * (spotPrice - strikePrice + (spotLoss - strikeLoss));
  if (!(presentSpot + presentStrike + Math.abs(forwardValue) + Math.abs(logMoneyness) < Infinity))
    throw new DomainError('option-value-out-of-range', { presentSpot, presentStrike });
  const intrinsic = Math.max(forwardValue, 0);
  const most = type === 'call' ? presentSpot : presentStrike;
  if (sessions === 0) return { kind: 'none', bound: 'no-time-left', limit: intrinsic };
  const timeValue =
    forwardValue > 0
      ? exactDifference(price, sign * spotPrice, sign * strikePrice) - sign * (spotLoss - strikeLoss)
      : price;
  const smaller = Math.min(presentSpot, presentStrike);
  const share = timeValue / smaller;
  if (timeValue < 0) return { kind: 'none', bound: 'below-intrinsic', limit: intrinsic };
  if (share === 0 || timeValue === 0) return { kind: 'none', bound: 'no-time-value', limit: intrinsic };
  if (!(price < most && share < 1)) return { kind: 'none', bound: 'above-maximum', limit: most };
  const dailyVolatility = solveTotalDeviation(Math.abs(logMoneyness), share) / Math.sqrt(sessions);
  if (!(dailyVolatility < Infinity)) throw new DomainError('option-value-out-of-range', { sessions });
  return { kind: 'found', dailyVolatility };
}

/**
 * price − (plus − minus) with the rounding of both differences carried along, since the time value is a small part of the price of
 * an option in the money.
 * @see Knuth, The Art of Computer Programming 2, 4.2.2, on the exact error of a sum.
 */
function exactDifference(price: number, plus: number, minus: number): number {
  const forward = plus - minus;
  const rest = price - forward;
  return rest + (errorOfDifference(price, forward, rest) - errorOfDifference(plus, minus, forward));
}

function errorOfDifference(left: number, right: number, difference: number): number {
  const back = difference - left;
  return left - (difference - back) - (right + back);
}

/** One option on present values of 1: prices are shares, and the call counts as the one out of the money. */
const one = outOfTheMoneyRows(1).fill(1);

/**
 * Total deviation at which the out-of-the-money option is worth `share` of the smaller present value, by Householder's third-order
 * steps on the logarithm of the value, or of what is missing to its maximum, kept within what is known to be too small and too large.
 * @param distance |ln(present spot / present strike)|.
 */
function solveTotalDeviation(distance: number, share: number): number {
  const isLow = share <= HALF;
  const target = isLow ? share : 1 - share;
  let low = 0;
  let high = Infinity;
  const guess = isLow ? guessFromValue(distance, share) : guessFromMissing(distance, target);
  let deviation = guess > 0 && guess < Infinity ? guess : 1;
  for (let step = 1; ; step += 1) {
    one[Term.LogMoneyness] = distance;
    one[Term.TotalDeviation] = deviation;
    fillOutOfTheMoney(one, 1);
    const value = one[Term.Price] ?? NaN;
    const far = distance / deviation + deviation / 2;
    const near = distance / deviation - deviation / 2;
    const actual = isLow ? value : normalUpperTail(-near) + (one[Term.StrikeTail] ?? NaN);
    const error = logRatio(actual, target); // -Infinity where the value underflows: then the deviation is too small
    if (isLow ? error > 0 : error < 0) high = deviation;
    else low = deviation;
    // Derivatives: of the value the density, of its logarithm near·far/deviation.
    const slope = ((isLow ? 1 : -1) * (one[Term.SpotDensity] ?? NaN)) / actual;
    const bend = (near * far) / deviation;
    const bendSlope = -3 * (distance / deviation / deviation) ** 2 - 0.25;
    const newton = -error / slope;
    const second = bend - slope;
    const third = bend * bend + bendSlope - 3 * bend * slope + 2 * slope * slope;
    const change = (newton * (1 + (newton * second) / 2)) / (1 + newton * (second + (newton * third) / 6));
    const next = deviation + change;
    if (Math.abs(change) <= CLOSE_ENOUGH * deviation) return next;
    const isWithin = next > low && next < high;
    deviation = isWithin && step < MOST_HOUSEHOLDER_STEPS ? next : middle(low, high);
    // Neighbouring doubles: the price cannot tell more.
    if (!(low < deviation && deviation < high)) return deviation;
  }
}

/**
 * Start from the limit of small deviation, where value·sqrt(smaller/larger) is deviation·(φ(h) − h·P(Z > h)) with
 * h = distance/deviation, its inverse as a rational function of s = 1/sqrt(1 + 3·ln(1 + distance/value)) (our own fit, error 4e-5), and
 * the first correction for the deviation not being small.
 */
function guessFromValue(distance: number, share: number): number {
  const value = share * exponential(-distance / 2);
  if (!(distance > 1e-8 * value)) return value * ROOT_TWO_PI;
  const root = Math.sqrt(1 + 3 * logRatio(1 + distance / value, 1));
  const s = 1 / root;
  const numerator =
    0.817199768041 + s * (-0.689852735347 + s * (3.91509157276 + s * (27.8897796287 + s * 37.0100563155)));
  const denominator = 1 + s * (-1.68357343862 + s * (18.9121143303 + s * (-27.2942290561 + s * 268.275609302)));
  const h = ((root - 1) * numerator) / denominator;
  const deviation = distance / h;
  // To first order of deviation² the value is short of the limit by 1/8 less a quarter of what the third term of its series adds.
  const addition = 1 / (3 + h * (1.88 + h));
  const elasticity = 1 + h * (1.2533 + (h * (0.57 + 0.35 * h)) / (1 + 0.35 * h));
  return deviation * (1 + (deviation * deviation * (0.125 - 0.25 * addition)) / elasticity);
}

/** Start near the maximum: at the money 2·P(Z > deviation/2) is missing. */
function guessFromMissing(distance: number, missing: number): number {
  const atTheMoney = -2 * normalQuantile(missing / 2);
  return Math.sqrt(atTheMoney * atTheMoney + 2 * distance);
}

/** Between two brackets: geometric once both are positive, since the answer spans many orders of magnitude. */
function middle(low: number, high: number): number {
  if (high === Infinity) return low * 2; // there is a low by then
  return low > 0 ? Math.sqrt(low) * Math.sqrt(high) : high / 16;
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
