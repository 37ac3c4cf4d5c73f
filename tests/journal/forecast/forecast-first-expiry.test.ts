import { payoffAt, expiryPayoff } from '@/journal/contracts/expiry-payoff';
import { type PlannedLeg } from '@/journal/contracts/planned-leg';
import { normalCumulative } from '@/journal/distributions/normal-distribution';
import { forecastFirstExpiry } from '@/journal/forecast/forecast-first-expiry';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { makeForecast } from '@/journal/forecast/make-forecast';
import { europeanOptionPrice } from '@/journal/pricing/european-option';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { bullPut, closeOf, longCall } from '@/tests/journal/forecast/plan-examples';

const [model] = longCall.legs;
if (model === undefined) throw new Error('the example has one leg');
const leg = (id: string, given: Partial<PlannedLeg>): PlannedLeg => ({ ...model, id, type: 'call', ...given });

// Worked values, computed outside this project with Python: after the close of 24 November 2026, the day after next has an early close.
const holiday: ForecastInput = {
  ...longCall,
  spot: { price: '100', at: closeOf('2026-11-24'), source: 'bar' },
  volatility: { ...longCall.volatility, low: 0.012, base: 0.012, high: 0.012 },
  legs: [
    leg('front', { side: 'sell', strikePrice: '100', premium: '0.62', expirySessionDate: '2026-11-27' }),
    leg('back', { side: 'buy', strikePrice: '100', premium: '1.24', expirySessionDate: '2026-12-04' }),
  ],
};
const forecastOf = (input: ForecastInput) => forecastFirstExpiry(input, usOptionsCalendar);

describe('a calendar over a holiday', () => {
  it('has 1.6769 and 6.6769 sessions and is worth 0.6170', () => {
    const { sessions, modelValue, structureName } = forecastOf(holiday);
    expect(structureName).toBe('long call calendar 100');
    expect(sessions.toFirstExpiry).toBeCloseTo(1.6769, 4);
    expect(sessions.toLastExpiry).toBeCloseTo(6.6769, 4);
    expect(modelValue.base / 100).toBeCloseTo(0.617, 4);
  });

  it('says that its ends rest on a model, and which leg lives on', () => {
    const { isByModel, legs } = forecastOf(holiday);
    expect(isByModel).toBe(true);
    expect(legs.map(({ valuedBy }) => valuedBy)).toEqual(['pay-off', 'model']);
    expect(legs[1]?.sessionsLeft).toBeCloseTo(5, 9);
  });

  it('gains most at the strike, loses about its cost far from it, and breaks even where the back leg pays for both', () => {
    const { breakEvens, greatestGain, greatestLoss, legs, atFirstExpiry } = forecastOf(holiday);
    const costs = 62 + 1.3 + 0.65;
    const back = (spotPrice: number) =>
      europeanOptionPrice({
        type: 'call',
        strikePrice: 100,
        spotPrice,
        dailyVolatility: legs[1]?.impliedDailyVolatility ?? 0,
        sessions: 5,
        years: 7 / 365,
        ratePerYear: 0,
        dividendYield: 0,
      });
    const profit = (spotPrice: number) => 100 * (back(spotPrice) - Math.max(0, spotPrice - 100)) - costs;
    expect(greatestGain).toBeCloseTo(profit(100), 6);
    expect(greatestLoss).toBeCloseTo(-costs, 6);
    expect(breakEvens).toHaveLength(2);
    for (const price of breakEvens) expect(profit(price)).toBeCloseTo(0, 8);
    const deviation = 0.012 * Math.sqrt(1.676923076923077);
    const [below = 0, above = 0] = breakEvens.map((price) =>
      normalCumulative((Math.log(price / 100) + deviation ** 2 / 2) / deviation),
    );
    expect(atFirstExpiry.oddsOfProfit.base).toBeCloseTo(above - below, 10);
  });
});

describe('a diagonal', () => {
  it('may lose more than it cost where the strikes cross', () => {
    const crossed: ForecastInput = {
      ...holiday,
      legs: [
        leg('front', { side: 'sell', strikePrice: '98', premium: '2.40', expirySessionDate: '2026-11-27' }),
        leg('back', { side: 'buy', strikePrice: '102', premium: '0.55', expirySessionDate: '2026-12-04' }),
      ],
    };
    const { greatestLoss, structureName } = forecastOf(crossed);
    expect(structureName).toBe('long call diagonal 98 / 102');
    expect(greatestLoss).toBeCloseTo(-(400 - 185 + 1.3 + 0.65), 4);
  });
});

describe('one expiry', () => {
  it('has the ends, break-evens, mean and odds of the forecast at expiry', () => {
    const first = forecastOf(bullPut);
    const whole = makeForecast(bullPut, usOptionsCalendar);
    expect(first.isByModel).toBe(false);
    expect(first.greatestGain).toBeCloseTo(53.7, 9);
    expect(first.greatestLoss).toBeCloseTo(-146.3, 9);
    expect(first.breakEvens[0]).toBeCloseTo(96.463, 9);
    expect(first.atFirstExpiry.mean.high).toBeCloseTo(whole.atExpiry.mean.high, 7);
    expect(first.atFirstExpiry.oddsOfProfit.low).toBeCloseTo(whole.atExpiry.oddsOfProfit.low, 10);
    expect(first.atFirstExpiry.expectedShortfall).toBeCloseTo(whole.atExpiry.expectedShortfall, 6);
    const payoff = expiryPayoff({
      legs: [
        { type: 'put', strikePrice: 97, signedShares: -100 },
        { type: 'put', strikePrice: 95, signedShares: 100 },
      ],
      cost: -53.7,
    });
    expect(payoffAt(payoff, first.breakEvens[0] ?? 0)).toBeCloseTo(0, 9);
  });
});

it.each<[string, ForecastInput, string]>([
  ['no legs', { ...holiday, legs: [] }, 'legs-missing'],
  [
    'an expiry on a holiday',
    { ...holiday, legs: holiday.legs.map((each) => ({ ...each, expirySessionDate: '2026-11-26' })) },
    'expiry-not-a-session',
  ],
  [
    'an expiry in the past',
    { ...holiday, legs: holiday.legs.map((each) => ({ ...each, expirySessionDate: '2026-11-24' })) },
    'expiry-in-the-past',
  ],
  ['volatilities out of order', { ...holiday, volatility: { ...holiday.volatility, low: 0.1 } }, 'volatility-order'],
  ['legs of one id', { ...holiday, legs: holiday.legs.map((each) => ({ ...each, id: 'a' })) }, 'leg-id-repeated'],
])('refuses %s', (_, input, code) => {
  expect(() => forecastOf(input)).toThrow(code);
});
