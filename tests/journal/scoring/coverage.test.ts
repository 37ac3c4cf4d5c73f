import { exactCoverageTest, exactInterval } from '@/journal/scoring/coverage';
import { kupiecAcceptedHits, kupiecTest } from '@/journal/scoring/kupiec-test';
import { wilsonInterval } from '@/journal/scoring/wilson-interval';

describe('wilsonInterval', () => {
  it.each([
    [9, 12, 0.468, 0.911],
    [28, 48, 0.443, 0.712],
  ])('of %d in %d runs from %d to %d', (hits, count, low, high) => {
    const interval = wilsonInterval({ hits, count });
    expect(interval.low).toBeCloseTo(low, 3);
    expect(interval.high).toBeCloseTo(high, 3);
  });

  it('ends exactly at 0 and 1 when nothing or everything was hit', () => {
    expect(wilsonInterval({ hits: 0, count: 10 }).low).toBe(0);
    expect(wilsonInterval({ hits: 10, count: 10 }).high).toBe(1);
  });

  it('mirrors when hits and misses change places', () => {
    const one = wilsonInterval({ hits: 3, count: 17, confidence: 0.9 });
    const other = wilsonInterval({ hits: 14, count: 17, confidence: 0.9 });
    expect(one.low).toBeCloseTo(1 - other.high, 14);
    expect(one.high).toBeCloseTo(1 - other.low, 14);
  });
});

describe('exactCoverageTest', () => {
  it('sums every count no more likely than the one seen', () => {
    // 0, 1, 9 and 10 heads of 10: (1 + 10 + 10 + 1) / 1024.
    expect(exactCoverageTest({ hits: 9, count: 10, stated: 0.5 })).toBeCloseTo(22 / 1024, 14);
  });

  it('is 1 for the likeliest count', () => {
    expect(exactCoverageTest({ hits: 5, count: 10, stated: 0.5 })).toBeCloseTo(1, 14);
  });

  it('knows that certain things cannot fail', () => {
    expect(exactCoverageTest({ hits: 10, count: 10, stated: 1 })).toBe(1);
    expect(exactCoverageTest({ hits: 9, count: 10, stated: 1 })).toBe(0);
    expect(exactCoverageTest({ hits: 1, count: 10, stated: 0 })).toBe(0);
  });

  it('refuses a stated coverage outside 0 to 1', () => {
    expect(() => exactCoverageTest({ hits: 1, count: 10, stated: NaN })).toThrow(
      expect.objectContaining({ code: 'probability-invalid' }),
    );
  });
});

describe('exactInterval', () => {
  it('bounds the rate of what was never seen in 100 at about 3 in 100, one-sided', () => {
    const { low, high } = exactInterval({ hits: 0, count: 100, confidence: 0.9 });
    expect(low).toBe(0);
    expect(high).toBeCloseTo(1 - 0.05 ** (1 / 100), 12);
  });

  it('reaches 1 when everything was hit', () => {
    const { low, high } = exactInterval({ hits: 7, count: 7 });
    expect(low).toBeCloseTo(0.025 ** (1 / 7), 12);
    expect(high).toBe(1);
  });
});

describe('kupiecTest', () => {
  it('sees nothing when the share is exactly as stated', () => {
    expect(kupiecTest({ hits: 5, count: 100, stated: 0.05 })).toEqual({ likelihoodRatio: 0, pValue: 1 });
  });

  it('copes with no hits and only hits', () => {
    expect(kupiecTest({ hits: 0, count: 50, stated: 0.05 }).likelihoodRatio).toBeCloseTo(-100 * Math.log(0.95), 12);
    expect(kupiecTest({ hits: 50, count: 50, stated: 0.9 }).likelihoodRatio).toBeCloseTo(-100 * Math.log(0.9), 12);
  });

  it.each([0, 1, NaN])('refuses a stated share of %p', (stated) => {
    expect(() => kupiecTest({ hits: 1, count: 2, stated })).toThrow(
      expect.objectContaining({ code: 'probability-invalid' }),
    );
  });
});

describe('counts and confidences', () => {
  it.each([
    [-1, 10],
    [11, 10],
    [0, 0],
    [1.5, 10],
    [NaN, 10],
    [1, Infinity],
  ])('refuses %d hits in %d everywhere', (hits, count) => {
    const refused = expect.objectContaining({ code: 'hit-count-invalid' });
    expect(() => wilsonInterval({ hits, count })).toThrow(refused);
    expect(() => exactInterval({ hits, count })).toThrow(refused);
    expect(() => exactCoverageTest({ hits, count, stated: 0.5 })).toThrow(refused);
    expect(() => kupiecTest({ hits, count, stated: 0.5 })).toThrow(refused);
  });

  it.each([0, 1, NaN])('refuses a confidence of %p everywhere', (confidence) => {
    const refused = expect.objectContaining({ code: 'confidence-invalid' });
    expect(() => wilsonInterval({ hits: 1, count: 2, confidence })).toThrow(refused);
    expect(() => exactInterval({ hits: 1, count: 2, confidence })).toThrow(refused);
    expect(() => kupiecAcceptedHits({ count: 2, stated: 0.5, confidence })).toThrow(refused);
  });
});
