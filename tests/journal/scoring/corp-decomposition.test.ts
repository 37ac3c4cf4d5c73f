import * as fc from 'fast-check';
import { calibratedForecasts } from '@/journal/scoring/calibrated-forecasts';
import { corpDecomposition } from '@/journal/scoring/corp-decomposition';

const seed = 20261201;
const record = fc.array(fc.tuple(fc.integer({ min: 0, max: 20 }), fc.boolean()), { minLength: 1, maxLength: 60 });
const columns = (pairs: readonly (readonly [number, boolean])[]) => ({
  forecasts: pairs.map(([twentieths]) => twentieths / 20),
  outcomes: pairs.map(([, outcome]) => outcome),
});

describe('calibratedForecasts', () => {
  it('pools forecasts that the outcomes order the other way', () => {
    expect(calibratedForecasts([0.8, 0.2, 0.4, 0.4], [1, 1, 0, 0])).toEqual([1, 1 / 3, 1 / 3, 1 / 3]);
  });

  it('gives equal forecasts equal values, rising with the forecast (property)', () => {
    fc.assert(
      fc.property(record, (pairs) => {
        const { forecasts, outcomes } = columns(pairs);
        const calibrated = calibratedForecasts(forecasts, outcomes);
        const inOrder = forecasts
          .map((forecast, index) => ({ forecast, value: calibrated[index] ?? NaN }))
          .sort((one, other) => one.forecast - other.forecast);
        inOrder.slice(1).forEach(({ forecast, value }, index) => {
          const before = inOrder[index];
          if (forecast === before?.forecast) expect(value).toBe(before.value);
          else expect(value).toBeGreaterThanOrEqual(before?.value ?? NaN);
        });
      }),
      { seed, numRuns: 200 },
    );
  });
});

describe('corpDecomposition', () => {
  it('has Murphy’s terms where the observed frequencies rise with the forecasts', () => {
    // The worked table of murphy-decomposition: .25 four times with 1 hit, .75 six times with 4.
    const forecasts = [0.25, 0.25, 0.25, 0.25, 0.75, 0.75, 0.75, 0.75, 0.75, 0.75];
    const { score, miscalibration, discrimination, uncertainty } = corpDecomposition(
      forecasts,
      [1, 0, 0, 0, 1, 1, 1, 1, 0, 0],
    );
    expect(score).toBeCloseTo(0.2125, 14);
    expect(miscalibration).toBeCloseTo(0.004167, 6);
    expect(discrimination).toBeCloseTo(0.041667, 6);
    expect(uncertainty).toBeCloseTo(0.25, 14);
  });

  it('finds no discrimination in forecasts that fall where events rise', () => {
    const { miscalibration, discrimination } = corpDecomposition([0.9, 0.1], [0, 1]);
    expect(discrimination).toBeCloseTo(0, 15);
    expect(miscalibration).toBeCloseTo(0.81 - 0.25, 15);
  });

  it('gives the log score of the base rate as uncertainty', () => {
    const { uncertainty } = corpDecomposition([0.5, 0.5, 0.6, 0.9], [0, 0, 0, 1], 'log');
    expect(uncertainty).toBeCloseTo(-(0.25 * Math.log(0.25) + 0.75 * Math.log(0.75)), 14);
  });

  it.each(['brier', 'log'] as const)('adds up, and no %s term falls below 0 (property)', (kind) => {
    fc.assert(
      fc.property(record, (pairs) => {
        const { forecasts, outcomes } = columns(pairs);
        const { score, miscalibration, discrimination, uncertainty } = corpDecomposition(forecasts, outcomes, kind);
        expect(miscalibration - discrimination + uncertainty).toBeCloseTo(score, 12);
        expect(miscalibration).toBeGreaterThanOrEqual(-1e-12);
        expect(discrimination).toBeGreaterThanOrEqual(-1e-12);
      }),
      { seed, numRuns: 200 },
    );
  });

  it('refuses no forecasts', () => {
    expect(() => corpDecomposition([], [])).toThrow(expect.objectContaining({ code: 'forecasts-missing' }));
  });
});
