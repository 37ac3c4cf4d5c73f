import { DomainError } from '@/journal/errors/domain-error';
import { type AmericanOption, americanOptionPrice } from '@/journal/pricing/american-option';

export type AmericanQuestion = Omit<AmericanOption, 'dailyVolatility'> & {
  /** Currency per share. */
  readonly price: number;
};

export type AmericanImplied =
  | { readonly kind: 'found'; readonly dailyVolatility: number }
  /** 'exercise-value' is that of exercising at once: a price at it fits every volatility up to some. */
  | {
      readonly kind: 'none';
      readonly bound: 'below-exercise-value' | 'exercise-value' | 'above-maximum' | 'no-time-left';
      readonly limit: number;
    };

/** Deviations over the life between which volatilities are looked for. */
const LEAST_DEVIATION = 1e-7;
const MOST_DEVIATION = 18;
const STEPS = 200;

/**
 * The daily volatility at which an American option has a price.
 * @param question as for americanOptionPrice, with the price in place of the volatility.
 * @returns to about 1e-10 of itself, or to where the price's own accuracy ends; none, with the bound that was broken and its value.
 * @throws {DomainError} `price-invalid`, and as americanOptionPrice.
 * @see bisection and secant steps in turn (the Illinois rule): Dowell and Jarratt (1971), BIT 11.
 */
export function americanImpliedVolatility({ price, ...option }: AmericanQuestion): AmericanImplied {
  if (!Number.isFinite(price)) throw new DomainError('price-invalid', { price });
  const root = Math.sqrt(option.sessions);
  const priceAt = (deviation: number) => americanOptionPrice({ ...option, dailyVolatility: deviation / root });
  const { type, spotPrice, strikePrice } = option;
  const exercise = Math.max(0, type === 'call' ? spotPrice - strikePrice : strikePrice - spotPrice);
  if (!(root > 0)) {
    americanOptionPrice({ ...option, dailyVolatility: 0 }); // refuses what no option can be
    return { kind: 'none', bound: 'no-time-left', limit: exercise };
  }
  const least = priceAt(0);
  if (price < least) return { kind: 'none', bound: 'below-exercise-value', limit: least };
  if (price === least) return { kind: 'none', bound: 'exercise-value', limit: least };
  const gapAt = (deviation: number) => priceAt(deviation) - price;
  // Outwards from the deviation that at the money would be the answer: prices near the ends are slow.
  let low = within((Math.sqrt(2 * Math.PI) * (price - exercise)) / spotPrice);
  let lowGap = gapAt(low);
  let [high, highGap] = [low, lowGap];
  while (lowGap > 0 && low > LEAST_DEVIATION) {
    [high, highGap] = [low, lowGap];
    low = within(low / 2);
    lowGap = gapAt(low);
  }
  while (highGap < 0) {
    if (high === MOST_DEVIATION) return { kind: 'none', bound: 'above-maximum', limit: highGap + price };
    [low, lowGap] = [high, highGap];
    high = within(high * 2);
    highGap = gapAt(high);
  }
  for (let step = 0; step < STEPS && high - low > 1e-12 * high; step += 1) {
    const secant = (low * highGap - high * lowGap) / (highGap - lowGap);
    const isEven = step % 3 === 2 || !(secant > low && secant < high);
    const middle = isEven ? (low + high) / 2 : secant;
    if (middle === low || middle === high) break;
    const gap = priceAt(middle) - price;
    if (gap === 0) return { kind: 'found', dailyVolatility: middle / root };
    if (gap < 0) [low, lowGap, highGap] = [middle, gap, highGap / 2];
    else [high, highGap, lowGap] = [middle, gap, lowGap / 2];
  }
  return { kind: 'found', dailyVolatility: (low + high) / 2 / root };
}

const within = (deviation: number) => Math.min(MOST_DEVIATION, Math.max(LEAST_DEVIATION, deviation));
