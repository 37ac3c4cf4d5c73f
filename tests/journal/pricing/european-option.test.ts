import fc from 'fast-check';
import { type EuropeanOption, europeanOptionPrice, europeanOptionValue } from '@/journal/pricing/european-option';
import { plannedCall } from '@/tests/journal/pricing/planned-call';
import { randomOption } from '@/tests/journal/pricing/random-option';

fc.configureGlobal({ seed: 20261201 });

const plannedPut: EuropeanOption = { ...plannedCall, type: 'put' };

/** Rounding of the larger present value, which no price can be free of in the money. */
const roundingOf = (option: EuropeanOption, roundings: number) =>
  roundings * 2.3e-16 * Math.max(option.spotPrice, option.strikePrice);
const presentValues = ({ spotPrice, strikePrice, years, ratePerYear, dividendYield }: EuropeanOption) => ({
  spot: spotPrice * Math.exp(-dividendYield * years),
  strike: strikePrice * Math.exp(-ratePerYear * years),
});

describe('European option: worked values', () => {
  it('prices the planned call, put and call without interest to the printed digits', () => {
    expect(europeanOptionPrice(plannedCall)).toBeCloseTo(1.12767, 5);
    expect(europeanOptionPrice(plannedPut)).toBeCloseTo(2.97129, 5);
    expect(europeanOptionPrice({ ...plannedCall, ratePerYear: 0 })).toBeCloseTo(1.07522, 5);
  });

  it('prices it with a dividend taken off the spot', () => {
    const spotPrice = 100 - 0.5 * Math.exp((-0.04 * 5) / 365);
    expect(spotPrice).toBeCloseTo(99.50027, 5);
    expect(europeanOptionPrice({ ...plannedCall, spotPrice })).toBeCloseTo(0.95804, 5);
    expect(europeanOptionPrice({ ...plannedPut, spotPrice })).toBeCloseTo(3.30139, 5);
  });

  it('has its Greeks to the printed digits', () => {
    const value = europeanOptionValue(plannedCall);
    expect(value.delta).toBeCloseTo(0.35889, 5);
    expect(value.oddsInTheMoney).toBeCloseTo(0.34133, 5);
    expect(value.gamma * plannedCall.spotPrice * 0.01).toBeCloseTo(0.0788, 4);
    expect(value.vegaPerDailyPoint / 10).toBeCloseTo(0.1182, 4);
    expect(value.rhoPerPercent).toBeCloseTo(0.0133, 4);
    expect(value.thetaPerSession).toBeCloseTo(-0.0943, 4);
  });

  it.each([
    { dailyVolatility: 0.0114, price: 0.6662 },
    { dailyVolatility: 0.015, price: 1.0752 },
    { dailyVolatility: 0.0219, price: 1.9031 },
  ])('is worth $price at a daily volatility of $dailyVolatility without interest', ({ dailyVolatility, price }) => {
    expect(europeanOptionPrice({ ...plannedCall, dailyVolatility, ratePerYear: 0 })).toBeCloseTo(price, 4);
  });

  it.each([
    { sessions: 10, gammaPerPercent: 0.084 },
    { sessions: 1, gammaPerPercent: 0.266 },
    { sessions: 0.1, gammaPerPercent: 0.841 },
  ])('has a gamma of $gammaPerPercent per 1 % at the money with $sessions sessions left', (row) => {
    const { sessions, gammaPerPercent } = row;
    const atTheMoney = { ...plannedCall, strikePrice: 100, sessions, years: 0, ratePerYear: 0 };
    expect(europeanOptionValue(atTheMoney).gamma).toBeCloseTo(gammaPerPercent, 3); // at 100, 1 % is 1.00
  });
});

describe('European option: properties', () => {
  it('keeps call less put at present spot less present strike', () => {
    fc.assert(
      fc.property(randomOption, (option) => {
        const { spot, strike } = presentValues(option);
        const difference =
          europeanOptionPrice({ ...option, type: 'call' }) - europeanOptionPrice({ ...option, type: 'put' });
        expect(Math.abs(difference - (spot - strike))).toBeLessThanOrEqual(roundingOf(option, 2));
      }),
    );
  });

  it('stays between intrinsic value and the present value of what it can deliver', () => {
    fc.assert(
      fc.property(randomOption, (option) => {
        const { spot, strike } = presentValues(option);
        const intrinsic = option.type === 'call' ? spot - strike : strike - spot;
        const price = europeanOptionPrice(option);
        expect(price).toBeGreaterThanOrEqual(Math.max(intrinsic, 0));
        expect(price).toBeLessThanOrEqual((option.type === 'call' ? spot : strike) + roundingOf(option, 2));
      }),
    );
  });

  it('rises with volatility', () => {
    fc.assert(
      fc.property(randomOption, fc.double({ min: 1.001, max: 2, noNaN: true }), (option, factor) => {
        const wilder = { ...option, dailyVolatility: option.dailyVolatility * factor };
        expect(europeanOptionPrice(wilder)).toBeGreaterThan(europeanOptionPrice(option));
      }),
    );
  });

  it('falls with the strike for a call and rises for a put', () => {
    fc.assert(
      fc.property(randomOption, fc.double({ min: 1.001, max: 1.5, noNaN: true }), (option, factor) => {
        const change =
          europeanOptionPrice({ ...option, strikePrice: option.strikePrice * factor }) - europeanOptionPrice(option);
        expect(option.type === 'call' ? -change : change).toBeGreaterThan(-roundingOf(option, 2));
      }),
    );
  });

  it('scales with spot and strike together', () => {
    fc.assert(
      fc.property(randomOption, (option) => {
        const scaled = { ...option, spotPrice: option.spotPrice * 8, strikePrice: option.strikePrice * 8 };
        expect(europeanOptionPrice(scaled)).toBe(8 * europeanOptionPrice(option)); // powers of two lose no digit
      }),
    );
  });

  it('prices the same alone as with its Greeks', () => {
    fc.assert(
      fc.property(randomOption, (option) => {
        expect(europeanOptionValue(option).price).toBe(europeanOptionPrice(option));
      }),
    );
  });

  it('depends on volatility and sessions through their total deviation only', () => {
    fc.assert(
      fc.property(randomOption, (option) => {
        const onAnotherClock = {
          ...option,
          sessions: option.sessions * 4,
          dailyVolatility: option.dailyVolatility / 2,
        };
        expect(europeanOptionPrice(onAnotherClock)).toBe(europeanOptionPrice(option));
      }),
    );
  });

  it('has delta, gamma, vega and rho as the slopes of its price', () => {
    const slope = (option: EuropeanOption, field: 'spotPrice' | 'dailyVolatility' | 'ratePerYear', step: number) =>
      (europeanOptionPrice({ ...option, [field]: option[field] + step }) -
        europeanOptionPrice({ ...option, [field]: option[field] - step })) /
      (2 * step);
    fc.assert(
      fc.property(randomOption, (option) => {
        const value = europeanOptionValue(option);
        const deviation = option.dailyVolatility * Math.sqrt(option.sessions);
        const move = 1e-3 * deviation * option.spotPrice;
        const deltaSlope =
          (europeanOptionValue({ ...option, spotPrice: option.spotPrice + move }).delta -
            europeanOptionValue({ ...option, spotPrice: option.spotPrice - move }).delta) /
          (2 * move);
        // Steps of a thousandth of a deviation: the error of second order is below 1e-5 of the largest value.
        expect(Math.abs(value.delta - slope(option, 'spotPrice', move))).toBeLessThanOrEqual(1e-5);
        expect(Math.abs(value.gamma - deltaSlope) * option.spotPrice * deviation).toBeLessThanOrEqual(1e-5);
        const vega = slope(option, 'dailyVolatility', 1e-3 * option.dailyVolatility) * 0.01;
        const largestVega = 0.4 * option.spotPrice * Math.sqrt(option.sessions) * 0.01;
        expect(Math.abs(value.vegaPerDailyPoint - vega)).toBeLessThanOrEqual(2e-5 * largestVega);
        const rho = slope(option, 'ratePerYear', 1e-3 * Math.min(1, deviation / option.years)) * 0.01;
        const largestRho = option.strikePrice * option.years * 0.01;
        expect(Math.abs(value.rhoPerPercent - rho)).toBeLessThanOrEqual(1e-5 * largestRho);
      }),
    );
  });

  it('has as theta the price of the option that is left a session later, less its price', () => {
    fc.assert(
      fc.property(randomOption, fc.double({ min: 0, max: 4 / 365, noNaN: true }), (option, yearsPerNextSession) => {
        const isOver = option.sessions <= 1;
        const later = europeanOptionPrice({
          ...option,
          sessions: isOver ? 0 : option.sessions - 1,
          years: isOver ? 0 : Math.max(option.years - yearsPerNextSession, 0),
        });
        const { price, thetaPerSession } = europeanOptionValue(option, yearsPerNextSession);
        // Carried on from today's present values, it may differ from a fresh price by the rounding of those.
        expect(Math.abs(thetaPerSession - (later - price))).toBeLessThanOrEqual(roundingOf(option, 4));
      }),
    );
  });
});

describe('European option: edges', () => {
  it('is worth what it is exercised for once nothing is left', () => {
    const expired = { ...plannedCall, spotPrice: 105, sessions: 0, years: 0 };
    expect(europeanOptionValue(expired)).toEqual({
      price: 3,
      delta: 1,
      gamma: 0,
      vegaPerDailyPoint: 0,
      thetaPerSession: 0,
      rhoPerPercent: 0,
      oddsInTheMoney: 1,
    });
    expect(europeanOptionPrice({ ...expired, type: 'put' })).toBe(0);
  });

  it('takes neither side exactly at the strike without variance', () => {
    for (const type of ['call', 'put'] as const) {
      const value = europeanOptionValue({ ...plannedCall, type, strikePrice: 100, sessions: 0, years: 0 });
      expect(value.price).toBe(0);
      expect(value.oddsInTheMoney).toBe(0.5);
    }
  });

  it('gives call and put odds that sum to 1 exactly at the money', () => {
    const option = { ...plannedCall, strikePrice: 100, years: 0 };
    const call = europeanOptionValue(option);
    const put = europeanOptionValue({ ...option, type: 'put' });
    expect(call.oddsInTheMoney).toBeLessThan(0.5);
    expect(call.oddsInTheMoney + put.oddsInTheMoney).toBe(1);
    expect(call.price).toBe(put.price);
    expect(call.delta - put.delta).toBe(1);
  });

  it('keeps pricing far past the point where a tail is 1e-16', () => {
    const price = europeanOptionPrice({ ...plannedCall, strikePrice: 250, ratePerYear: 0 });
    expect(price).toBeGreaterThan(0);
    expect(price).toBeLessThan(1e-80);
  });

  it('is 0, not negative or NaN, where the tail leaves the doubles', () => {
    const gone = europeanOptionValue({ ...plannedCall, strikePrice: 1e6, dailyVolatility: 1e-5 });
    expect(gone.price).toBe(0);
    expect(Object.values(gone).every(Number.isFinite)).toBe(true);
  });

  it.each([
    ['spotPrice', 0],
    ['spotPrice', Infinity],
    ['strikePrice', -1],
    ['strikePrice', NaN],
    ['dailyVolatility', -0.01],
    ['dailyVolatility', NaN],
    ['sessions', -1],
    ['sessions', Infinity],
    ['years', -0.1],
    ['years', NaN],
    ['ratePerYear', NaN],
    ['ratePerYear', -Infinity],
    ['dividendYield', Infinity],
  ] as const)('throws option-input-invalid naming %s for %p', (field, value) => {
    const refusal = expect.objectContaining({ code: 'option-input-invalid', details: { field, value } });
    expect(() => europeanOptionPrice({ ...plannedCall, [field]: value })).toThrow(refusal);
    expect(() => europeanOptionValue({ ...plannedCall, [field]: value })).toThrow(refusal);
  });
});
