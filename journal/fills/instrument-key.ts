import { contractKey } from '@/journal/contracts/option-contract';
import { DomainError } from '@/journal/errors/domain-error';
import { type Instrument } from '@/journal/fills/fill';
import { toDecimal, toDecimalText } from '@/journal/money/decimal';

/**
 * Equal for fills that open and close each other: one stock, or one option series. The multiplier is no part of it, so that two
 * multipliers within a series are found as the mistake they are.
 * @throws {DomainError} `decimal-invalid` for a strike that is no decimal text, `strike-not-positive`.
 */
export function instrumentKey(instrument: Instrument): string {
  if (instrument.kind === 'stock') return `stock ${instrument.symbol}`;
  // '97' and '97.00' are one strike.
  const strike = toDecimal(instrument.strikePrice);
  if (!strike.greaterThan(0)) throw new DomainError('strike-not-positive', { strikePrice: instrument.strikePrice });
  return `option ${contractKey({ ...instrument, strikePrice: toDecimalText(strike) })}`;
}
