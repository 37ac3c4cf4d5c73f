import { Decimal as PlainDecimal } from 'decimal.js';
import fc from 'fast-check';
import { exponential, exponentialLessOne, exponentialOfSum } from '@/journal/distributions/exponential';

fc.configureGlobal({ seed: 20261201 });

/** Decimals long enough to tell the last digit of a double. */
const Decimal = PlainDecimal.clone({ precision: 40 });
/** A number given to the constructor is taken by its shortest digits, which are not all it has. */
const whole = (x: number) => new Decimal(x.toPrecision(100));
const relativeError = (actual: number, expected: PlainDecimal) => whole(actual).div(expected).sub(1).abs().toNumber();
/** Of the root and the sum; above 709 of e and a product too. */
const fewRoundings = 4.5e-16;

describe('exponential function', () => {
  it('has all digits but the last over the whole range of doubles', () => {
    fc.assert(
      fc.property(fc.double({ min: -700, max: 709.78, noNaN: true }), (x) => {
        expect(relativeError(exponential(x), whole(x).exp())).toBeLessThanOrEqual(fewRoundings);
      }),
      { numRuns: 400 },
    );
  });

  it('keeps digits of the exponent that its double cannot hold', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -700, max: 700, noNaN: true }),
        fc.double({ min: -1e-4, max: 1e-4, noNaN: true }),
        (x, rest) => {
          const exact = whole(x).add(whole(rest)).exp();
          expect(relativeError(exponentialOfSum(x, rest), exact)).toBeLessThanOrEqual(fewRoundings);
        },
      ),
      { numRuns: 400 },
    );
  });

  it('less one keeps its digits where it is tiny', () => {
    fc.assert(
      fc.property(fc.double({ min: -1 / 64, max: 1 / 64, noNaN: true }), (x) => {
        fc.pre(Math.abs(x) > 1e-300);
        // By the series: a difference of decimals would need hundreds of digits.
        let [term, sum] = [whole(x), whole(x)];
        for (let k = 2; k < 20; k += 1) {
          term = term.mul(whole(x)).div(k);
          sum = sum.add(term);
        }
        expect(relativeError(exponentialLessOne(x), sum)).toBeLessThanOrEqual(fewRoundings);
      }),
    );
  });

  it('less one joins what lies beyond a 64th without a step', () => {
    for (const x of [1 / 64, -1 / 64]) {
      const beyond = exponentialLessOne(x * (1 + 2 ** -50));
      expect(Math.abs(beyond / exponentialLessOne(x) - 1)).toBeLessThanOrEqual(2e-14);
    }
  });

  it('ends at 0 and infinity and hands NaN on', () => {
    expect(exponential(0)).toBe(1);
    expect(exponential(-Infinity)).toBe(0);
    expect(exponential(-746)).toBe(0);
    expect(exponential(-743)).toBeGreaterThan(0);
    expect(exponential(709.782712893384)).toBeGreaterThan(1.797e308);
    expect(exponential(710)).toBe(Infinity);
    expect(exponential(Infinity)).toBe(Infinity);
    expect(exponential(NaN)).toBeNaN();
    expect(exponentialLessOne(0)).toBe(0);
    expect(exponentialLessOne(-Infinity)).toBe(-1);
    expect(exponentialLessOne(NaN)).toBeNaN();
  });
});
