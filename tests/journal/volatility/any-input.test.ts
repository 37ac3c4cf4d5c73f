import fc from 'fast-check';
import { DomainError } from '@/journal/errors/domain-error';
import { adjustBars, adjustedLogReturns } from '@/journal/returns/adjust-prices';
import { findSuspectPrices } from '@/journal/returns/find-suspect-prices';
import { logReturns } from '@/journal/returns/log-returns';
import { normalFit } from '@/journal/returns/normal-fit';
import { varianceRatio, varianceRatioOfAutocorrelations } from '@/journal/returns/variance-ratio';
import { annualizedVolatility } from '@/journal/volatility/annualized-volatility';
import { bootstrapVolatilityInterval } from '@/journal/volatility/bootstrap-volatility-interval';
import { estimateVolatility } from '@/journal/volatility/estimate-volatility';
import { fatTailVolatilityInterval } from '@/journal/volatility/fat-tail-volatility-interval';
import { overnightShare } from '@/journal/volatility/overnight-share';
import { placeInOwnYear } from '@/journal/volatility/place-in-own-year';
import { volatilityByHorizon } from '@/journal/volatility/volatility-by-horizon';
import { volatilityInterval } from '@/journal/volatility/volatility-interval';
import { volatilityLadder } from '@/journal/volatility/volatility-ladder';

const SEED = 20261201;

const awkward = fc.oneof(
  { weight: 3, arbitrary: fc.double({ min: 1, max: 200, noNaN: true }) },
  { weight: 1, arbitrary: fc.double({ min: -1e308, max: 1e308, noNaN: true }) },
  {
    weight: 1,
    arbitrary: fc.constantFrom(
      0,
      -0,
      1,
      Number.MIN_VALUE,
      Number.MAX_VALUE,
      Infinity,
      -Infinity,
      Number.NaN,
      1e-300,
      2 ** -1022,
    ),
  },
);
const positive = fc.oneof(
  fc.double({ min: 1, max: 200, noNaN: true }),
  fc.double({ min: Number.MIN_VALUE, max: Number.MAX_VALUE, noNaN: true }),
);
const prices = fc.oneof(fc.array(awkward, { maxLength: 30 }), fc.array(positive, { minLength: 3, maxLength: 30 }));
const method = fc.oneof(
  fc.record({
    kind: fc.constant('close' as const),
    window: awkward,
    mean: fc.constantFrom('sample' as const, 'zero' as const),
  }),
  fc.record({
    kind: fc.constant('ewma' as const),
    lambda: fc.oneof(awkward, fc.double({ min: 0, max: 1, noNaN: true })),
    start: fc.record({
      kind: fc.constantFrom('firstSquares' as const, 'lastReturns' as const),
      count: fc.oneof(awkward, fc.integer({ min: 0, max: 9 })),
    }),
  }),
  fc.record({
    kind: fc.constantFrom(
      'parkinson' as const,
      'garmanKlass' as const,
      'rogersSatchell' as const,
      'garmanKlassYangZhang' as const,
      'yangZhang' as const,
    ),
    window: fc.oneof(awkward, fc.integer({ min: 0, max: 9 })),
  }),
);

/** Numbers anywhere in a result that are not finite. */
function notFinite(value: unknown): unknown[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [value];
  if (typeof value !== 'object' || value === null) return [];
  return Object.values(value).flatMap(notFinite);
}

/** Runs it and gives what is not finite in its result; a documented refusal is none, any other throw fails the test. */
function faultsOf(run: () => unknown): unknown[] {
  try {
    return notFinite(run());
  } catch (error) {
    if (error instanceof DomainError) return [];
    throw error;
  }
}

const barsOf = (values: readonly number[]) =>
  values.map((value, at) => ({
    sessionDate: `2026-01-${String(at + 1).padStart(2, '0')}`,
    open: value,
    high: Math.max(value, values[at + 1] ?? value),
    low: Math.min(value, values[at + 1] ?? value),
    close: values[at + 1] ?? value,
  }));

describe('for any input whatever, results are finite and refusals documented', () => {
  const holds = <Input>(inputs: fc.Arbitrary<Input>, run: (input: Input) => unknown, numRuns = 1500) =>
    fc.assert(
      fc.property(inputs, (input) => {
        expect(faultsOf(() => run(input))).toEqual([]);
      }),
      { seed: SEED, numRuns },
    );

  it('in estimates', () => {
    holds(
      fc.tuple(prices, method, fc.oneof(fc.constant(0.95), awkward)),
      ([values, one, confidence]) => {
        const { dailyVolatility, mean, low, high, degreesOfFreedom } = estimateVolatility(
          { bars: barsOf(values) },
          one,
          confidence,
        );
        return [dailyVolatility, mean, low, high, degreesOfFreedom];
      },
      4000,
    );
    holds(prices, (values) => volatilityLadder(values));
  });

  it('in intervals', () => {
    const degreesOfFreedom = fc.oneof(awkward, fc.double({ min: 0.5, max: 1e9, noNaN: true }));
    holds(
      fc.record({ dailyVolatility: awkward, degreesOfFreedom, confidence: fc.oneof(fc.constant(0.9), awkward) }),
      volatilityInterval,
    );
    holds(
      fc.record({
        dailyVolatility: awkward,
        count: awkward,
        kurtosis: awkward,
        confidence: fc.oneof(fc.constant(0.9), awkward),
      }),
      fatTailVolatilityInterval,
    );
    holds(prices, (values) => bootstrapVolatilityInterval(values, { seed: 1, resamples: 100, mean: 'sample' }), 150);
  });

  it('in statistics', () => {
    holds(prices, (values) => [logReturns(values)]);
    holds(prices, (values) => normalFit(values));
    holds(fc.tuple(prices, fc.oneof(awkward, fc.integer({ min: 1, max: 9 }))), ([values, sessions]) =>
      varianceRatio(values, { sessions }),
    );
    holds(fc.tuple(prices, awkward), ([values, sessions]) => varianceRatioOfAutocorrelations(values, sessions));
  });

  it('in places among the past and shares by night', () => {
    holds(fc.tuple(prices, fc.oneof(fc.constant(3), awkward)), ([values, window]) => placeInOwnYear(values, window));
    holds(fc.tuple(awkward, awkward), ([daily, sessions]) => annualizedVolatility(daily, sessions));
    holds(prices, (values) => volatilityByHorizon(values, { horizons: [1, 2], window: 4 }), 300);
    holds(prices, (values) => overnightShare(barsOf(values), { seed: 1, resamples: 100 }), 150);
  });

  it('in adjusted and suspect prices', () => {
    const actions = fc.array(
      fc.oneof(
        fc.record({
          kind: fc.constant('split' as const),
          exSessionDate: fc.constant('2026-01-03'),
          newShares: awkward,
          oldShares: awkward,
        }),
        fc.record({
          kind: fc.constant('cashDividend' as const),
          exSessionDate: fc.constant('2026-01-02'),
          amount: awkward,
        }),
      ),
      { maxLength: 3 },
    );
    holds(fc.tuple(prices, actions), ([values, some]) => [
      adjustedLogReturns(barsOf(values), some),
      adjustBars(barsOf(values), some),
    ]);
    holds(prices, (values) => findSuspectPrices(barsOf(values)));
  });
});
