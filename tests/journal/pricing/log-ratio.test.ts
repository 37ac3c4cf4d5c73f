import { Decimal as PlainDecimal } from 'decimal.js';
import fc from 'fast-check';
import { logRatio } from '@/journal/pricing/log-ratio';

fc.configureGlobal({ seed: 20261201 });

const Decimal = PlainDecimal.clone({ precision: 60 });
/** A number given to the constructor is taken by its shortest digits, which are not all it has. */
const whole = (x: number) => new Decimal(x.toPrecision(100));
const relativeError = (actual: number, expected: PlainDecimal) => whole(actual).div(expected).sub(1).abs().toNumber();
const exact = (numerator: number, denominator: number) => whole(numerator).div(whole(denominator)).ln();
const price = fc.double({ min: 0.5, max: 5000, noNaN: true });

describe('logarithm of a ratio', () => {
  it('has all digits but the last, however close the two are', () => {
    fc.assert(
      fc.property(price, fc.double({ min: -16, max: 0.5, noNaN: true }), (one, exponent) => {
        const other = one * (1 + 10 ** exponent);
        fc.pre(other !== one);
        expect(relativeError(logRatio(other, one), exact(other, one))).toBeLessThanOrEqual(3.4e-16);
      }),
      { numRuns: 400 },
    );
  });

  it('turns its sign, and nothing else, when the two change places', () => {
    fc.assert(
      fc.property(price, price, (one, other) => {
        expect(logRatio(one, other) + logRatio(other, one)).toBe(0);
      }),
    );
  });

  it('is 0 for equal numbers', () => {
    expect(logRatio(123.45, 123.45)).toBe(0);
  });

  it('spans the doubles: quotients that leave them still have a logarithm', () => {
    expect(relativeError(logRatio(1e300, 1e-300), exact(1e300, 1e-300))).toBeLessThanOrEqual(3.4e-16);
    const octaves = (count: number) => new Decimal(2).ln().mul(count);
    expect(relativeError(logRatio(2 ** -1074, 2 ** 996), octaves(-2070))).toBeLessThanOrEqual(3.4e-16);
    expect(relativeError(logRatio(2 ** -1070, 2 ** -1073), octaves(3))).toBeLessThanOrEqual(3.4e-16);
    expect(relativeError(logRatio(1.6e308, 1.7e308), exact(1.6e308, 1.7e308))).toBeLessThanOrEqual(3.4e-16);
  });
});
