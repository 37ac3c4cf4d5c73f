import fc from 'fast-check';
import { logRatio } from '@/journal/returns/log-ratio';
import { logReturns } from '@/journal/returns/log-returns';
import { quantile } from '@/journal/returns/quantile';
import { sampleStatistics } from '@/journal/returns/sample-statistics';
import { closeDailyVolatility } from '@/journal/volatility/close-daily-volatility';
import { ewmaDailyVolatility } from '@/journal/volatility/ewma-daily-volatility';

const SEED = 20261201;
const anyValue = fc.double({ min: -1e308, max: 1e308, noNaN: true });

describe('log returns', () => {
  it('are finite for all positive doubles, where the quotient would over- or underflow', () => {
    const [least, most] = [Number.MIN_VALUE, Number.MAX_VALUE];
    // ln(2^1024) − ln(2^-1074) = 2098·ln 2, to the last place of the largest double.
    expect(logReturns([least, most])[0]).toBeCloseTo(2098 * Math.LN2, 11);
    expect(logReturns([most, least])[0]).toBeCloseTo(-2098 * Math.LN2, 11);
    expect(logRatio(3 * Number.MIN_VALUE, Number.MIN_VALUE)).toBeCloseTo(Math.log(3), 15);
    expect(logRatio(1e-200, 1e150)).toBeCloseTo(-350 * Math.LN10, 11);
  });

  it('turn their sign where the closes turn round', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: Number.MIN_VALUE, max: Number.MAX_VALUE, noNaN: true }), {
          minLength: 2,
          maxLength: 9,
        }),
        (closes) => {
          const back = logReturns([...closes].reverse()).reverse();
          for (const [at, value] of logReturns(closes).entries())
            expect(value).toBeCloseTo(-(back[at] ?? Number.NaN), 10);
        },
      ),
      { seed: SEED },
    );
  });

  it.each([
    [[1], 'too-few-closes'],
    [[], 'too-few-closes'],
    [[1, 0], 'close-invalid'],
    [[1, -1], 'close-invalid'],
    [[1, Infinity], 'close-invalid'],
    [[Number.NaN, 1], 'close-invalid'],
  ])('are refused from %j as %s', (closes, code) => {
    expect(() => logReturns(closes)).toThrow(expect.objectContaining({ code }));
  });
});

describe('statistics of a sample', () => {
  it('have the same shape in any unit, from denormal to huge', () => {
    const values = [3, -1, 4, 1, -5, 9, 2];
    const plain = sampleStatistics(values);
    for (const unit of [2 ** -1060, 1e-200, 1e-80, 1e80, 1e200, 1e307]) {
      const scaled = sampleStatistics(values.map((value) => value * unit));
      expect(scaled.skewness).toBeCloseTo(plain.skewness, 12);
      expect(scaled.excessKurtosis).toBeCloseTo(plain.excessKurtosis, 12);
      expect(scaled.lagOneAutocorrelation).toBeCloseTo(plain.lagOneAutocorrelation, 12);
      // A denormal unit leaves 14 places less: it is a whole multiple of the least double, 2^-1074.
      expect(Math.abs(scaled.standardDeviation / unit / plain.standardDeviation - 1)).toBeLessThan(1e-4);
      expect(Math.abs(scaled.rootMeanSquare / unit / plain.rootMeanSquare - 1)).toBeLessThan(1e-4);
    }
  });

  it('are never NaN nor infinite, whatever the finite sample', () => {
    fc.assert(
      fc.property(
        fc.array(fc.oneof(anyValue, fc.constantFrom(0, 1, 1 + Number.EPSILON, 1e-320, -1e308)), {
          minLength: 2,
          maxLength: 12,
        }),
        (values) => {
          expect(Object.values(sampleStatistics(values)).filter((value) => !Number.isFinite(value))).toEqual([]);
          expect(closeDailyVolatility(values, { mean: 'zero' }) < Infinity).toBe(true);
          expect(ewmaDailyVolatility(values, { lambda: 0.94 }) < Infinity).toBe(true);
        },
      ),
      { seed: SEED, numRuns: 500 },
    );
  });

  it.each([
    [[], 'too-few-values'],
    [[1], 'too-few-values'],
    [[1, Number.NaN], 'value-invalid'],
    [[1, Infinity], 'value-invalid'],
    [[1, 1.5e308], 'value-invalid'],
  ])('are refused from %j as %s', (values, code) => {
    expect(() => sampleStatistics(values)).toThrow(expect.objectContaining({ code }));
  });
});

describe('a quantile', () => {
  it('lies between the least and the largest, rises with the probability, and is either at the ends, for any finite sample', () => {
    const values = fc.array(fc.double({ noNaN: true, noDefaultInfinity: true }), { minLength: 1, maxLength: 9 });
    const probability = fc.double({ min: 0, max: 1, noNaN: true });
    fc.assert(
      fc.property(values, probability, probability, (some, one, other) => {
        const at = (place: number) => quantile(some, place);
        const [least, most] = [Math.min(...some), Math.max(...some)];
        expect(at(0)).toBeCloseTo(least, 15);
        expect(at(1)).toBeCloseTo(most, 15);
        expect(at(one) >= least && at(one) <= most).toBe(true);
        expect(at(Math.min(one, other)) <= at(Math.max(one, other))).toBe(true);
      }),
      { seed: SEED, numRuns: 500 },
    );
  });

  it('lies between two huge values of unlike sign', () => {
    expect(quantile([-1e308, 1.5e308], 0)).toBe(-1e308);
    expect(quantile([-1e308, 1.5e308], 0.5)).toBe(0.25e308);
  });

  it.each([
    [[], 0.5, 'too-few-values'],
    [[1], -0.1, 'probability-out-of-range'],
    [[1], Number.NaN, 'probability-out-of-range'],
    [[1, Number.NaN], 0.5, 'value-invalid'],
    [[1, Infinity], 0.5, 'value-invalid'],
  ])('of %j at %p is refused as %s', (values, probability, code) => {
    expect(() => quantile(values, probability)).toThrow(expect.objectContaining({ code }));
  });
});

describe('volatility of returns given as they are', () => {
  it('is the size of a single return with zero mean', () => {
    expect(closeDailyVolatility([-0.02], { mean: 'zero' })).toBeCloseTo(0.02, 16);
  });

  it.each([
    [[Number.NaN], 'zero', 'value-invalid'],
    [[], 'zero', 'too-few-returns'],
    [[0.01], 'sample', 'too-few-returns'],
    [[0.01, Infinity], 'sample', 'value-invalid'],
  ] as const)('is refused from %j about a mean of %s as %s', (returns, mean, code) => {
    expect(() => closeDailyVolatility(returns, { mean })).toThrow(expect.objectContaining({ code }));
  });

  it('goes from 1.5 % to 1.5686 % by one return of 2.4 % at 0.94 (worked outside this project)', () => {
    expect(ewmaDailyVolatility([0.015, 0.024], { lambda: 0.94 })).toBeCloseTo(0.015686, 6);
  });

  it.each([[[Number.NaN]], [[0.01, Infinity]]])('is refused weighted from %j', (returns) => {
    expect(() => ewmaDailyVolatility(returns, { lambda: 0.94 })).toThrow(
      expect.objectContaining({ code: 'value-invalid' }),
    );
  });
});
