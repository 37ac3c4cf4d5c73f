import fc from 'fast-check';
import { DomainError } from '@/journal/errors/domain-error';
import { makeForecast } from '@/journal/forecast/make-forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { bullPut, closeOf, longCall } from '@/tests/journal/forecast/plan-examples';

const forecastOf = (input: ForecastInput) => makeForecast(input, usOptionsCalendar);
const oddsOf = (input: ForecastInput, key: string) => {
  const odds = forecastOf(input).odds.find((stated) => stated.key === key);
  if (odds === undefined) throw new Error(`no odds ${key}`);
  return odds;
};
const callKey = `in-the-money:${longCall.legs[0]?.id ?? ''}`;

// Worked values, computed outside this project with Python.
describe('the long 102 call of tests A and C', () => {
  it('counts ten sessions and fourteen days', () => {
    const { sessions, years, exitSessionDate } = forecastOf(longCall);
    expect(sessions).toEqual({ toExpiry: 10, holding: 10 });
    expect(years.toExpiry).toBeCloseTo(14 / 365, 12);
    expect(exitSessionDate).toBe('2026-12-23');
  });

  it('is worth 1.12767 at a rate of 4% and 1.07522 at 0', () => {
    expect(forecastOf({ ...longCall, ratePerYear: 0.04 }).legs[0]?.modelPrice.base).toBeCloseTo(1.12767, 5);
    expect(forecastOf(longCall).legs[0]?.modelPrice.base).toBeCloseTo(1.07522, 5);
  });

  it('is worth 0.6662, 1.0752 and 1.9031 at low, base and high volatility', () => {
    const price = forecastOf(longCall).legs[0]?.modelPrice;
    expect(price?.low).toBeCloseTo(0.6662, 4);
    expect(price?.high).toBeCloseTo(1.9031, 4);
  });

  it('finishes in the money with 34.13% risk-neutral and 32.95% at zero expected return', () => {
    const dear = { ...longCall, ratePerYear: 0.04 };
    expect(oddsOf({ ...dear, drift: { kind: 'riskNeutral' } }, callKey).probability.base).toBeCloseTo(0.3413, 4);
    expect(oddsOf(dear, callKey).probability.base).toBeCloseTo(0.3295, 4);
  });

  it('makes a profit with 18.6, 24.6 and 31.2% before the fee at low, base and high volatility', () => {
    const { probability } = oddsOf({ ...longCall, feePerContract: '0' }, 'profit-at-expiry');
    expect(probability.low).toBeCloseTo(0.186, 3);
    expect(probability.base).toBeCloseTo(0.2458, 4);
    expect(probability.high).toBeCloseTo(0.312, 3);
  });

  it('loses 13.13 on average, 120.65 at most with 67.05%, and 120.65 in its worst twentieth', () => {
    const { atExpiry, ends } = forecastOf(longCall);
    expect(atExpiry.mean.base).toBeCloseTo(-13.13, 2);
    expect(atExpiry.mean.low).toBeCloseTo(-54.03, 2);
    expect(atExpiry.mean.high).toBeCloseTo(69.66, 2);
    expect(ends.greatestLoss).toBeCloseTo(-120.65, 9);
    expect(ends.oddsOfGreatestLoss).toBeCloseTo(0.6705, 4);
    expect(ends.greatestGain).toBeNull();
    expect(atExpiry.oddsOfProfit.base).toBeCloseTo(0.245, 3);
    expect(atExpiry.expectedShortfall).toBeCloseTo(-120.65, 9);
  });

  it('has theta −0.0943 over the next session, vega 1.182 per point and rho 0.0133 per percent at a rate of 4%', () => {
    const greeks = forecastOf({ ...longCall, ratePerYear: 0.04 }).legs[0]?.greeks;
    expect(greeks?.delta).toBeCloseTo(0.35889, 5);
    expect(greeks?.gamma).toBeCloseTo(0.0788, 4); // 0.0788 per 1 % at 100
    expect(greeks?.vegaPerDailyPoint).toBeCloseTo(1.182, 3); // 0.1182 per 0.10 point
    expect(greeks?.thetaPerSession).toBeCloseTo(-0.0943, 4);
    expect(greeks?.rhoPerPercent).toBeCloseTo(0.0133, 4);
  });

  it('touches 102 with 66.96% at zero expected return', () => {
    expect(oddsOf({ ...longCall, targetPrice: '102' }, 'touch-target').probability.base).toBeCloseTo(0.6696, 4);
  });
});

describe('the bull put 97 / 95 of test C', () => {
  it('gains 53.70 at most, loses 146.30 with 14.51%, breaks even at 96.463 and makes a profit with 76.9%', () => {
    const { ends, atExpiry, structureName } = forecastOf(bullPut);
    expect(structureName).toBe('bull put 97 / 95');
    expect(ends.greatestGain).toBeCloseTo(53.7, 9);
    expect(ends.greatestLoss).toBeCloseTo(-146.3, 9);
    expect(ends.oddsOfGreatestLoss).toBeCloseTo(0.1451, 4);
    expect(ends.breakEvens).toHaveLength(1);
    expect(ends.breakEvens[0]).toBeCloseTo(96.463, 9);
    expect(atExpiry.mean.base).toBeCloseTo(13.08, 2);
    expect(atExpiry.oddsOfProfit.base).toBeCloseTo(0.769, 3);
    expect(atExpiry.expectedShortfall).toBeCloseTo(-146.3, 6);
  });

  it('gives the odds, market odds and means of three spreads that the screens were drawn with', () => {
    const three = { ...bullPut, legs: bullPut.legs.map((leg) => ({ ...leg, quantity: 3 })) };
    const { atExpiry, odds, cost } = forecastOf(three);
    expect(atExpiry.mean.base).toBeCloseTo(39.24, 2);
    expect(atExpiry.mean.high).toBeCloseTo(-12.98, 0);
    expect(odds.find(({ key }) => key === 'profit-at-expiry')?.marketImplied).toBeCloseTo(0.7, 2);
    expect(cost.netPremium).toBe('-165');
    expect(cost.feesToOpen).toBe('3.9');
  });
});

describe('a plan that exits before expiry', () => {
  const early: ForecastInput = { ...longCall, holding: { kind: 'sessions', sessions: 3 } };

  it('exits at the close three sessions later', () => {
    const { exitAt, exitSessionDate, sessions } = forecastOf(early);
    expect(exitSessionDate).toBe('2026-12-14');
    expect(exitAt).toBe(closeOf('2026-12-14'));
    expect(sessions.holding).toBe(3);
  });

  it('loses on average what implied volatility costs above the trader’s own, and both fees', () => {
    // Priced at implied and moved at implied, the price is fair: with r = 0 the mean is minus both fees.
    const implied = forecastOf(early).impliedDailyVolatility ?? 0;
    const fair: ForecastInput = {
      ...early,
      volatility: { ...early.volatility, low: implied, base: implied, high: implied },
    };
    expect(forecastOf(fair).atExit?.mean.base).toBeCloseTo(-1.3, 6);
  });

  it('has percentiles in order and odds of profit between those of low and high volatility', () => {
    const { atExit } = forecastOf(early);
    const profits = atExit?.percentiles.map(({ profit }) => profit) ?? [];
    expect(profits).toEqual([...profits].sort((left, right) => left - right));
    expect(atExit?.lumps).toEqual([]);
    const total = atExit?.classes.reduce((sum, { probability }) => sum + probability, 0) ?? 0;
    expect(total).toBeGreaterThan(0.97);
    expect(total).toBeLessThanOrEqual(1);
  });
});

describe('scenario 1, a same-day index call', () => {
  // Worked outside this project: 12:30 New York, ZZIX 4000, 0.90 % a session, 4010 call at 4.20, fee 1.17.
  const sameDay: ForecastInput = {
    ...longCall,
    underlying: { ...longCall.underlying, symbol: 'ZZIX' },
    spot: { price: '4000', at: '2026-12-09T17:30:00.000Z', source: 'typed' },
    legs: longCall.legs.map((leg) => ({
      ...leg,
      strikePrice: '4010',
      premium: '4.20',
      expirySessionDate: '2026-12-09',
    })),
    volatility: { ...longCall.volatility, low: 0.009, base: 0.009, high: 0.009 },
    feePerContract: '1.17',
    targetPrice: '4010',
  };

  it('has 0.3769 sessions left, value 4.71, odds 32.5%, profit 26.0%, touch 65.1%, mean +50.30', () => {
    const { sessions, legs, odds, atExpiry } = forecastOf(sameDay);
    expect(sessions.toExpiry).toBeCloseTo(0.3769, 4);
    expect(legs[0]?.modelPrice.base).toBeCloseTo(4.71, 2);
    const odd = Object.fromEntries(odds.map(({ key, probability }) => [key, probability.base]));
    expect(odd[callKey]).toBeCloseTo(0.325, 3);
    expect(odd['profit-at-expiry']).toBeCloseTo(0.26, 3);
    expect(odd['touch-target']).toBeCloseTo(0.651, 3);
    expect(atExpiry.mean.base).toBeCloseTo(50.3, 1);
  });
});

describe('the lattice', () => {
  it('has its likelihoods sum to 1 in each column, all of it on no move at the start', () => {
    const { likelihood, rows, sessionsElapsed } = forecastOf(bullPut).lattice;
    for (const column of sessionsElapsed.keys()) {
      expect(likelihood.reduce((sum, row) => sum + (row[column] ?? 0), 0)).toBeCloseTo(1, 12);
    }
    expect(likelihood[rows.findIndex(({ sigma }) => sigma === 0)]?.[0]).toBe(1);
  });

  it('ends in the pay-off at expiry', () => {
    const { profit, sessionsElapsed, rows } = forecastOf(bullPut).lattice;
    const last = sessionsElapsed.length - 1;
    expect(profit[0]?.[last]).toBeCloseTo(53.7, 9);
    expect(profit[rows.length - 1]?.[last]).toBeCloseTo(-146.3, 9);
  });
});

describe('makeForecast refuses', () => {
  const refusals: readonly (readonly [string, ForecastInput, string])[] = [
    ['a plan without legs', { ...longCall, legs: [] }, 'legs-missing'],
    [
      'legs of two expiries',
      {
        ...bullPut,
        legs: bullPut.legs.map((leg, index) => (index === 1 ? { ...leg, expirySessionDate: '2026-12-18' } : leg)),
      },
      'legs-of-several-expiries',
    ],
    [
      'an expiry on a holiday',
      { ...longCall, legs: longCall.legs.map((leg) => ({ ...leg, expirySessionDate: '2026-12-25' })) },
      'expiry-not-a-session',
    ],
    [
      'an expiry in the past',
      { ...longCall, legs: longCall.legs.map((leg) => ({ ...leg, expirySessionDate: '2026-12-08' })) },
      'expiry-in-the-past',
    ],
    ['a hold beyond expiry', { ...longCall, holding: { kind: 'sessions', sessions: 11 } }, 'holding-beyond-expiry'],
    ['a hold of nothing', { ...longCall, holding: { kind: 'sessions', sessions: 0 } }, 'holding-not-positive'],
    [
      'a strike of 0',
      { ...longCall, legs: longCall.legs.map((leg) => ({ ...leg, strikePrice: '0' })) },
      'strike-not-positive',
    ],
    [
      'volatilities out of order',
      { ...longCall, volatility: { ...longCall.volatility, low: 0.02 } },
      'volatility-order',
    ],
    [
      'a premium that is no number',
      { ...longCall, legs: longCall.legs.map((leg) => ({ ...leg, premium: '1,20' })) },
      'decimal-invalid',
    ],
    ...[0, 1.5, -1, NaN, Infinity].map((quantity): readonly [string, ForecastInput, string] => [
      `a quantity of ${quantity}`,
      { ...longCall, legs: longCall.legs.map((leg) => ({ ...leg, quantity })) },
      'leg-quantity-invalid',
    ]),
    [
      'a premium below 0',
      { ...longCall, legs: longCall.legs.map((leg) => ({ ...leg, premium: '-0.01' })) },
      'leg-premium-negative',
    ],
    ['a fee below 0', { ...longCall, feePerContract: '-0.65' }, 'fee-negative'],
    [
      'a multiplier of 0',
      { ...longCall, underlying: { ...longCall.underlying, multiplier: '0' } },
      'multiplier-not-positive',
    ],
    ['legs of one id', { ...longCall, legs: [...longCall.legs, ...longCall.legs] }, 'leg-id-repeated'],
    ['a spot of 0', { ...longCall, spot: { ...longCall.spot, price: '0' } }, 'spot-not-positive'],
    ['a rate that is no number', { ...longCall, ratePerYear: NaN }, 'rate-not-finite'],
    ['an overnight share above 1', { ...longCall, overnightShare: 1.01 }, 'overnight-share-out-of-range'],
    ['a target of 0', { ...longCall, targetPrice: '0' }, 'level-not-positive'],
    ['a stop at the price', { ...longCall, stopPrice: '100.00' }, 'level-at-spot'],
    [
      'target and stop on one side',
      { ...longCall, targetPrice: '104', stopPrice: '102' },
      'target-and-stop-on-one-side',
    ],
  ];
  it.each(refusals)('%s', (_, input, code) => {
    expect(() => forecastOf(input)).toThrow(DomainError);
    expect(() => forecastOf(input)).toThrow(code);
  });
});

describe('any plan of up to four legs', () => {
  const leg = fc.record({
    side: fc.constantFrom('buy' as const, 'sell' as const),
    type: fc.constantFrom('call' as const, 'put' as const),
    strike: fc.integer({ min: 60, max: 150 }),
    quantity: fc.integer({ min: 1, max: 20 }),
    premium: fc.integer({ min: 0, max: 900 }),
  });
  const plan = fc.record({
    legs: fc.array(leg, { minLength: 1, maxLength: 4 }),
    base: fc.double({ min: 0.003, max: 0.08, noNaN: true }),
    hold: fc.option(fc.double({ min: 0.1, max: 9.9, noNaN: true })),
    rate: fc.double({ min: -0.02, max: 0.1, noNaN: true }),
  });

  it('gives finite figures, probabilities that sum to 1, and means between the ends', () => {
    fc.assert(
      fc.property(plan, ({ legs, base, hold, rate }) => {
        const forecast = forecastOf({
          ...longCall,
          ratePerYear: rate,
          holding: hold === null ? { kind: 'toExpiry' } : { kind: 'sessions', sessions: hold },
          volatility: { ...longCall.volatility, low: base * 0.8, base, high: base * 1.3 },
          legs: legs.map(({ side, type, strike, quantity, premium }, index) => ({
            id: `01940000-0000-7000-8000-00000000000${index}`,
            side,
            type,
            strikePrice: String(strike),
            expirySessionDate: '2026-12-23',
            quantity,
            premium: (premium / 100).toFixed(2),
          })),
        });
        expect(
          JSON.stringify(forecast, (_, value: unknown) =>
            typeof value === 'number' && !Number.isFinite(value) ? 'BAD' : value,
          ),
        ).not.toContain('BAD');
        for (const { probability, marketImplied } of forecast.odds) {
          for (const value of [probability.low, probability.base, probability.high, marketImplied ?? 0]) {
            expect(value).toBeGreaterThanOrEqual(0);
            expect(value).toBeLessThanOrEqual(1);
          }
        }
        const { greatestGain, greatestLoss } = forecast.ends;
        const { base: mean } = forecast.atExpiry.mean;
        if (greatestGain !== null) expect(mean).toBeLessThanOrEqual(greatestGain + 1e-6);
        if (greatestLoss !== null) expect(mean).toBeGreaterThanOrEqual(greatestLoss - 1e-6);
      }),
      { seed: 20261209, numRuns: 150 },
    );
  });
});
