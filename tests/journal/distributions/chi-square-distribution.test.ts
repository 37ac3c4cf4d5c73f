import fc from 'fast-check';
import reference from '@/tests/reference/data/sigma_interval.json';
import { casesOf, numberOf } from '@/tests/reference/reference-file';
import { chiSquareCumulative, chiSquareQuantile } from '@/journal/distributions/chi-square-distribution';

fc.configureGlobal({ seed: 20261201 });

const relativeError = (actual: number, expected: number) => Math.abs(actual / expected - 1);

describe('chi-square distribution', () => {
  it.each(casesOf(reference, 'intervals'))('has both quantiles of $id ($df degrees, $confidence)', (one) => {
    const degrees = numberOf(one, 'df');
    const tail = (1 - numberOf(one, 'confidence')) / 2;
    // Measured 6.3e-12 at worst, in the series that jstat sums.
    expect(relativeError(chiSquareQuantile(tail, degrees), numberOf(one, 'chi2_lower'))).toBeLessThanOrEqual(7e-12);
    expect(relativeError(chiSquareQuantile(1 - tail, degrees), numberOf(one, 'chi2_upper'))).toBeLessThanOrEqual(7e-12);
  });

  it.each(casesOf(reference, 'table'))(
    'has the printed value of $id ($df degrees, upper tail $p_upper_tail)',
    (one) => {
      const quantile = chiSquareQuantile(1 - numberOf(one, 'p_upper_tail'), numberOf(one, 'df'));
      expect(Math.abs(quantile - numberOf(one, 'chi2'))).toBeLessThanOrEqual(0.0005); // half of the last printed digit
    },
  );

  it('is an exponential distribution at 2 degrees of freedom', () => {
    for (const x of [1e-6, 0.01, 0.5, 2, 10, 50]) {
      expect(relativeError(chiSquareCumulative(x, 2), -Math.expm1(-x / 2))).toBeLessThanOrEqual(1e-15);
    }
  });

  it('comes back to the probability from its quantile', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-6, max: 0.999999, noNaN: true }),
        fc.double({ min: 1, max: 300, noNaN: true }),
        (probability, degrees) => {
          const back = chiSquareCumulative(chiSquareQuantile(probability, degrees), degrees);
          expect(relativeError(back, probability)).toBeLessThanOrEqual(1e-12);
        },
      ),
    );
  });

  it('has the quantiles of scipy 1.17.1 past a million degrees', () => {
    expect(relativeError(chiSquareQuantile(0.025, 4e6), 3994458.2792516043)).toBeLessThanOrEqual(1e-13);
    expect(relativeError(chiSquareQuantile(0.975, 4e6), 4005545.5093600205)).toBeLessThanOrEqual(1e-13);
  });

  it('has nothing below 0', () => {
    expect(chiSquareCumulative(0, 5)).toBe(0);
    expect(chiSquareCumulative(-1, 5)).toBe(0);
  });

  it.each([0, 1, NaN])('throws probability-out-of-range for the quantile of %p', (probability) => {
    expect(() => chiSquareQuantile(probability, 5)).toThrow(
      expect.objectContaining({ code: 'probability-out-of-range' }),
    );
  });

  it.each([0, -1, NaN, Infinity])('throws degrees-of-freedom-invalid for %p degrees', (degrees) => {
    const refusal = expect.objectContaining({ code: 'degrees-of-freedom-invalid' });
    expect(() => chiSquareCumulative(1, degrees)).toThrow(refusal);
    expect(() => chiSquareQuantile(0.5, degrees)).toThrow(refusal);
  });
});
