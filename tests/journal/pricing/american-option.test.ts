import * as fc from 'fast-check';
import {
  americanOptionPrice,
  americanOptionValue,
  type AmericanOption,
  fastScheme,
  fineScheme,
} from '@/journal/pricing/american-option';
import { americanImpliedVolatility } from '@/journal/pricing/american-implied-volatility';
import { exerciseBeforeDividend } from '@/journal/pricing/exercise-before-dividend';
import { europeanOptionPrice } from '@/journal/pricing/european-option';
import { binomialAmerican } from '@/tests/journal/pricing/binomial-american';

const seed = 20261201;
const put: AmericanOption = {
  type: 'put',
  spotPrice: 100,
  strikePrice: 102,
  dailyVolatility: 0.015,
  sessions: 21,
  years: 30 / 365,
  ratePerYear: 0.05,
  dividendYield: 0.01,
};
const anyOption = fc.record<AmericanOption>({
  type: fc.constantFrom('call', 'put'),
  spotPrice: fc.double({ min: 60, max: 160, noNaN: true }),
  strikePrice: fc.constant(100),
  dailyVolatility: fc.double({ min: 0.004, max: 0.06, noNaN: true }),
  sessions: fc.double({ min: 0.05, max: 60, noNaN: true }),
  years: fc.double({ min: 0.0005, max: 0.3, noNaN: true }),
  ratePerYear: fc.double({ min: 0, max: 0.12, noNaN: true }),
  dividendYield: fc.double({ min: 0, max: 0.12, noNaN: true }),
});
const intrinsic = ({ type, spotPrice, strikePrice }: AmericanOption) =>
  Math.max(0, type === 'call' ? spotPrice - strikePrice : strikePrice - spotPrice);
/** A price is good to 1e-6 of the spot price. */
const slack = 1e-4;

describe('americanOptionPrice', () => {
  it('is the European price where exercising early never pays', () => {
    for (const option of [
      { ...put, type: 'call' as const, dividendYield: 0 },
      { ...put, ratePerYear: 0 },
      { ...put, ratePerYear: -0.02 },
      { ...put, years: 0 },
    ])
      expect(americanOptionPrice(option)).toBe(europeanOptionPrice(option));
  });

  it('agrees with a tree of 400 steps, over rates, yields, moneyness and lives (property)', () => {
    fc.assert(
      fc.property(anyOption, (option) => {
        const tree = binomialAmerican(option, 400);
        // A smoothed tree converges as 1/steps.
        expect(Math.abs(americanOptionPrice(option) - tree)).toBeLessThan(3e-5 * option.spotPrice);
      }),
      { seed, numRuns: 40, endOnFailure: true },
    );
  });

  it('is worth no less than the European option and than exercising (property)', () => {
    fc.assert(
      fc.property(anyOption, (option) => {
        const price = americanOptionPrice(option);
        expect(price).toBeGreaterThanOrEqual(intrinsic(option));
        expect(price).toBeGreaterThanOrEqual(europeanOptionPrice(option) - slack);
      }),
      { seed, numRuns: 300, endOnFailure: true },
    );
  });

  it('rises with volatility and time, and a call is a put seen from the other side (property)', () => {
    fc.assert(
      fc.property(anyOption, fc.double({ min: 1.01, max: 1.5, noNaN: true }), (option, more) => {
        const price = americanOptionPrice(option);
        const { dailyVolatility, sessions, years, type, spotPrice, strikePrice, ratePerYear, dividendYield } = option;
        expect(americanOptionPrice({ ...option, dailyVolatility: dailyVolatility * more })).toBeGreaterThanOrEqual(
          price - slack,
        );
        expect(
          americanOptionPrice({ ...option, sessions: sessions * more, years: years * more }),
        ).toBeGreaterThanOrEqual(price - slack);
        const mirrored: AmericanOption = {
          ...option,
          type: type === 'call' ? 'put' : 'call',
          spotPrice: strikePrice,
          strikePrice: spotPrice,
          ratePerYear: dividendYield,
          dividendYield: ratePerYear,
        };
        expect(Math.abs(americanOptionPrice(mirrored) - price)).toBeLessThan(1e-9 * spotPrice);
      }),
      { seed, numRuns: 150, endOnFailure: true },
    );
  });

  it('is convex in the strike (property)', () => {
    fc.assert(
      fc.property(anyOption, fc.double({ min: 0.5, max: 8, noNaN: true }), (option, step) => {
        const at = (strikePrice: number) => americanOptionPrice({ ...option, strikePrice });
        const { strikePrice } = option;
        expect(at(strikePrice - step) + at(strikePrice + step) - 2 * at(strikePrice)).toBeGreaterThan(-slack);
      }),
      { seed, numRuns: 100, endOnFailure: true },
    );
  });

  it('meets the boundary without a jump, and is exercised beyond it', () => {
    const { exerciseBoundary } = americanOptionValue(put);
    if (exerciseBoundary === null) throw new Error('this put has a boundary');
    expect(exerciseBoundary).toBeGreaterThan(80);
    expect(exerciseBoundary).toBeLessThan(put.strikePrice);
    const below = americanOptionValue({ ...put, spotPrice: exerciseBoundary * (1 - 1e-7) });
    const above = americanOptionValue({ ...put, spotPrice: exerciseBoundary * (1 + 1e-7) });
    expect(below).toMatchObject({ exerciseNow: true, delta: -1, gamma: 0, vegaPerDailyPoint: 0, rhoPerPercent: 0 });
    expect(above.exerciseNow).toBe(false);
    expect(Math.abs(above.price - below.price)).toBeLessThan(1e-4);
    expect(above.delta).toBeCloseTo(-1, 2);
  });

  it('takes a negative rate above a lower yield, where there are two edges, from the grid', () => {
    const option = { ...put, ratePerYear: -0.02, dividendYield: -0.06, spotPrice: 95, years: 1, sessions: 252 };
    expect(Math.abs(americanOptionPrice(option) - binomialAmerican(option, 1000))).toBeLessThan(1e-3);
    expect(americanOptionPrice(option)).toBeGreaterThan(europeanOptionPrice(option));
  });

  it.each([
    // Rates far above the deviation, where the iteration does not come to rest: held to a tree.
    { interest: 1.4802819354487584, dividend: 0.06953391177215763, deviation: 0.5692707436599923, price: 1.0388 },
    { interest: 0.40208072705520315, dividend: 0.0041374, deviation: 0.2302181872359844, price: 1.1284 },
    { interest: 0.02396967412850445, dividend: -0.19302702379500933, deviation: 1.2402904031607789, price: 0.88 },
    { interest: 0.0069971598352605476, dividend: 0.00214939, deviation: 0.0026761653530284384, price: 0.9994 },
  ])('gives way to the grid where no boundary settles: rates $interest and $dividend, deviation $deviation', (one) => {
    const option: AmericanOption = {
      type: 'put',
      spotPrice: 100 * one.price,
      strikePrice: 100,
      dailyVolatility: one.deviation,
      sessions: 1,
      years: 1,
      ratePerYear: one.interest,
      dividendYield: one.dividend,
    };
    const tree = binomialAmerican(option, 2000);
    // The tree swings from size to size where drift is large: by so much it is unsure itself.
    const unsure = Math.abs(tree - binomialAmerican(option, 1000));
    for (const scheme of [fastScheme, fineScheme])
      expect(Math.abs(americanOptionPrice(option, scheme) - tree)).toBeLessThan(2e-5 * 100 + unsure);
  });

  it('waits for the best moment where nothing is uncertain', () => {
    const still = { ...put, dailyVolatility: 0 };
    expect(americanOptionPrice(still)).toBe(2);
    expect(americanOptionValue(still).exerciseNow).toBe(true);
    const call: AmericanOption = {
      ...put,
      type: 'call',
      dailyVolatility: 0,
      strikePrice: 90,
      dividends: [{ years: 0.04, amount: 5 }],
    };
    expect(americanOptionPrice(call)).toBeCloseTo(100 * Math.exp(-0.01 * 0.04) - 90 * Math.exp(-0.05 * 0.04), 10);
  });

  it('refuses what is no option, rates no market has, and dividends that eat the stock', () => {
    expect(() => americanOptionPrice({ ...put, strikePrice: 0 })).toThrow(
      expect.objectContaining({ code: 'option-input-invalid' }),
    );
    expect(() => americanOptionPrice({ ...put, ratePerYear: 1000 })).toThrow(
      expect.objectContaining({ code: 'american-out-of-range' }),
    );
    expect(() => americanOptionPrice({ ...put, dividends: [{ years: 0.01, amount: 200 }] })).toThrow(
      expect.objectContaining({ code: 'dividends-exceed-spot' }),
    );
  });
});

describe('Greeks of American options', () => {
  it('are those of small changes of the price', () => {
    const value = americanOptionValue(put);
    const at = (changes: Partial<AmericanOption>) => americanOptionPrice({ ...put, ...changes });
    const h = 0.05;
    const [up, down] = [at({ spotPrice: 100 + h }), at({ spotPrice: 100 - h })];
    expect(value.delta).toBeCloseTo((up - down) / (2 * h), 4);
    expect(value.gamma).toBeCloseTo((up - 2 * value.price + down) / h ** 2, 3);
    expect(value.vegaPerDailyPoint).toBeCloseTo(
      (at({ dailyVolatility: 0.0151 }) - at({ dailyVolatility: 0.0149 })) / 0.02,
      3,
    );
    expect(value.rhoPerPercent).toBeCloseTo((at({ ratePerYear: 0.051 }) - at({ ratePerYear: 0.049 })) / 0.2, 3);
    expect(value.thetaPerSession).toBeCloseTo(at({ sessions: 20, years: 29 / 365 }) - value.price, 12);
  });

  it('stay sound to the last minutes', () => {
    for (const minutes of [120, 30, 5, 1]) {
      const sessions = (0.7 * minutes) / 390;
      const value = americanOptionValue({ ...put, strikePrice: 100, sessions, years: minutes / 525_600 });
      expect(value.delta).toBeGreaterThan(-0.6);
      expect(value.delta).toBeLessThan(-0.4);
      // At the money φ(0) / (S σ √N).
      expect(value.gamma * 100 * 0.015 * Math.sqrt(sessions)).toBeCloseTo(0.3989, 2);
      expect(value.thetaPerSession).toBeLessThan(0);
    }
  });
});

describe('cash dividends', () => {
  const call: AmericanOption = { ...put, type: 'call', dividendYield: 0, strikePrice: 98 };

  it('change nothing when they fall after expiry, and little when they are small', () => {
    const plain = americanOptionPrice(call);
    expect(americanOptionPrice({ ...call, dividends: [{ years: 1, amount: 3 }] })).toBe(plain);
    for (const dividendModel of ['spot', 'escrowed'] as const) {
      const small = americanOptionPrice({ ...call, dividendModel, dividends: [{ years: 0.04, amount: 1e-6 }] });
      expect(Math.abs(small - plain)).toBeLessThan(2e-5 * 100);
    }
  });

  it('make a call worth exercising just before they are paid', () => {
    const soon = { ...call, strikePrice: 80, dividends: [{ years: 1 / 365, amount: 3 }] };
    expect(americanOptionPrice(soon)).toBeGreaterThan(americanOptionPrice({ ...soon, dividends: [] }) - 0.6);
    expect(americanOptionPrice(soon)).toBeGreaterThanOrEqual(20);
  });

  it('keep price and Greeks finite with twelve of them, minutes before expiry and now (property)', () => {
    fc.assert(
      fc.property(
        anyOption,
        fc.array(
          fc.record({
            years: fc.double({ min: 0, max: 0.3, noNaN: true }),
            amount: fc.double({ min: 0, max: 3, noNaN: true }),
          }),
          {
            maxLength: 12,
          },
        ),
        fc.constantFrom('spot' as const, 'escrowed' as const),
        (option, dividends, dividendModel) => {
          const value = americanOptionValue({ ...option, dividends, dividendModel });
          expect(Object.values(value).every((figure) => typeof figure !== 'number' || Number.isFinite(figure))).toBe(
            true,
          );
          expect(value.price).toBeGreaterThanOrEqual(intrinsic(option));
        },
      ),
      { seed, numRuns: 6, endOnFailure: true },
    );
  });
});

describe('exercise before a dividend', () => {
  // A 0.60 dividend tomorrow on a call struck at 50, the stock at 53.00, then 7 sessions and 10 days: computed outside with Python.
  const decision = {
    spotPrice: 53,
    strikePrice: 50,
    dividend: 0.6,
    sessions: 7,
    years: 10 / 365,
    dailyVolatility: 0.015,
    ratePerYear: 0.04,
  };

  it('beats holding when the dividend is more than the put and the interest on the strike', () => {
    const advice = exerciseBeforeDividend(decision);
    expect(advice.putValue).toBeCloseTo(0.1118, 4);
    expect(advice.interestOnStrike).toBeCloseTo(0.0548, 4);
    expect(advice.exerciseValue).toBe(3);
    expect(advice.holdingValue).toBeCloseTo(2.5666, 4);
    expect(advice.isExerciseBetter).toBe(true);
    expect(exerciseBeforeDividend({ ...decision, dividend: 0.1 }).isExerciseBetter).toBe(false);
    expect(() => exerciseBeforeDividend({ ...decision, dividend: 60 })).toThrow(
      expect.objectContaining({ code: 'dividend-invalid' }),
    );
  });
});

describe('americanImpliedVolatility', () => {
  const { dailyVolatility: _, ...question } = put;

  it('gives back the volatility that made a price (property)', () => {
    fc.assert(
      fc.property(anyOption, (option) => {
        const { price, vegaPerDailyPoint } = americanOptionValue(option);
        if (!(vegaPerDailyPoint > 1e-3)) return; // a price that hardly depends on it tells nothing of it
        const found = americanImpliedVolatility({ ...option, price });
        if (found.kind !== 'found') throw new Error(`none: ${found.bound}`);
        expect(Math.abs(found.dailyVolatility - option.dailyVolatility)).toBeLessThan(1e-6);
      }),
      { seed, numRuns: 100, endOnFailure: true },
    );
  });

  it('names the bound that a price breaks', () => {
    const at = (price: number) => americanImpliedVolatility({ ...question, price });
    expect(at(1.5)).toMatchObject({ kind: 'none', bound: 'below-exercise-value' });
    expect(at(2)).toMatchObject({ kind: 'none', bound: 'exercise-value', limit: 2 });
    expect(at(103)).toMatchObject({ kind: 'none', bound: 'above-maximum' });
    expect(americanImpliedVolatility({ ...question, sessions: 0, price: 3 })).toMatchObject({ bound: 'no-time-left' });
    expect(() => at(NaN)).toThrow(expect.objectContaining({ code: 'price-invalid' }));
  });
});
