import * as fc from 'fast-check';
import { consistencyInterval } from '@/journal/scoring/consistency-interval';
import {
  binomialProbabilities,
  eventCountProbabilities,
  eventCountQuantile,
} from '@/journal/scoring/event-count-distribution';

const seed = 20261201;

describe('binomialProbabilities', () => {
  it('are those of Pascal’s triangle for a fair coin', () => {
    const expected = [1, 4, 6, 4, 1].map((ways) => ways / 16);
    binomialProbabilities({ count: 4, probability: 0.5 }).forEach((value, events) => {
      expect(value).toBeCloseTo(expected[events] ?? NaN, 15);
    });
  });

  it('put everything on one count when the event is impossible or certain', () => {
    expect(binomialProbabilities({ count: 3, probability: 0 })).toEqual([1, 0, 0, 0]);
    expect(binomialProbabilities({ count: 3, probability: 1 })).toEqual([0, 0, 0, 1]);
    expect(binomialProbabilities({ count: 0, probability: 0.4 })).toEqual([1]);
  });

  it('equal the convolution of equal events (property)', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 80 }), fc.double({ min: 0, max: 1, noNaN: true }), (count, probability) => {
        const convolved = eventCountProbabilities(new Array<number>(count).fill(probability));
        binomialProbabilities({ count, probability }).forEach((value, events) => {
          expect(Math.abs(value - (convolved[events] ?? NaN))).toBeLessThanOrEqual(1e-13);
        });
      }),
      { seed, numRuns: 200 },
    );
  });

  it('refuse a count that is no whole number, and a probability outside 0 to 1', () => {
    for (const count of [-1, 1.5, NaN]) {
      expect(() => binomialProbabilities({ count, probability: 0.5 })).toThrow(
        expect.objectContaining({ code: 'count-invalid' }),
      );
    }
    expect(() => binomialProbabilities({ count: 1, probability: NaN })).toThrow(
      expect.objectContaining({ code: 'probability-invalid' }),
    );
  });
});

describe('eventCountProbabilities', () => {
  it('add up over events of differing probability', () => {
    const [none = NaN, one = NaN, both = NaN] = eventCountProbabilities([0.2, 0.7]);
    expect(none).toBeCloseTo(0.24, 15);
    expect(one).toBeCloseTo(0.62, 15);
    expect(both).toBeCloseTo(0.14, 15);
  });

  it('refuse a probability outside 0 to 1', () => {
    expect(() => eventCountProbabilities([0.5, 1.5])).toThrow(expect.objectContaining({ code: 'probability-invalid' }));
  });
});

describe('eventCountQuantile', () => {
  it('is the first count whose cumulative probability reaches the level', () => {
    expect([0, 0.25, 0.26, 0.75, 0.76, 1].map((level) => eventCountQuantile([0.25, 0.5, 0.25], level))).toEqual([
      0, 0, 1, 1, 2, 2,
    ]);
  });

  it('refuses a level outside 0 to 1', () => {
    expect(() => eventCountQuantile([1], NaN)).toThrow(expect.objectContaining({ code: 'probability-invalid' }));
  });
});

describe('consistencyInterval', () => {
  it.each([
    [10, 0.1, 0.5],
    [20, 0.15, 0.45],
    [50, 0.2, 0.4],
  ])('of %d forecasts of 0.3 runs from %d to %d', (count, low, high) => {
    expect(consistencyInterval(new Array<number>(count).fill(0.3))).toEqual({ low, high });
  });

  it('refuses no forecasts and a level outside 0 to 1', () => {
    expect(() => consistencyInterval([])).toThrow(expect.objectContaining({ code: 'forecasts-missing' }));
    expect(() => consistencyInterval([0.5], 1)).toThrow(expect.objectContaining({ code: 'confidence-invalid' }));
  });
});
