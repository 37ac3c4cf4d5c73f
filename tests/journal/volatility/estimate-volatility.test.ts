import fc from 'fast-check';
import { DomainError } from '@/journal/errors/domain-error';
import { type PriceBar } from '@/journal/returns/price-bar';
import { annualizedVolatility } from '@/journal/volatility/annualized-volatility';
import { estimateCloseVolatility } from '@/journal/volatility/estimate-close-volatility';
import { estimateRangeVolatility } from '@/journal/volatility/estimate-range-volatility';
import { estimateVolatility, largestWindow } from '@/journal/volatility/estimate-volatility';
import { ewmaEffectiveReturns } from '@/journal/volatility/ewma-daily-volatility';
import { garmanKlassDailyVolatility } from '@/journal/volatility/garman-klass-daily-volatility';
import { garmanKlassYangZhangDailyVolatility } from '@/journal/volatility/garman-klass-yang-zhang-daily-volatility';
import { parkinsonDailyVolatility } from '@/journal/volatility/parkinson-daily-volatility';
import { yangZhangReturns } from '@/journal/volatility/range-effective-returns';
import { rogersSatchellDailyVolatility } from '@/journal/volatility/rogers-satchell-daily-volatility';
import { volatilityLadder } from '@/journal/volatility/volatility-ladder';
import { type RangeMethod, type VolatilityMethod } from '@/journal/volatility/volatility-method';
import { yangZhangDailyVolatility, yangZhangWeight } from '@/journal/volatility/yang-zhang-daily-volatility';

const SEED = 20261201;
const rangeKinds = ['parkinson', 'garmanKlass', 'rogersSatchell', 'garmanKlassYangZhang', 'yangZhang'] as const;

/** Bars from any four positive prices. */
const bar = (price: fc.Arbitrary<number>) =>
  fc.tuple(price, price, price, price).map((prices): PriceBar => {
    const [low = 1, open = 1, close = 1, high = 1] = [...prices].sort((left, right) => left - right);
    return { open, high, low, close };
  });
const ordinaryPrice = fc.double({ min: 50, max: 200, noNaN: true });
const anyPositive = fc.double({ min: Number.MIN_VALUE, max: Number.MAX_VALUE, noNaN: true });

const codeOf = (run: () => unknown): string => {
  try {
    run();
  } catch (error) {
    if (error instanceof DomainError) return error.code;
    throw error;
  }
  return 'none';
};

describe('worked values computed outside this project with Python', () => {
  const closes = [50, 50.5, 49.75, 50.25, 51, 50.4];

  it('are met by closes about their mean and about 0', () => {
    const sample = estimateCloseVolatility(closes, { kind: 'close', window: 5 });
    expect(sample.mean).toBeCloseTo(0.001594, 6);
    expect(sample.dailyVolatility).toBeCloseTo(0.013872, 6);
    expect(sample.degreesOfFreedom).toBe(4);
    const zero = estimateCloseVolatility(closes, { kind: 'close', window: 5, mean: 'zero' });
    expect(zero.dailyVolatility).toBeCloseTo(0.01251, 6);
    expect(zero).toMatchObject({ mean: 0, degreesOfFreedom: 5, returnsUsed: 5 });
  });

  it('are met by the range of one bar', () => {
    const bars = [{ open: 50.1, high: 51, low: 49.8, close: 50.7 }];
    expect(parkinsonDailyVolatility(bars)).toBeCloseTo(0.0143, 6);
    expect(garmanKlassDailyVolatility(bars)).toBeCloseTo(0.015124, 6);
    expect(rogersSatchellDailyVolatility(bars)).toBeCloseTo(0.014581, 6);
  });

  it('are met by a year of 252 sessions: 22.02 %', () => {
    const { dailyVolatility } = estimateCloseVolatility(closes, { kind: 'close', window: 5 });
    expect(annualizedVolatility(dailyVolatility)).toBeCloseTo(0.2202, 4);
  });

  it('are met by the effective returns of the weighted method: 32.3 at 0.94', () => {
    expect(ewmaEffectiveReturns(0.94)).toBeCloseTo(32.3, 1);
  });

  it('are met by the weight of Yang and Zhang at 20 sessions', () => {
    expect(yangZhangWeight(20)).toBeCloseTo(0.139, 4);
  });

  it('have Yang-Zhang tell more than six times as much as closes over 20 sessions with 30 % by night', () => {
    const returns = yangZhangReturns({ nightVariance: 0.3, dayVariance: 0.7 }, 20);
    expect(returns / 19).toBeGreaterThan(6);
    expect(returns / 19).toBeLessThan(7);
  });
});

describe('estimates of volatility', () => {
  const bars = fc.array(bar(ordinaryPrice), { minLength: 4, maxLength: 12 });
  const method = (count: number): fc.Arbitrary<VolatilityMethod> =>
    fc.oneof(
      fc.constant<VolatilityMethod>({ kind: 'close', window: count - 1 }),
      fc.constant<VolatilityMethod>({ kind: 'close', window: count - 1, mean: 'zero' }),
      fc.constant<VolatilityMethod>({ kind: 'ewma', lambda: 0.94 }),
      fc.constantFrom(...rangeKinds).map((kind): VolatilityMethod => ({ kind, window: count - 1 })),
    );
  const barsAndMethod = bars.chain((some) => fc.tuple(fc.constant(some), method(some.length)));

  it('do not change when all prices are multiplied', () => {
    fc.assert(
      fc.property(barsAndMethod, fc.constantFrom(0.01, 3, 1e9), ([some, one], factor) => {
        const scaled = some.map(({ open, high, low, close }) => ({
          open: open * factor,
          high: high * factor,
          low: low * factor,
          close: close * factor,
        }));
        const before = estimateVolatility({ bars: some }, one).dailyVolatility;
        expect(Math.abs(estimateVolatility({ bars: scaled }, one).dailyVolatility - before)).toBeLessThan(1e-14);
      }),
      { seed: SEED },
    );
  });

  it('do not depend on bars before the window, and lie within their interval at 95 %', () => {
    fc.assert(
      fc.property(barsAndMethod, bar(ordinaryPrice), ([some, one], earlier) => {
        const estimate = estimateVolatility({ bars: some }, one);
        expect(estimate.low).toBeLessThanOrEqual(estimate.dailyVolatility);
        expect(estimate.high).toBeGreaterThanOrEqual(estimate.dailyVolatility);
        if (one.kind === 'ewma') return;
        expect(estimateVolatility({ bars: [earlier, ...some] }, one)).toEqual(estimate);
      }),
      { seed: SEED },
    );
  });

  it('take closes alone for methods of closes, with the same result', () => {
    fc.assert(
      fc.property(bars, (some) => {
        const closes = some.map(({ close }) => close);
        const one = { kind: 'close', window: some.length - 1 } as const;
        expect(estimateVolatility({ closes }, one)).toEqual(estimateVolatility({ bars: some }, one));
      }),
      { seed: SEED },
    );
  });

  it('are the same by each estimator’s own function', () => {
    fc.assert(
      fc.property(bars, (some) => {
        const by = (kind: RangeMethod['kind']) =>
          estimateRangeVolatility(some, { kind, window: largestWindow({ bars: some }, kind) }).dailyVolatility;
        expect(by('parkinson')).toBe(parkinsonDailyVolatility(some));
        expect(by('garmanKlass')).toBe(garmanKlassDailyVolatility(some));
        expect(by('rogersSatchell')).toBe(rogersSatchellDailyVolatility(some));
        expect(by('garmanKlassYangZhang')).toBe(garmanKlassYangZhangDailyVolatility(some));
        expect(by('yangZhang')).toBe(yangZhangDailyVolatility(some));
      }),
      { seed: SEED },
    );
  });

  it('are finite, 0 or more and ordered for any positive prices, denormal and huge ones too', () => {
    fc.assert(
      fc.property(fc.array(bar(anyPositive), { minLength: 3, maxLength: 6 }), (some) => {
        for (const kind of rangeKinds) {
          const { dailyVolatility, low, high } = estimateRangeVolatility(some, { kind, window: 2 });
          expect(dailyVolatility >= 0 && dailyVolatility < Infinity && low >= 0 && high >= low && high < Infinity).toBe(
            true,
          );
        }
        const closes = some.map(({ close }) => close);
        const estimate = estimateCloseVolatility(closes, { kind: 'close', window: 2 });
        expect(estimate.dailyVolatility < Infinity && estimate.high < Infinity).toBe(true);
      }),
      { seed: SEED },
    );
  });

  it.each(rangeKinds)('are 0 by %s, with an interval of 0, when no price ever changes', (kind) => {
    const flat = Array.from({ length: 5 }, () => ({ open: 7, high: 7, low: 7, close: 7 }));
    expect(estimateRangeVolatility(flat, { kind, window: 4 })).toMatchObject({ dailyVolatility: 0, low: 0, high: 0 });
  });

  it('are 0 by closes that never change', () => {
    expect(estimateCloseVolatility([7, 7, 7], { kind: 'close', window: 2 })).toMatchObject({
      dailyVolatility: 0,
      high: 0,
    });
    expect(estimateCloseVolatility([7, 7, 7], { kind: 'ewma', lambda: 0.94 })).toMatchObject({
      dailyVolatility: 0,
      high: 0,
    });
  });

  it('never claim more effective returns than there are, weighted or not', () => {
    const closes = Array.from({ length: 60 }, (_, at) => 100 + (at % 7));
    const few = estimateCloseVolatility(closes.slice(-6), { kind: 'ewma', lambda: 0.94 });
    expect(few.degreesOfFreedom).toBe(5);
    const many = estimateCloseVolatility(closes, { kind: 'ewma', lambda: 0.94 });
    expect(many.degreesOfFreedom).toBeCloseTo(32.33, 2);
  });

  it('come for every decay strictly between 0 and 1, the nearest doubles too', () => {
    for (const lambda of [Number.MIN_VALUE, 0.5, 1 - 2 ** -53]) {
      const { low, dailyVolatility, high } = estimateCloseVolatility([100, 101, 99, 100], { kind: 'ewma', lambda });
      expect(low <= dailyVolatility && dailyVolatility <= high && high < Infinity).toBe(true);
    }
  });

  it('hold a ladder of what the closes suffice for, none for one close', () => {
    const closes = Array.from({ length: 30 }, (_, at) => 100 + (at % 5));
    expect(volatilityLadder(closes).map(({ method: { kind } }) => kind)).toEqual(['close', 'close', 'ewma']);
    expect(volatilityLadder([100])).toEqual([]);
  });
});

describe('an estimate of volatility is refused', () => {
  const good = { open: 10, high: 11, low: 9, close: 10 };
  const three = [good, good, good];

  it.each([
    ['a high below the close', { ...good, high: 9.5 }],
    ['a low above the open', { ...good, low: 10.5 }],
    ['a high below the low', { ...good, high: 8 }],
    ['a price of 0', { ...good, low: 0 }],
    ['a negative price', { ...good, low: -1 }],
    ['an infinite price', { ...good, high: Infinity }],
    ['no number', { ...good, open: Number.NaN }],
  ])('naming the row with %s', (_, wrong) => {
    for (const kind of rangeKinds) {
      const run = () => estimateRangeVolatility([good, good, wrong, good], { kind, window: 3 });
      expect(run).toThrow(
        expect.objectContaining({ code: 'bar-invalid', details: expect.objectContaining({ row: 2 }) }),
      );
    }
  });

  it('only for bars that are used', () => {
    const wrong = { ...good, high: 1 };
    expect(estimateRangeVolatility([wrong, ...three], { kind: 'yangZhang', window: 2 }).returnsUsed).toBe(2);
  });

  it.each([
    [{ kind: 'parkinson', window: 4 }, 'too-few-bars'],
    [{ kind: 'garmanKlassYangZhang', window: 3 }, 'too-few-bars'],
    [{ kind: 'yangZhang', window: 3 }, 'too-few-bars'],
    [{ kind: 'yangZhang', window: 1 }, 'too-few-bars'],
    [{ kind: 'close', window: 3 }, 'too-few-returns'],
    [{ kind: 'close', window: 1 }, 'too-few-returns'],
    [{ kind: 'close', window: 0 }, 'window-invalid'],
    [{ kind: 'close', window: 1.5 }, 'window-invalid'],
    [{ kind: 'parkinson', window: Number.NaN }, 'window-invalid'],
    [{ kind: 'rogersSatchell', window: Infinity }, 'window-invalid'],
    [{ kind: 'ewma', lambda: 0 }, 'lambda-out-of-range'],
    [{ kind: 'ewma', lambda: 1 }, 'lambda-out-of-range'],
    [{ kind: 'ewma', lambda: Number.NaN }, 'lambda-out-of-range'],
    [{ kind: 'ewma', lambda: 0.94, start: { kind: 'firstSquares', count: 3 } }, 'too-few-returns'],
    [{ kind: 'ewma', lambda: 0.94, start: { kind: 'lastReturns', count: 0 } }, 'too-few-returns'],
    [{ kind: 'ewma', lambda: 0.94, start: { kind: 'lastReturns', count: 1.5 } }, 'too-few-returns'],
  ] as const)('for three bars by %j as %s', (method, code) => {
    expect(codeOf(() => estimateVolatility({ bars: three }, method))).toBe(code);
  });

  it.each(['parkinson', 'yangZhang'] as const)('by %s from closes alone', (kind) => {
    expect(codeOf(() => estimateVolatility({ closes: [1, 2, 3] }, { kind, window: 2 }))).toBe('bars-missing');
  });

  it.each([0, 1, 1 - 2 ** -53, Number.NaN])('at a confidence of %p', (confidence) => {
    const run = () => estimateVolatility({ bars: three }, { kind: 'close', window: 2 }, confidence);
    expect(codeOf(run)).toBe('confidence-out-of-range');
  });
});
