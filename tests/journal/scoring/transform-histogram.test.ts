import * as fc from 'fast-check';
import { transformHistogram } from '@/journal/scoring/transform-histogram';

const seed = 20261201;

describe('transformHistogram', () => {
  it('counts points, an edge to the bin above it and 1 to the last', () => {
    const points = [0, 0.05, 0.1, 0.95, 1].map((place) => ({ low: place, high: place }));
    expect(transformHistogram(points)).toEqual([2, 1, 0, 0, 0, 0, 0, 0, 0, 2]);
  });

  it('spreads a lump evenly: a call that expired worthless with 67 % of its distribution there', () => {
    const counts = transformHistogram([{ low: 0, high: 0.67 }]);
    counts.slice(0, 6).forEach((count) => expect(count).toBeCloseTo(0.1 / 0.67, 14));
    expect(counts[6]).toBeCloseTo(0.07 / 0.67, 14);
    expect(counts.slice(7)).toEqual([0, 0, 0]);
  });

  it('adds up to the number of outcomes (property)', () => {
    const place = fc.double({ min: 0, max: 1, noNaN: true });
    fc.assert(
      fc.property(
        fc.array(fc.tuple(place, place), { minLength: 1, maxLength: 30 }),
        fc.integer({ min: 1, max: 20 }),
        (pairs, bins) => {
          const intervals = pairs.map(([one, other]) => ({ low: Math.min(one, other), high: Math.max(one, other) }));
          const counts = transformHistogram(intervals, bins);
          expect(counts.reduce((sum, count) => sum + count, 0)).toBeCloseTo(pairs.length, 9);
          counts.forEach((count) => expect(count).toBeGreaterThanOrEqual(0));
        },
      ),
      { seed, numRuns: 300 },
    );
  });

  it('refuses none, an interval the wrong way round and no bins', () => {
    expect(() => transformHistogram([])).toThrow(expect.objectContaining({ code: 'values-missing' }));
    expect(() => transformHistogram([{ low: 0.5, high: 0.4 }])).toThrow(
      expect.objectContaining({ code: 'transform-interval-invalid' }),
    );
    expect(() => transformHistogram([{ low: 0, high: NaN }])).toThrow(
      expect.objectContaining({ code: 'transform-interval-invalid' }),
    );
    expect(() => transformHistogram([{ low: 0, high: 1 }], 0)).toThrow(
      expect.objectContaining({ code: 'bins-invalid' }),
    );
  });
});
