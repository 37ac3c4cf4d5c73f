import { Decimal as BaseDecimal } from 'decimal.js';
import { DomainError } from '@/journal/errors/domain-error';

/**
 * The one decimal type for money, prices and quantities: 40 significant digits, half-even, never exponential text.
 * A clone with its own settings, so that nothing else which uses decimal.js can change how money is computed.
 */
export const Decimal = BaseDecimal.clone({
  defaults: true,
  precision: 40,
  rounding: BaseDecimal.ROUND_HALF_EVEN,
  toExpNeg: -9e15,
  toExpPos: 9e15,
});
export type Decimal = BaseDecimal;

/** A plain decimal number as text: '1.20', '-40', '0'. */
export type DecimalText = string;

const greatestDigitCount = 40;

/**
 * Reads a decimal text.
 * @param text digits, optionally a leading minus, optionally a point with digits after it; nothing else: no spaces, no plus
 *   sign, no exponent, no thousands marks, no other script's digits. At most 40 digits, so that nothing is rounded unseen.
 * @returns the exact value; '-0' gives 0.
 * @throws {DomainError} `decimal-invalid` with the first 60 characters of the text.
 */
export function toDecimal(text: DecimalText): Decimal {
  const isPlain = typeof text === 'string' && text.length <= greatestDigitCount + 2 && /^-?\d+(\.\d+)?$/.test(text);
  const isShort =
    isPlain && (text.length <= greatestDigitCount || text.replace(/[-.]/g, '').length <= greatestDigitCount);
  if (!isShort) throw new DomainError('decimal-invalid', { text: String(text).slice(0, 60) });
  return withoutNegativeZero(new Decimal(text));
}

/** 0 for -0, and any other value as it is. */
export function withoutNegativeZero(value: Decimal): Decimal {
  return value.isZero() ? new Decimal(0) : value;
}

/**
 * Writes a decimal as plain text with all its digits and no more: '163.36', '-40', never '-0' and never an exponent.
 * @throws {DomainError} `decimal-invalid` when the value is not finite.
 */
export function toDecimalText(value: Decimal): DecimalText {
  if (!value.isFinite()) throw new DomainError('decimal-invalid', { text: value.toString() });
  return value.isZero() ? '0' : value.toFixed();
}

/**
 * Crosses from exact text to a model's double: the nearest double, ties to even.
 * @param text as for toDecimal.
 * @throws {DomainError} `decimal-invalid`.
 */
export function toModelNumber(text: DecimalText): number {
  return toDecimal(text).toNumber();
}

/**
 * Crosses from a model's double to a decimal: the shortest decimal that reads back as the same double.
 * @param value finite.
 * @throws {DomainError} `model-number-invalid` when it is not finite.
 */
export function fromModelNumber(value: number): Decimal {
  if (!Number.isFinite(value)) throw new DomainError('model-number-invalid', { value: String(value) });
  return withoutNegativeZero(new Decimal(value));
}
