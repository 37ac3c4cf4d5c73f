import fc from 'fast-check';
import reference from '@/tests/journal/pricing/european-60-digits.json';
import { type EuropeanOption, europeanOptionPrice, europeanOptionValue } from '@/journal/pricing/european-option';
import {
  type ImpliedQuestion,
  impliedDailyVolatility,
  type ImpliedVolatility,
} from '@/journal/pricing/implied-daily-volatility';
import { runs } from '@/tests/journal/deep-runs';
import { randomOption } from '@/tests/journal/pricing/random-option';

fc.configureGlobal({ seed: 20261201 });

const quote: ImpliedQuestion = {
  type: 'call',
  price: 1.2,
  spotPrice: 100,
  strikePrice: 102,
  sessions: 10,
  years: 14 / 365,
  ratePerYear: 0.04,
  dividendYield: 0,
};
const foundFor = (question: ImpliedQuestion): number => {
  const answer = impliedDailyVolatility(question);
  if (answer.kind !== 'found') throw new Error(`none: ${answer.bound}`);
  return answer.dailyVolatility;
};

const HALF_ULP = 2 ** -53;

/**
 * The price is a double, its time value is known to the rounding of what interest takes off, and the formula itself to a few
 * roundings times the square of its deviations (see european-60-digits.test.ts): all that over vega, and a few roundings of the
 * result, is how near a solution can come.
 * @param sources how many of price and solution are computed with doubles.
 */
function expectAttained(
  option: EuropeanOption,
  { price, vegaPerDailyPoint, sources }: { price: number; vegaPerDailyPoint: number; sources: number },
  answer: ImpliedVolatility,
): void {
  const { spotPrice, strikePrice, dailyVolatility, sessions, years, ratePerYear, dividendYield } = option;
  const interest = strikePrice * Math.abs(ratePerYear) * years + spotPrice * Math.abs(dividendYield) * years;
  const forward = Math.log(spotPrice / strikePrice) + (ratePerYear - dividendYield) * years;
  const deviation = dailyVolatility * Math.sqrt(sessions);
  const deviationsOut = Math.abs(forward) / deviation + deviation / 2;
  const intrinsic = Math.max(option.type === 'call' ? Math.expm1(forward) : -Math.expm1(forward), 0) * strikePrice;
  const formula = 10 + 3 * deviationsOut ** 2 + (deviation > 1 / 16 ? (2 * (1 + deviationsOut)) / deviation : 0);
  const errorOfPrice = sources * HALF_ULP * (price + 4 * interest + formula * Math.max(price - intrinsic, 0));
  const attainable = errorOfPrice / (100 * vegaPerDailyPoint) + 4 * HALF_ULP * dailyVolatility;
  if (answer.kind === 'found') {
    expect(Math.abs(answer.dailyVolatility - dailyVolatility)).toBeLessThanOrEqual(attainable);
  } else {
    // Deep in the money all time value can be lost to rounding; then, and only then, there is none.
    expect(attainable).toBeGreaterThan(0.1 * dailyVolatility);
  }
}

describe('implied daily volatility', () => {
  it('reprices the quote it was found from', () => {
    const dailyVolatility = foundFor(quote);
    expect(europeanOptionPrice({ ...quote, dailyVolatility })).toBeCloseTo(quote.price, 14);
  });

  it('comes back to the volatility a price was made with, as near as the digits of the price can tell', () => {
    fc.assert(
      fc.property(randomOption, (option) => {
        const { price, vegaPerDailyPoint } = europeanOptionValue(option);
        fc.pre(price > 0);
        // Both the price and its solution are ours, so that the errors of two calculations meet.
        expectAttained(option, { price, vegaPerDailyPoint, sources: 2 }, impliedDailyVolatility({ ...option, price }));
      }),
      { numRuns: runs(2_000, 50_000) },
    );
  });

  it.each(reference.cases)('finds the volatility of the 60-digit price of $option', ({ option, value }) => {
    const typed = { ...option, type: option.type === 'call' ? ('call' as const) : ('put' as const) };
    const answer = impliedDailyVolatility({ ...typed, price: value.price });
    expectAttained(typed, { ...value, sources: 1 }, answer);
  });

  it('rises with the price', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-12, max: 90, noNaN: true }),
        fc.double({ min: 1.001, max: 1.1, noNaN: true }),
        (price, factor) => {
          expect(foundFor({ ...quote, price: price * factor })).toBeGreaterThan(foundFor({ ...quote, price }));
        },
      ),
    );
  });

  it('is the same for call and put by parity', () => {
    const put = quote.price - quote.spotPrice + quote.strikePrice * Math.exp(-quote.ratePerYear * quote.years);
    expect(foundFor({ ...quote, type: 'put', price: put })).toBeCloseTo(foundFor(quote), 14);
  });

  it.each([1e-300, 1e-200, 1e-100, 1e-30])('finds a volatility for a time value of %p', (price) => {
    const dailyVolatility = foundFor({ ...quote, price });
    // So far out one rounding of the volatility moves the price by up to 1,400.
    expect(Math.abs(europeanOptionPrice({ ...quote, dailyVolatility }) / price - 1)).toBeLessThanOrEqual(6e-13);
  });

  it('finds a volatility a hair under the most a call can cost', () => {
    const dailyVolatility = foundFor({ ...quote, price: 99.999999 });
    expect(europeanOptionPrice({ ...quote, dailyVolatility })).toBeCloseTo(99.999999, 12);
  });

  it.each([
    { why: 'the price is under its intrinsic value', change: { spotPrice: 105, price: 3 }, bound: 'below-intrinsic' },
    {
      why: 'the price is exactly intrinsic',
      change: { strikePrice: 90, ratePerYear: 0, price: 10 },
      bound: 'no-time-value',
    },
    { why: 'a call costs as much as the stock', change: { price: 100 }, bound: 'above-maximum' },
    { why: 'the price is 0', change: { price: 0 }, bound: 'no-time-value' },
    { why: 'the price is negative', change: { price: -0.01 }, bound: 'below-intrinsic' },
    { why: 'no session is left', change: { sessions: 0 }, bound: 'no-time-left' },
  ])('says $bound when $why', ({ change, bound }) => {
    expect(impliedDailyVolatility({ ...quote, ...change })).toEqual(expect.objectContaining({ kind: 'none', bound }));
  });

  it('states the broken bound in currency', () => {
    expect(impliedDailyVolatility({ ...quote, price: 101 })).toEqual({
      kind: 'none',
      bound: 'above-maximum',
      limit: 100,
    });
    expect(impliedDailyVolatility({ ...quote, ratePerYear: 0, strikePrice: 90, price: 9 })).toEqual({
      kind: 'none',
      bound: 'below-intrinsic',
      limit: 10,
    });
  });

  it.each([
    ['price', NaN],
    ['price', Infinity],
    ['spotPrice', 0],
    ['strikePrice', NaN],
    ['sessions', -1],
    ['years', NaN],
    ['ratePerYear', Infinity],
  ] as const)('throws option-input-invalid for a %s of %p', (field, value) => {
    expect(() => impliedDailyVolatility({ ...quote, [field]: value })).toThrow(
      expect.objectContaining({ code: 'option-input-invalid' }),
    );
  });
});
