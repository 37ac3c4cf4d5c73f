import * as fc from 'fast-check';
import { calibrationCurve } from '@/journal/scoring/calibration-curve';
import { isotonicRegression } from '@/journal/scoring/isotonic-regression';

const seed = 20261201;
const weighted = fc.array(
  fc.record({ value: fc.double({ min: 0, max: 1, noNaN: true }), weight: fc.integer({ min: 1, max: 9 }) }),
  { maxLength: 25 },
);

describe('isotonicRegression', () => {
  it('pools neighbours that fall, by weight', () => {
    const values = [
      { value: 0.1, weight: 1 },
      { value: 0.6, weight: 1 },
      { value: 0.3, weight: 2 },
      { value: 0.9, weight: 1 },
    ];
    const fitted = isotonicRegression(values);
    [0.1, 0.4, 0.4, 0.9].forEach((expected, index) => expect(fitted[index]).toBeCloseTo(expected, 15));
  });

  it('never falls, keeps the weighted mean and leaves rising values alone (property)', () => {
    fc.assert(
      fc.property(weighted, (values) => {
        const fitted = isotonicRegression(values);
        expect(fitted).toHaveLength(values.length);
        fitted.slice(1).forEach((value, index) => expect(value).toBeGreaterThanOrEqual(fitted[index] ?? NaN));
        const sum = (of: (index: number) => number) =>
          values.reduce((total, { weight }, index) => total + weight * of(index), 0);
        expect(sum((index) => fitted[index] ?? NaN)).toBeCloseTo(
          sum((index) => values[index]?.value ?? NaN),
          10,
        );
        const rising = [...values].sort((one, other) => one.value - other.value);
        isotonicRegression(rising).forEach((value, index) =>
          expect(value).toBeCloseTo(rising[index]?.value ?? NaN, 14),
        );
      }),
      { seed, numRuns: 300 },
    );
  });

  it('is nearer to the values than any other rising sequence (greatest lower mean of later upper means, property)', () => {
    fc.assert(
      fc.property(weighted, (values) => {
        const mean = (from: number, to: number) => {
          const part = values.slice(from, to + 1);
          const total = part.reduce((sum, { weight }) => sum + weight, 0);
          return part.reduce((sum, { value, weight }) => sum + value * weight, 0) / total;
        };
        // The max-min formula defines the same fit without any pooling.
        const expected = values.map((_, at) =>
          Math.max(
            ...values
              .slice(0, at + 1)
              .map((__, from) => Math.min(...values.slice(at).map((___, ahead) => mean(from, at + ahead)))),
          ),
        );
        isotonicRegression(values).forEach((value, index) => expect(value).toBeCloseTo(expected[index] ?? NaN, 12));
      }),
      { seed, numRuns: 150 },
    );
  });

  it('refuses values and weights that are no numbers', () => {
    for (const bad of [{ value: NaN }, { weight: 0 }, { weight: NaN }]) {
      expect(() => isotonicRegression([{ value: 0, weight: 1, ...bad }])).toThrow(
        expect.objectContaining({ code: 'weighted-value-invalid', details: expect.objectContaining({ index: 0 }) }),
      );
    }
  });
});

describe('calibrationCurve', () => {
  const forecasts = [0.7, 0.2, 0.2, 0.4, 0.4, 0.7, 0.7, 0.95];
  const outcomes = [true, true, false, false, false, true, false, true];
  const { points, bins } = calibrationCurve(forecasts, outcomes);

  it('has one point a distinct forecast, pooled where the frequency falls', () => {
    expect(points.map(({ probability, count }) => [probability, count])).toEqual([
      [0.2, 2],
      [0.4, 2],
      [0.7, 3],
      [0.95, 1],
    ]);
    [0.25, 0.25, 2 / 3, 1].forEach((expected, index) => expect(points[index]?.observed).toBeCloseTo(expected, 15));
  });

  it('has the bins that hold a forecast, each with its two ranges', () => {
    expect(bins.map(({ count, observed }) => [count, observed])).toEqual([
      [2, 0.5],
      [2, 0],
      [3, 2 / 3],
      [1, 1],
    ]);
    for (const { observed, low, high, consistentLow, consistentHigh } of bins) {
      expect(low).toBeLessThanOrEqual(observed);
      expect(high).toBeGreaterThanOrEqual(observed);
      expect(consistentLow).toBeLessThanOrEqual(consistentHigh);
    }
  });

  it('is the diagonal when each forecast came true as often as it said', () => {
    const diagonal = calibrationCurve([0.5, 0.5, 0.25, 0.25, 0.25, 0.25], [true, false, true, false, false, false]);
    expect(diagonal.points.every(({ probability, observed }) => probability === observed)).toBe(true);
  });

  it('refuses no forecasts', () => {
    expect(() => calibrationCurve([], [])).toThrow(expect.objectContaining({ code: 'forecasts-missing' }));
  });
});
