import * as fc from 'fast-check';
import { Decimal, toDecimal } from '@/journal/money/decimal';
import { largestRemainder, roundMoney } from '@/journal/money/rounding';

const seed = 20261201;
const anyAmount = fc.integer({ min: -10_000_000, max: 10_000_000 }).map((units) => new Decimal(units).dividedBy(1000));

describe('roundMoney', () => {
  it.each([
    ['0.005', '0'],
    ['0.015', '0.02'],
    ['0.025', '0.02'],
    ['-0.025', '-0.02'],
    ['-0.035', '-0.04'],
    ['2.675', '2.68'],
    ['1.0250000000000000000000000001', '1.03'],
    ['-0.001', '0'],
  ])('rounds %s to %s: halves go to the even cent', (amount, rounded) => {
    expect(roundMoney(toDecimal(amount)).toString()).toBe(rounded);
  });

  it('keeps as many places as asked', () => {
    expect(roundMoney(toDecimal('2.5'), 0).toString()).toBe('2');
    expect(roundMoney(toDecimal('1.23456'), 4).toString()).toBe('1.2346');
  });

  it.each([-1, 1.5, NaN, Infinity])('refuses %p places', (places) => {
    expect(() => roundMoney(toDecimal('1'), places)).toThrow(expect.objectContaining({ code: 'places-invalid' }));
  });

  it('refuses an amount that is not finite', () => {
    expect(() => roundMoney(new Decimal(NaN))).toThrow(expect.objectContaining({ code: 'amount-not-finite' }));
  });
});

describe('largestRemainder', () => {
  const rounded = (parts: string[], places?: number, total?: string) =>
    largestRemainder(parts.map(toDecimal), places, total === undefined ? undefined : toDecimal(total)).map(String);

  it('gives the unit left over to the part that lost most', () => {
    expect(rounded(['33.333', '33.335', '33.332'])).toEqual(['33.33', '33.34', '33.33']);
  });

  it('prefers the earlier of two that lost the same', () => {
    expect(rounded(['0.5', '0.5'], 0)).toEqual(['1', '0']);
  });

  it('rounds negative parts towards a total as well', () => {
    expect(rounded(['548.3996', '-143.3752', '-55.6244'], 2, '349.40')).toEqual(['548.4', '-143.38', '-55.62']);
  });

  it('adds up to the rounded sum, each part less than one unit away (property)', () => {
    fc.assert(
      fc.property(
        fc.array(anyAmount, { minLength: 1, maxLength: 12 }),
        fc.integer({ min: 0, max: 3 }),
        (parts, places) => {
          const sum = (values: Decimal[]) => values.reduce((total, value) => total.plus(value), new Decimal(0));
          const result = largestRemainder(parts, places);
          expect(sum(result).toString()).toBe(roundMoney(sum(parts), places).toString());
          result.forEach((value, index) => {
            const distance = value.minus(parts[index] ?? NaN).abs();
            expect(distance.lessThan(new Decimal(10).pow(-places))).toBe(true);
          });
        },
      ),
      { seed, numRuns: 300 },
    );
  });

  it('refuses a total that no rounding of the parts reaches', () => {
    expect(() => rounded(['1.001', '2.001'], 2, '3.05')).toThrow(
      expect.objectContaining({ code: 'total-out-of-reach' }),
    );
    expect(() => rounded(['1.001', '2.001'], 2, '2.99')).toThrow(
      expect.objectContaining({ code: 'total-out-of-reach' }),
    );
    expect(() => rounded(['1.001', '2.001'], 2, '3.001')).toThrow(
      expect.objectContaining({ code: 'total-out-of-reach' }),
    );
  });

  it('refuses no parts, and parts that are not finite', () => {
    expect(() => largestRemainder([])).toThrow(expect.objectContaining({ code: 'parts-missing' }));
    expect(() => largestRemainder([new Decimal(NaN)])).toThrow(expect.objectContaining({ code: 'amount-not-finite' }));
  });
});
