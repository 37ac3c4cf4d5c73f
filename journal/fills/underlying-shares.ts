import { DomainError } from '@/journal/errors/domain-error';
import { type Fill } from '@/journal/fills/fill';
import { type DecimalText, toDecimal, toDecimalText } from '@/journal/money/decimal';

export interface SharesFromExercise {
  /** The id of the stock fill to be made. */
  readonly id: string;
  /** Shares one contract delivers, decimal text above 0; by default the option's multiplier. */
  readonly sharesPerContract?: DecimalText;
  /** Fees of the delivery itself, currency; '0' when they stand on the option's fill. */
  readonly fees?: DecimalText;
}

/**
 * The trade in the underlying that an exercise or assignment of a physically settled option makes: at the strike, at the same
 * instant. An exercised call and an assigned put buy, an exercised put and an assigned call sell.
 * @param fill an option's 'exercise' or 'assignment'.
 * @throws {DomainError} `no-delivery` for any other fill, `quantity-not-positive`, `decimal-invalid`.
 * @see The Characteristics and Risks of Standardized Options (exercise and settlement); from memory.
 */
export function sharesFromExercise(fill: Fill, { id, sharesPerContract, fees = '0' }: SharesFromExercise): Fill {
  const { instrument, kind } = fill;
  if (instrument.kind !== 'option' || (kind !== 'exercise' && kind !== 'assignment')) {
    throw new DomainError('no-delivery', { fillId: fill.id, kind, instrument: instrument.kind });
  }
  const shares = toDecimal(fill.quantity).times(toDecimal(sharesPerContract ?? instrument.multiplier));
  if (!shares.greaterThan(0))
    throw new DomainError('quantity-not-positive', { fillId: fill.id, quantity: shares.toString() });
  return {
    id,
    kind: (instrument.type === 'call') === (kind === 'exercise') ? 'buy' : 'sell',
    instrument: { kind: 'stock', symbol: instrument.underlyingSymbol, multiplier: '1' },
    quantity: toDecimalText(shares),
    price: instrument.strikePrice,
    fees,
    tradedAt: fill.tradedAt,
    sequence: fill.sequence,
  };
}
