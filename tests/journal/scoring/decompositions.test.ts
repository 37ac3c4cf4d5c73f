import * as fc from 'fast-check';
import { binnedDecomposition } from '@/journal/scoring/binned-decomposition';
import { meanBrierScore } from '@/journal/scoring/brier-score';
import { murphyDecomposition, murphyFromGroups } from '@/journal/scoring/murphy-decomposition';

const seed = 20261201;
const pairs = fc.array(
  fc.record({
    forecast: fc.oneof(fc.double({ min: 0, max: 1, noNaN: true }), fc.constantFrom(0, 0.1, 0.3, 0.5, 0.7, 1)),
    outcome: fc.boolean(),
  }),
  { minLength: 1, maxLength: 60 },
);

describe('murphyDecomposition', () => {
  it('splits 0.2125 into 0.004167 - 0.041667 + 0.25', () => {
    const forecasts = [0.25, 0.25, 0.25, 0.25, 0.75, 0.75, 0.75, 0.75, 0.75, 0.75];
    const outcomes = [true, false, false, false, true, true, true, true, false, false];
    const split = murphyDecomposition(forecasts, outcomes);
    expect(split.brierScore).toBeCloseTo(0.2125, 14);
    expect(split.reliability).toBeCloseTo(0.025 / 6, 14);
    expect(split.resolution).toBeCloseTo(0.25 / 6, 14);
    expect(split.uncertainty).toBeCloseTo(0.25, 14);
  });

  it('splits a week of twelve into .0142 - .0139 + .2431 = .2433', () => {
    const forecasts = [0.3, 0.3, 0.3, 0.3, 0.5, 0.5, 0.5, 0.5, 0.7, 0.7, 0.7, 0.7];
    const outcomes = [1, 1, 0, 0, 1, 1, 0, 0, 1, 1, 1, 0] as const;
    const split = murphyDecomposition(forecasts, outcomes);
    expect(split.brierScore).toBeCloseTo(0.2433, 4);
    expect(split.reliability).toBeCloseTo(0.0142, 4);
    expect(split.resolution).toBeCloseTo(0.0139, 4);
    expect(split.uncertainty).toBeCloseTo(0.2431, 4);
  });

  it('adds up to the mean score (property)', () => {
    fc.assert(
      fc.property(pairs, (some) => {
        const forecasts = some.map(({ forecast }) => forecast);
        const outcomes = some.map(({ outcome }) => outcome);
        const { brierScore, reliability, resolution, uncertainty } = murphyDecomposition(forecasts, outcomes);
        expect(Math.abs(brierScore - meanBrierScore(forecasts, outcomes))).toBeLessThanOrEqual(1e-14);
        expect(Math.abs(reliability - resolution + uncertainty - brierScore)).toBeLessThanOrEqual(1e-14);
      }),
      { seed, numRuns: 300 },
    );
  });

  it('refuses no forecasts, and groups outside their range', () => {
    expect(() => murphyDecomposition([], [])).toThrow(expect.objectContaining({ code: 'forecasts-missing' }));
    expect(() => murphyFromGroups([])).toThrow(expect.objectContaining({ code: 'forecasts-missing' }));
    for (const bad of [{ weight: 0 }, { weight: NaN }, { observed: 1.1 }, { forecast: -0.1 }]) {
      const groups = [{ forecast: 0.5, weight: 1, observed: 0.5, ...bad }];
      expect(() => murphyFromGroups(groups)).toThrow(expect.objectContaining({ code: 'group-invalid' }));
    }
  });
});

describe('binnedDecomposition', () => {
  it.each(['left', 'right'] as const)('adds up to the mean score with bins closed on the %s (property)', (closed) => {
    fc.assert(
      fc.property(pairs, (some) => {
        const forecasts = some.map(({ forecast }) => forecast);
        const outcomes = some.map(({ outcome }) => outcome);
        const split = binnedDecomposition(forecasts, outcomes, closed);
        const { reliability, resolution, uncertainty, withinBinVariance, withinBinCovariance } = split;
        const sum = reliability - resolution + uncertainty + withinBinVariance - withinBinCovariance;
        expect(Math.abs(sum - meanBrierScore(forecasts, outcomes))).toBeLessThanOrEqual(1e-14);
        expect(split.bins.reduce((count, bin) => count + bin.count, 0)).toBe(some.length);
      }),
      { seed, numRuns: 300 },
    );
  });

  it('equals the decomposition by distinct forecasts when each bin holds one value', () => {
    const forecasts = [0.25, 0.25, 0.75, 0.75, 0.75];
    const outcomes = [true, false, true, true, false];
    const binned = binnedDecomposition(forecasts, outcomes);
    expect(binned.reliability).toBeCloseTo(murphyDecomposition(forecasts, outcomes).reliability, 15);
    expect([binned.withinBinVariance, binned.withinBinCovariance]).toEqual([0, 0]);
  });
});
