import { clusteredMean } from '@/journal/scoring/clustered-mean';
import { clusteredMeanInterval } from '@/journal/scoring/clustered-mean-interval';

describe('the interval of a clustered mean', () => {
  it('is −48.8 to +131.2 for 48 trades of mean 41.20 and standard error 44.74', () => {
    const interval = clusteredMeanInterval({ mean: 41.2, standardError: 44.7446, clusterCount: 48 });
    expect(interval?.low).toBeCloseTo(-48.8, 1);
    expect(interval?.high).toBeCloseTo(131.2, 1);
  });

  it.each([
    { clusters: 2, t: 12.7062 },
    { clusters: 11, t: 2.2281 },
    { clusters: 31, t: 2.0423 },
    { clusters: 1_000_001, t: 1.95997 },
  ])('is the printed t = $t wide at $clusters clusters', ({ clusters, t }) => {
    const interval = clusteredMeanInterval({ mean: 0, standardError: 1, clusterCount: clusters });
    expect(interval?.high).toBeCloseTo(t, 4);
    expect(interval?.low).toBeCloseTo(-t, 4);
  });

  it('is null from a single cluster, and a point without spread', () => {
    expect(clusteredMeanInterval(clusteredMean([1, 2, 3], [0, 0, 0]))).toBeNull();
    expect(clusteredMeanInterval(clusteredMean([2, 2, 2], [0, 1, 2]))).toEqual({ low: 2, high: 2 });
  });

  it.each([0, 1, NaN])('throws confidence-invalid for %p', (confidence) => {
    expect(() => clusteredMeanInterval({ mean: 0, standardError: 1, clusterCount: 3 }, confidence)).toThrow(
      expect.objectContaining({ code: 'confidence-invalid' }),
    );
  });

  it('throws value-out-of-range for a standard error that is none', () => {
    expect(() => clusteredMeanInterval({ mean: 0, standardError: NaN, clusterCount: 3 })).toThrow(
      expect.objectContaining({ code: 'value-out-of-range' }),
    );
  });
});
