import { Decimal as BaseDecimal } from 'decimal.js';
import { Decimal, fromModelNumber, toDecimal, toDecimalText, toModelNumber } from '@/journal/money/decimal';

const accepted = [
  ['0', '0'],
  ['-0', '0'],
  ['-0.00', '0'],
  ['1.20', '1.2'],
  ['007', '7'],
  ['-40', '-40'],
  ['0.000000000001', '0.000000000001'],
  ['123456789012345678.123456789012', '123456789012345678.123456789012'],
  ['9007199254740993', '9007199254740993'],
  ['1000000000000000000000000000000', '1000000000000000000000000000000'],
] as const;

const refused = [
  '', ' ', '1 ', ' 1', '\t1', '1\n', '+1', '--1', '-', '.', '.5', '5.', '-.5', '1..2', '1.2.3', '1e3', '1E3', '1e-3',
  '0x10', '0b1', '0o7', 'NaN', 'Infinity', '-Infinity', 'null', 'undefined', 'true', '12abc', 'abc', '1,5', '1,000', "1'000",
  '1 000', '1_000', '(5.00)', '5-', '−5', '–5', '１２', '١٢', '१२', '½', '1٫5', '1.5%', '$1', '1 USD', '1/2', '1+1', '٣',
  '1\u00a0000', '\ufeff1', '1\u200b', '1'.repeat(41), `0.${'1'.repeat(40)}`, '-1'.repeat(2), '1.-2', '1.e2', '∞', '²',
]; // prettier-ignore

describe('toDecimal', () => {
  it.each(accepted)('reads %s as %s', (text, written) => {
    expect(toDecimalText(toDecimal(text))).toBe(written);
  });

  it.each(refused)('refuses %j', (text) => {
    expect(() => toDecimal(text)).toThrow(expect.objectContaining({ code: 'decimal-invalid' }));
  });

  it.each([12, null, undefined, {}, ['1']])('refuses %p, which is no text', (value) => {
    // @ts-expect-error what arrives without types must be refused too
    expect(() => toDecimal(value)).toThrow(expect.objectContaining({ code: 'decimal-invalid' }));
  });
});

describe('Decimal', () => {
  it('keeps 40 digits where the library keeps 20', () => {
    expect(toDecimal('1').dividedBy(3).toString()).toBe(`0.${'3'.repeat(40)}`);
  });

  it('is not changed by settings made on the library', () => {
    const before = BaseDecimal.precision;
    BaseDecimal.set({ precision: 5 });
    try {
      expect(Decimal.precision).toBe(40);
      expect(toDecimal('1234567.89').times(1).toString()).toBe('1234567.89');
    } finally {
      BaseDecimal.set({ precision: before });
    }
  });

  it('never writes an exponent', () => {
    expect(toDecimalText(toDecimal('10').pow(30))).toBe(`1${'0'.repeat(30)}`);
    expect(toDecimalText(toDecimal('10').pow(-30))).toBe(`0.${'0'.repeat(29)}1`);
  });

  it('refuses to write what is not finite', () => {
    expect(() => toDecimalText(new Decimal(1).dividedBy(0))).toThrow(
      expect.objectContaining({ code: 'decimal-invalid' }),
    );
    expect(() => toDecimalText(new Decimal(NaN))).toThrow(expect.objectContaining({ code: 'decimal-invalid' }));
  });
});

describe('the crossing between decimals and model numbers', () => {
  it('gives the nearest double', () => {
    expect(toModelNumber('0.1')).toBe(0.1);
    expect(toModelNumber('9007199254740993')).toBe(9007199254740992);
  });

  it('gives back the shortest decimal of a double', () => {
    expect(fromModelNumber(0.1 + 0.2).toString()).toBe('0.30000000000000004');
    expect(toDecimalText(fromModelNumber(-0))).toBe('0');
  });

  it.each([NaN, Infinity, -Infinity])('refuses %p', (value) => {
    expect(() => fromModelNumber(value)).toThrow(expect.objectContaining({ code: 'model-number-invalid' }));
  });
});
