import jstat from 'jstat';
import { varianceRatioQuantile } from '@/journal/outcome/variance-ratio-quantile';

/** Incomplete beta function inverted in mpmath 1.2 at 40 digits. */
const known = [
  [0.025, 1, 19, 0.0010082705178719854],
  [0.975, 1, 19, 5.9216312623366548],
  [0.975, 5, 19, 3.3327183728047256],
  [0.025, 20, 19, 0.40288873879731925],
  [0.5, 0.3, 31.3, 0.042726857828903369],
  [0.999, 3.7, 2.2, 576.2992995664388],
  [0.001, 250, 1000, 0.72499791965780257],
] as const;

describe('varianceRatioQuantile', () => {
  // 1e-13 relative: the logarithms of the gamma function cancel a digit or two.
  it.each(known)(
    'at %d with %d and %d degrees of freedom is %d',
    (probability, numeratorDegrees, denominatorDegrees, expected) => {
      const actual = varianceRatioQuantile({ probability, numeratorDegrees, denominatorDegrees });
      expect(Math.abs(actual / expected - 1)).toBeLessThanOrEqual(1e-13);
    },
  );

  // jstat stops its iteration at about 3e-8 relative.
  it.each(known)(
    'at %d with %d and %d degrees of freedom agrees with jstat',
    (probability, numeratorDegrees, denominatorDegrees) => {
      const actual = varianceRatioQuantile({ probability, numeratorDegrees, denominatorDegrees });
      const other = jstat.jStat.centralF.inv(probability, numeratorDegrees, denominatorDegrees);
      expect(Math.abs(actual / other - 1)).toBeLessThanOrEqual(1e-7);
    },
  );

  it('turns over when the two estimates change places', () => {
    const one = varianceRatioQuantile({ probability: 0.1, numeratorDegrees: 7, denominatorDegrees: 13 });
    const other = varianceRatioQuantile({ probability: 0.9, numeratorDegrees: 13, denominatorDegrees: 7 });
    expect(one * other).toBeCloseTo(1, 12);
  });

  it.each([
    [0, 1, 19],
    [1, 1, 19],
    [NaN, 1, 19],
    [0.5, 0, 19],
    [0.5, 1, -1],
    [0.5, 1, Infinity],
    [0.5, NaN, 19],
  ])(
    'refuses probability %d with %d and %d degrees of freedom',
    (probability, numeratorDegrees, denominatorDegrees) => {
      expect(() => varianceRatioQuantile({ probability, numeratorDegrees, denominatorDegrees })).toThrow(
        expect.objectContaining({ code: 'variance-ratio-invalid' }),
      );
    },
  );
});
