import fc from 'fast-check';
import { DomainError } from '@/journal/errors/domain-error';
import { histogram } from '@/journal/returns/histogram';
import { logReturns } from '@/journal/returns/log-returns';
import { normalFit, sigmaCounts } from '@/journal/returns/normal-fit';
import { quantilePairs } from '@/journal/returns/quantile-pairs';
import { indexCloses } from '@/tests/reference/index-closes';

const SEED = 20261201;
const last = (series: string, count: number) => logReturns(indexCloses(series)).slice(-count);
const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
const anyValue = fc.oneof(
  fc.double({ min: -8e307, max: 8e307, noNaN: true }),
  fc.double({ min: -1e-3, max: 1e-3, noNaN: true }),
  fc.constantFrom(0, 0, Number.MIN_VALUE, -Number.MIN_VALUE),
);
const sample = fc.array(anyValue, { minLength: 4, maxLength: 30 });

describe('the histogram of returns', () => {
  // numpy 2.4.6: histogram_bin_edges(returns, 'fd') and histogram.
  it.each([
    ['DAX', 63, -0.03250734529052757, -0.024731702778998103, [5, 1, 6, 11, 18, 16, 6]],
    ['SMI', 63, -0.036050630180996635, -0.028634743508471727, [2, 2, 1, 11, 14, 19, 8, 6]],
    [
      'DAX',
      252,
      -0.06006796772399703,
      -0.05490424352341448,
      [1, 0, 0, 0, 2, 4, 11, 5, 12, 17, 35, 47, 27, 38, 19, 21, 3, 7, 2, 1],
    ],
    [
      'SMI',
      252,
      -0.046951248800564116,
      -0.04252995546189547,
      [1, 0, 2, 2, 5, 2, 7, 10, 24, 33, 45, 33, 32, 23, 18, 11, 1, 1, 2],
    ],
  ])('has the bins of numpy by Freedman and Diaconis for %s over %i', (series, count, first, second, counts) => {
    const { rule, edges, counts: ours } = histogram(last(series, count));
    expect(rule).toBe('freedman-diaconis');
    expect(edges[0]).toBeCloseTo(first, 14);
    expect(edges[1]).toBeCloseTo(second, 14);
    expect(ours).toEqual(counts);
  });

  it('has bins no wider than Scott’s width, and one fewer would be wider', () => {
    // Deviation √(11/3·…) of 1 to 10 is 3.02765; 3.4908·3.02765/∛10 = 4.9058, so that a range of 9 takes two.
    const { edges, counts } = histogram([1, 2, 3, 4, 5, 6, 7, 8, 9, 10], 'scott');
    expect(edges).toEqual([1, 5.5, 10]);
    expect(counts).toEqual([5, 5]);
  });

  it('falls back on Scott’s width where the quartiles are the same', () => {
    expect(histogram([0, 5, 5, 5, 5, 5, 5, 9]).rule).toBe('scott');
  });

  it('is one bin when no value differs', () => {
    expect(histogram([3, 3, 3])).toEqual({ rule: 'single', edges: [3, 3], counts: [3] });
  });

  it('stays readable beside far outliers: 200 bins at most', () => {
    const values = [...Array.from({ length: 50 }, (_, at) => at * 1e-9), 1e6];
    expect(histogram(values).counts).toHaveLength(200);
  });

  it('counts every value once, with rising edges from the least to the largest, for any sample', () => {
    fc.assert(
      fc.property(sample, (values) => {
        const { edges, counts } = histogram(values);
        expect(sum(counts)).toBe(values.length);
        expect(edges[0]).toBe(values.reduce((least, value) => Math.min(least, value), Infinity));
        expect(edges.at(-1)).toBe(values.reduce((most, value) => Math.max(most, value), -Infinity));
        expect(edges.every((edge, at) => at === 0 || edge >= (edges[at - 1] ?? Infinity))).toBe(true);
      }),
      { seed: SEED },
    );
  });

  it('refuses what is no number or too large to span', () => {
    expect(() => histogram([1, Number.NaN])).toThrow(DomainError);
    expect(() => histogram([1, 1e308])).toThrow(expect.objectContaining({ code: 'value-invalid' }));
    expect(() => histogram([1])).toThrow(expect.objectContaining({ code: 'too-few-values' }));
  });
});

describe('counts beyond deviations', () => {
  // numpy 2.4.6, mean and deviation of n − 1 from the same returns.
  it.each([
    ['DAX', 63, [18, 4, 0]],
    ['DAX', 252, [72, 14, 1]],
    ['DAX', 1859, [453, 90, 24]],
    ['SMI', 63, [20, 4, 0]],
    ['SMI', 252, [70, 13, 3]],
    ['SMI', 1859, [451, 96, 26]],
  ])('are those of numpy for %s over %i', (series, count, observed) => {
    expect(sigmaCounts(last(series, count)).map((one) => one.observed)).toEqual(observed);
  });

  it('are expected at 31.73, 4.55 and 0.27 in a hundred', () => {
    const [one, two, three] = sigmaCounts(last('DAX', 100));
    expect(one?.expected).toBeCloseTo(31.7310507863, 9);
    expect(two?.expected).toBeCloseTo(4.5500263896, 9);
    expect(three?.expected).toBeCloseTo(0.2699796063, 9);
  });

  it('carry the Wilson interval of their share', () => {
    // 90 of 1,859 at 95 %, the formula written out in Python.
    const two = sigmaCounts(last('DAX', 1859))[1];
    expect(two?.observedShare).toBeCloseTo(90 / 1859, 12);
    expect(two?.low).toBeCloseTo(0.03955, 5);
    expect(two?.high).toBeCloseTo(0.05914, 5);
  });
});

describe('quantile pairs', () => {
  it('stand at Hazen’s or Blom’s positions', () => {
    const probabilities = (position?: 'hazen' | 'blom') =>
      quantilePairs([3, 1, 2], position).map(({ probability }) => probability);
    expect(probabilities()).toEqual([1 / 6, 0.5, 5 / 6]);
    expect(probabilities('blom')).toEqual([0.625 / 3.25, 1.625 / 3.25, 2.625 / 3.25]);
  });

  it('pair the sorted values with those of the normal law of the sample', () => {
    const pairs = quantilePairs([3, 1, 2]);
    expect(pairs.map(({ observed }) => observed)).toEqual([1, 2, 3]);
    expect(pairs[1]).toMatchObject({ deviations: 0, expected: 2 });
    // Φ⁻¹(1/6) = −0.967421566101701, by scipy 1.17.1.
    expect(pairs[0]?.expected).toBeCloseTo(2 - 0.967421566101701, 14);
  });
});

describe('the fit of the normal law', () => {
  it('has the moments of R for the DAX over all its returns', () => {
    const fit = normalFit(last('DAX', 1859));
    expect(fit.skewness.type2).toBeCloseTo(-0.5545008334829089, 12);
    expect(fit.excessKurtosis.type2).toBeCloseTo(6.299846249463825, 11);
    expect(fit.statistics.jarqueBera).toBeCloseTo(3149.641304845404, 8);
    expect(fit.statistics.jarqueBeraPValue).toBeLessThan(1e-300);
  });

  it('expects as many values in and outside its bins as there are, and never NaN, for any sample', () => {
    fc.assert(
      fc.property(sample, (values) => {
        const fit = normalFit(values);
        const expected = sum(fit.expectedCounts) + fit.expectedBelow + fit.expectedAbove;
        expect(Math.abs(expected - values.length)).toBeLessThan(1e-9);
        expect(fit.expectedCounts).toHaveLength(fit.histogram.counts.length);
        const numbers = [
          ...Object.values(fit.statistics),
          ...Object.values(fit.skewness),
          ...Object.values(fit.excessKurtosis),
          ...fit.sigmaCounts.flatMap((one) => Object.values(one)),
          ...fit.quantilePairs.flatMap((pair) => Object.values(pair)),
        ];
        expect(numbers.filter((value) => !Number.isFinite(value))).toEqual([]);
      }),
      { seed: SEED, numRuns: 300 },
    );
  });

  it('finds nothing beyond any deviation, and no shape, in values that are all the same', () => {
    const fit = normalFit([2, 2, 2, 2]);
    expect(fit.sigmaCounts.map(({ observed }) => observed)).toEqual([0, 0, 0]);
    expect(fit.statistics).toMatchObject({ standardDeviation: 0, skewness: 0, jarqueBera: 0, jarqueBeraPValue: 1 });
    expect(fit.expectedCounts).toEqual([4]);
  });

  it('needs four values', () => {
    expect(() => normalFit([1, 2, 3])).toThrow(expect.objectContaining({ code: 'too-few-values' }));
  });
});
