import { makeForecast } from '@/journal/forecast/make-forecast';
import { planHorizon } from '@/journal/forecast/plan-horizon';
import { planModel } from '@/journal/forecast/plan-model';
import { resampledForecast } from '@/journal/forecast/resampled-forecast';
import { resampledProfit } from '@/journal/forecast/resampled-profit';
import { seededRandom } from '@/journal/random/seeded-random';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { bullPut } from '@/tests/journal/forecast/plan-examples';

const profitAt = (price: number) => price - 100;
const hundred = Array.from({ length: 100 }, (_, index) => Math.log(1 + (index - 49) / 100));

describe('resampledProfit', () => {
  it('has the mean, share, percentiles and worst mean of a sample done by hand', () => {
    // Profits −49 to 50 in whole steps.
    const { mean, oddsOfProfit, expectedShortfall, percentiles, paths } = resampledProfit({
      profitAt,
      spotPrice: 100,
      totalLogReturns: hundred,
    });
    expect(paths).toBe(100);
    expect(mean.value).toBeCloseTo(0.5, 9);
    expect(mean.error).toBeCloseTo(29.0115 / 10, 4);
    expect(oddsOfProfit.value).toBe(0.5);
    expect(oddsOfProfit.error).toBeCloseTo(0.05, 12);
    expect(expectedShortfall.value).toBeCloseTo(-47, 9);
    expect(percentiles.map(({ profit }) => Math.round(profit))).toEqual([-45, -25, 0, 25, 45]);
    for (const { profit, low, high } of percentiles) {
      expect(low).toBeLessThanOrEqual(profit);
      expect(high).toBeGreaterThanOrEqual(profit);
    }
  });

  it('gives a certain share the error of one path', () => {
    const { oddsOfProfit } = resampledProfit({ profitAt: () => 1, spotPrice: 100, totalLogReturns: hundred });
    expect(oddsOfProfit.value).toBe(1);
    expect(oddsOfProfit.error).toBeCloseTo(Math.sqrt((0.01 * 0.99) / 100), 12);
  });

  it.each<[string, Partial<Parameters<typeof resampledProfit>[0]>, string]>([
    ['99 paths', { totalLogReturns: hundred.slice(1) }, 'resampled-paths-too-few'],
    ['a return that is no number', { totalLogReturns: [...hundred, NaN] }, 'resampled-return-invalid'],
    ['a spot of 0', { spotPrice: 0 }, 'spot-not-positive'],
  ])('refuses %s', (_, given, code) => {
    expect(() => resampledProfit({ profitAt, spotPrice: 100, totalLogReturns: hundred, ...given })).toThrow(code);
  });
});

describe('resampledForecast', () => {
  it.each(['toExpiry', 'sessions'] as const)(
    'agrees with the lognormal law, held %s, within four errors on normal draws',
    (kind) => {
      const input = { ...bullPut, holding: kind === 'toExpiry' ? { kind } : { kind, sessions: 4 } };
      const model = planModel(input, planHorizon(input, usOptionsCalendar));
      const random = seededRandom(20261209);
      const deviation = 0.015 * Math.sqrt(model.horizon.sessions.holding);
      const totalLogReturns = Float64Array.from(
        { length: 10_000 },
        () => deviation * random.normal() - deviation ** 2 / 2,
      );
      const sampled = resampledForecast(model, totalLogReturns);
      const { atExit, atExpiry } = makeForecast(input, usOptionsCalendar);
      const exact = atExit ?? atExpiry;
      for (const [figure, value] of [
        [sampled.mean, exact.mean.base],
        [sampled.oddsOfProfit, exact.oddsOfProfit.base],
        [sampled.expectedShortfall, exact.expectedShortfall],
      ] as const) {
        expect(Math.abs(figure.value - value)).toBeLessThanOrEqual(4 * figure.error + 1e-9);
      }
      for (const { percent, low, high } of sampled.percentiles) {
        const { profit = NaN } = exact.percentiles.find((each) => each.percent === percent) ?? {};
        expect(profit).toBeGreaterThanOrEqual(low - 2);
        expect(profit).toBeLessThanOrEqual(high + 2);
      }
    },
  );
});
