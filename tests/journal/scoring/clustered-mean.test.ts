import * as fc from 'fast-check';
import { clusterBootstrapInterval, clusteredMean, comparePaired } from '@/journal/scoring/clustered-mean';
import { overlapClusters } from '@/journal/scoring/clusters';
import { effectiveSampleSize, intraclassCorrelation } from '@/journal/scoring/effective-sample-size';

const seed = 20261201;

describe('overlapClusters', () => {
  const span = (underlying: string, from: string, through: string) => ({ underlying, from, through });

  it('joins what shares an underlying and a day, chains too', () => {
    expect(
      overlapClusters([
        span('JQVO', '2026-03-02', '2026-03-06'),
        span('HVYQ', '2026-03-02', '2026-03-06'),
        span('JQVO', '2026-03-11', '2026-03-12'),
        span('JQVO', '2026-03-06', '2026-03-11'),
        span('JQVO', '2026-03-13', '2026-03-20'),
      ]),
    ).toEqual([0, 1, 0, 0, 2]);
  });

  it('keeps a short span inside a long one in its cluster', () => {
    expect(
      overlapClusters([
        span('JQVO', '2026-03-02', '2026-03-31'),
        span('JQVO', '2026-03-03', '2026-03-04'),
        span('JQVO', '2026-03-30', '2026-04-02'),
      ]),
    ).toEqual([0, 0, 0]);
  });

  it('has none of none and refuses a span that ends before it starts', () => {
    expect(overlapClusters([])).toEqual([]);
    expect(() => overlapClusters([span('JQVO', '2026-03-03', '2026-03-02')])).toThrow(
      expect.objectContaining({ code: 'span-invalid' }),
    );
  });
});

describe('effectiveSampleSize', () => {
  it('counts 50 trades in clusters of 5 with correlation .5 as 17', () => {
    expect(effectiveSampleSize(new Array<number>(10).fill(5), 0.5)).toBeCloseTo(50 / 3, 12);
  });

  it('is the count without correlation and the number of equal clusters with full correlation', () => {
    expect(effectiveSampleSize([3, 3, 3, 3], 0)).toBe(12);
    expect(effectiveSampleSize([3, 3, 3, 3], 1)).toBeCloseTo(4, 12);
  });

  it('refuses what is no size and no correlation', () => {
    expect(() => effectiveSampleSize([], 0.5)).toThrow(expect.objectContaining({ code: 'values-missing' }));
    expect(() => effectiveSampleSize([0], 0.5)).toThrow(expect.objectContaining({ code: 'cluster-size-invalid' }));
    expect(() => effectiveSampleSize([2], -0.1)).toThrow(expect.objectContaining({ code: 'correlation-invalid' }));
  });
});

describe('intraclassCorrelation', () => {
  it('is the published .17 of six targets with four ratings each', () => {
    // Shrout and Fleiss (1979), Psychological Bulletin 86(2), table 2 and ICC(1,1) in table 4.
    const ratings = [9, 2, 5, 8, 6, 1, 3, 2, 8, 4, 6, 8, 7, 1, 2, 6, 10, 5, 6, 9, 6, 2, 4, 7];
    const targets = ratings.map((_, index) => Math.floor(index / 4));
    expect(intraclassCorrelation(ratings, targets)).toBeCloseTo(0.16574176840547544, 12);
  });

  it('is 1 for values equal inside clusters, 0 for a negative estimate, and unknown where nothing can tell', () => {
    expect(intraclassCorrelation([1, 1, 4, 4], [0, 0, 1, 1])).toBe(1);
    expect(intraclassCorrelation([1, 4, 1, 4], [0, 0, 1, 1])).toBe(0);
    expect(intraclassCorrelation([1, 2, 3], [0, 1, 2])).toBeNull();
    expect(intraclassCorrelation([1, 2, 3], [0, 0, 0])).toBeNull();
    expect(intraclassCorrelation([2, 2, 2], [0, 0, 1])).toBeNull();
  });
});

describe('clusteredMean', () => {
  it('is the paired t test where no two cases share a cluster (scipy 1.17 ttest_rel)', () => {
    const { mean, pValue, standardError } = comparePaired({
      scores: [0.04, 0.25, 0.09, 0.36, 0.16, 0.01, 0.49],
      otherScores: [0.09, 0.16, 0.16, 0.49, 0.25, 0.04, 0.36],
      clusters: [0, 1, 2, 3, 4, 5, 6],
    });
    expect(mean).toBeCloseTo(-0.021428571428571432, 14);
    expect(mean / (standardError ?? NaN)).toBeCloseTo(-0.5916956434179942, 12);
    expect(pValue).toBeCloseTo(0.5756544064845198, 10);
  });

  it('counts a cluster of copies once', () => {
    const single = clusteredMean([1, 2, 4], [0, 1, 2]);
    const copied = clusteredMean([1, 1, 2, 2, 4, 4], [0, 0, 1, 1, 2, 2]);
    expect(copied.mean).toBeCloseTo(single.mean, 14);
    expect(copied.standardError).toBeCloseTo(single.standardError ?? NaN, 14);
  });

  it('tells no error from one cluster, and refuses what does not match', () => {
    expect(clusteredMean([1, 2], [7, 7])).toEqual({ mean: 1.5, clusterCount: 1, standardError: null, pValue: null });
    expect(clusteredMean([2, 2], [0, 1])).toMatchObject({ standardError: 0, pValue: null });
    expect(() => clusteredMean([], [])).toThrow(expect.objectContaining({ code: 'values-missing' }));
    expect(() => clusteredMean([1], [])).toThrow(expect.objectContaining({ code: 'clusters-not-matching' }));
    expect(() => clusteredMean([NaN], [0])).toThrow(expect.objectContaining({ code: 'value-out-of-range' }));
    expect(() => comparePaired({ scores: [1], otherScores: [], clusters: [0] })).toThrow(
      expect.objectContaining({ code: 'scores-not-matching' }),
    );
  });
});

describe('clusterBootstrapInterval', () => {
  it('spans about two standard errors each way, and repeats with its seed', () => {
    const values = Array.from({ length: 200 }, (_, index) => ((index * 37) % 101) / 101);
    const clusters = values.map((_, index) => Math.floor(index / 2));
    const { mean, standardError } = clusteredMean(values, clusters);
    const interval = clusterBootstrapInterval(values, clusters, { seed });
    expect(interval?.low).toBeCloseTo(mean - 1.96 * (standardError ?? NaN), 2);
    expect(interval?.high).toBeCloseTo(mean + 1.96 * (standardError ?? NaN), 2);
    expect(clusterBootstrapInterval(values, clusters, { seed })).toEqual(interval);
  });

  it('lies between the least and the greatest cluster mean (property)', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: -5, max: 5, noNaN: true }), { minLength: 2, maxLength: 12 }), (values) => {
        const interval = clusterBootstrapInterval(
          values,
          values.map((_, index) => index),
          { seed, resamples: 100 },
        );
        expect(interval?.low).toBeGreaterThanOrEqual(Math.min(...values) - 1e-12);
        expect(interval?.high).toBeLessThanOrEqual(Math.max(...values) + 1e-12);
      }),
      { seed, numRuns: 50 },
    );
  });

  it('cannot tell from one cluster and refuses too few resamples', () => {
    expect(clusterBootstrapInterval([1, 2], [0, 0], { seed })).toBeNull();
    expect(() => clusterBootstrapInterval([1, 2], [0, 1], { seed, resamples: 10 })).toThrow(
      expect.objectContaining({ code: 'resamples-invalid' }),
    );
  });
});
