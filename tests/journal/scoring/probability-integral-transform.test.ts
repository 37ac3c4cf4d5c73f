import { kolmogorovSmirnovTest } from '@/journal/scoring/kolmogorov-smirnov';
import { transformUniformity } from '@/journal/scoring/probability-integral-transform';

const evenly = (count: number) => Array.from({ length: count }, (_, index) => (index + 0.5) / count);

describe('kolmogorovSmirnovTest', () => {
  it('has for one value the exact distribution 2d - 1', () => {
    const { distance, pValue } = kolmogorovSmirnovTest([0.8]);
    expect(distance).toBe(0.8);
    expect(pValue).toBeCloseTo(1 - (2 * 0.8 - 1), 14);
  });

  it('has for two values the exact upper tail 2(1 - d)^2 once d is over a half', () => {
    const { distance, pValue } = kolmogorovSmirnovTest([0.75, 0.8]);
    expect(distance).toBe(0.75);
    expect(pValue).toBeCloseTo(2 * 0.25 ** 2, 14);
  });

  it('does not doubt evenly spread values, and rejects a heap', () => {
    expect(kolmogorovSmirnovTest(evenly(50)).pValue).toBeCloseTo(1, 10);
    expect(kolmogorovSmirnovTest(evenly(50).map((value) => value / 2)).pValue).toBeLessThan(1e-10);
  });

  it('changes to the limiting distribution at 100 values', () => {
    expect(kolmogorovSmirnovTest(evenly(99)).isExact).toBe(true);
    expect(kolmogorovSmirnovTest(evenly(100)).isExact).toBe(false);
  });

  it('agrees with itself where both of its series for the limit hold', () => {
    // sqrt(n) d just below and just above 1, where the series change.
    const tail = (shift: number) =>
      kolmogorovSmirnovTest(
        [...evenly(100)].map((value) => value * (1 - shift)),
        'asymptotic',
      ).pValue;
    expect(Math.abs(tail(0.0955) - tail(0.0956))).toBeLessThan(0.002);
  });

  it('refuses no values, and names one outside 0 to 1', () => {
    expect(() => kolmogorovSmirnovTest([])).toThrow(expect.objectContaining({ code: 'values-missing' }));
    expect(() => kolmogorovSmirnovTest([0.5, NaN])).toThrow(
      expect.objectContaining({ code: 'probability-invalid', details: expect.objectContaining({ index: 1 }) }),
    );
  });
});

describe('transformUniformity', () => {
  it('counts tenths and finds no fault with an even spread', () => {
    const { count, binCounts, chiSquare } = transformUniformity(evenly(60));
    expect(count).toBe(60);
    expect(binCounts).toEqual(new Array(10).fill(6));
    expect(chiSquare.statistic).toBe(0);
    expect(chiSquare.pValue).toBe(1);
  });

  it('refuses no values', () => {
    expect(() => transformUniformity([])).toThrow(expect.objectContaining({ code: 'values-missing' }));
  });
});
