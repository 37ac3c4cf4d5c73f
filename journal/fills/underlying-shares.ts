import { DomainError } from '@/journal/errors/domain-error';
import { exactPrice } from '@/journal/fills/exact-price';
import { type Fill } from '@/journal/fills/fill';
import { type DecimalText, toDecimal, toDecimalText } from '@/journal/money/decimal';

export interface SharesFromExercise {
  /** The id of the stock fill to be made. */
  readonly id: string;
  /** Fees of the delivery itself, currency; '0' when they stand on the option's fill. */
  readonly fees?: DecimalText;
}

/**
 * The trade in the underlying that an exercise or assignment of a physically settled option makes, at the same instant. An
 * exercised call and an assigned put buy, an exercised put and an assigned call sell. The strike times the premium's multiplier is
 * paid for what is delivered, so the shares come at the strike; of an adjusted series, at what is left for them once the cash of
 * the delivery is taken off. Where that price does not end, the rest of its rounding (below 1e-9) stands in the fees, so that no
 * money is lost.
 * @param fill an option's 'exercise' or 'assignment'.
 * @throws {DomainError} `no-delivery` for any other fill, `quantity-not-positive`, `sequence-invalid`, `decimal-invalid`, `delivery-cash-invalid` when
 *   the cash is negative or more than the strike pays for.
 * @see The Characteristics and Risks of Standardized Options (exercise and settlement; adjustments); from memory.
 */
export function sharesFromExercise(fill: Fill, { id, fees = '0' }: SharesFromExercise): Fill {
  const { instrument, kind } = fill;
  if (instrument.kind !== 'option' || (kind !== 'exercise' && kind !== 'assignment')) {
    throw new DomainError('no-delivery', { fillId: fill.id, kind, instrument: instrument.kind });
  }
  if (!Number.isFinite(fill.sequence)) throw new DomainError('sequence-invalid', { fillId: fill.id });
  const { deliverable } = instrument;
  const contracts = toDecimal(fill.quantity);
  const shares = contracts.times(toDecimal(deliverable?.sharesPerContract ?? instrument.multiplier));
  if (!shares.greaterThan(0))
    throw new DomainError('quantity-not-positive', { fillId: fill.id, quantity: shares.toString() });
  const cash = contracts.times(toDecimal(deliverable?.cashPerContract ?? '0'));
  const strikeAmount = contracts.times(toDecimal(instrument.strikePrice)).times(toDecimal(instrument.multiplier));
  if (cash.isNegative() || cash.greaterThan(strikeAmount)) {
    throw new DomainError('delivery-cash-invalid', { fillId: fill.id, cash: cash.toString() });
  }
  const { price, rest } = exactPrice({ amount: strikeAmount.minus(cash), quantity: shares });
  const isBuy = (instrument.type === 'call') === (kind === 'exercise');
  return {
    id,
    kind: isBuy ? 'buy' : 'sell',
    instrument: { kind: 'stock', symbol: deliverable?.symbol ?? instrument.underlyingSymbol, multiplier: '1' },
    quantity: toDecimalText(shares),
    price: toDecimalText(price),
    fees: toDecimalText(isBuy ? toDecimal(fees).plus(rest) : toDecimal(fees).minus(rest)),
    tradedAt: fill.tradedAt,
    sequence: fill.sequence,
  };
}
