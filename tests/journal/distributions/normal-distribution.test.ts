import fc from 'fast-check';
import jstat from 'jstat';
import reference from '@/tests/journal/distributions/normal-60-digits.json';
import {
  normalCumulative,
  normalDensity,
  normalQuantile,
  normalUpperTail,
  scaledUpperTail,
} from '@/journal/distributions/normal-distribution';

fc.configureGlobal({ seed: 20261201 });

const relativeError = (actual: number, expected: number) => Math.abs(actual / expected - 1);
/** Four roundings of a double: what a product of two exponentials and a fraction may lose. */
const fewRoundings = 9e-16;

describe('normal distribution', () => {
  it.each(reference.tails)('has tail and density of 60-digit arithmetic at $x', ({ x, upperTail, density }) => {
    expect(relativeError(normalUpperTail(x), upperTail)).toBeLessThanOrEqual(fewRoundings);
    expect(relativeError(normalCumulative(-x), upperTail)).toBeLessThanOrEqual(fewRoundings);
    expect(relativeError(normalDensity(x), density)).toBeLessThanOrEqual(fewRoundings);
  });

  it.each(reference.quantiles)('has the quantile of $probability', ({ probability, x }) => {
    // Near the centre the quantile is small and its digits end where those of one half do.
    expect(Math.abs(normalQuantile(probability) - x)).toBeLessThanOrEqual(4e-16 * Math.max(Math.abs(x), 0.3));
  });

  it.each([
    { x: 1, cumulative: 0.8413 },
    { x: 1.96, cumulative: 0.975 },
    { x: 2.33, cumulative: 0.9901 },
    { x: 3, cumulative: 0.9987 },
  ])('has the four printed digits of the usual table at $x', ({ x, cumulative }) => {
    expect(Math.abs(normalCumulative(x) - cumulative)).toBeLessThanOrEqual(0.00005);
  });

  it('agrees with jstat in the middle, where jstat keeps its digits', () => {
    for (let x = -3; x <= 3; x += 0.25) {
      expect(Math.abs(normalCumulative(x) - jstat.jStat.normal.cdf(x, 0, 1))).toBeLessThanOrEqual(1e-13);
    }
  });

  it('gives tails that sum to 1', () => {
    fc.assert(
      fc.property(fc.double({ min: -40, max: 40, noNaN: true }), (x) => {
        expect(Math.abs(normalCumulative(x) + normalUpperTail(x) - 1)).toBeLessThanOrEqual(2.3e-16);
      }),
    );
  });

  it('never rises along the upper tail by more than a rounding', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -38, max: 38, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (x, step) => {
          expect(normalUpperTail(x + step)).toBeLessThanOrEqual(normalUpperTail(x) * (1 + fewRoundings));
        },
      ),
    );
  });

  it('comes back to the probability from its quantile', () => {
    fc.assert(
      fc.property(fc.double({ min: -690, max: Math.log(0.5), noNaN: true }), (logProbability) => {
        const probability = Math.exp(logProbability);
        const x = normalQuantile(probability);
        // One rounding of x moves the tail by x·φ(x)/Φ(x) roundings, about x².
        expect(relativeError(normalCumulative(x), probability)).toBeLessThanOrEqual(1e-15 * (2 + x * x));
      }),
    );
  });

  it('splits the tail into its exponential and what is left', () => {
    for (const x of [-36, -6, -1, -0.999, -0.3, 0, 0.5, 1, 4, 6, 20, 36]) {
      expect(relativeError(scaledUpperTail(x) * Math.exp((-x * x) / 2), normalUpperTail(x))).toBeLessThanOrEqual(2e-13);
    }
  });

  it('keeps what is left of the tail finite where the tail itself is 0', () => {
    expect(normalUpperTail(100)).toBe(0);
    expect(relativeError(scaledUpperTail(100), 1 / (100 * Math.sqrt(2 * Math.PI)))).toBeLessThanOrEqual(1.1e-4); // 1/x²
  });

  it('ends at 0 and 1 at the infinities and hands NaN on', () => {
    expect(normalUpperTail(Infinity)).toBe(0);
    expect(normalUpperTail(-Infinity)).toBe(1);
    expect(normalCumulative(-Infinity)).toBe(0);
    expect(normalUpperTail(NaN)).toBeNaN();
    expect(normalQuantile(0.5)).toBe(0);
  });

  it.each([0, 1, -0.1, 1.1, NaN, Infinity])('throws probability-out-of-range for the quantile of %p', (probability) => {
    expect(() => normalQuantile(probability)).toThrow(expect.objectContaining({ code: 'probability-out-of-range' }));
  });
});
