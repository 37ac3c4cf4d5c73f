import { DomainError } from '@/journal/errors/domain-error';
import { type Fill, type FillKind, type OptionInstrument } from '@/journal/fills/fill';
import { type InstrumentChange } from '@/journal/fills/instrument-change';
import { openPositions, type Position } from '@/journal/fills/position';
import { Decimal, type DecimalText, toDecimal, toDecimalText } from '@/journal/money/decimal';
import { type SessionDate } from '@/journal/sessions/session-date';

/** In the money by at least this much per share, an expiring option is exercised unless its holder says otherwise. */
const EXERCISED_FROM = new Decimal('0.01');

/**
 * Options that are still open after their expiry: a row is missing.
 * @param fills effective fills, any order. @param question.sessionDate options that expired before it are looked for.
 * @throws {DomainError} as signEvents.
 */
export function overdueOptions(
  fills: readonly Fill[],
  { sessionDate, changes = [] }: { readonly sessionDate: SessionDate; readonly changes?: readonly InstrumentChange[] },
): Position[] {
  return openPositions(fills, changes).filter(
    ({ instrument }) => instrument.kind === 'option' && instrument.expirySessionDate < sessionDate,
  );
}

export interface ProposedEnding {
  readonly kind: Exclude<FillKind, 'buy' | 'sell'>;
  /** Contracts, above 0. */
  readonly quantity: DecimalText;
  readonly price: DecimalText;
}

/**
 * How an open option should have ended by the official settlement value: to be confirmed, since a holder can decide otherwise and
 * only some shorts are assigned. Settled in cash it ends at its value; with delivery it is exercised or assigned from 0.01 in the
 * money, and else expires at 0.
 * @param question.settlementPrice of the underlying, decimal text, 0 or more.
 * @throws {DomainError} `settlement-of-stock`, `settlement-price-negative`, `multiplier-invalid`, `decimal-invalid`.
 * @see Options Clearing Corporation, Rule 805 (exercise by exception); the threshold of 0.01 since 2008 from memory.
 */
export function proposedEnding(
  { instrument, quantity }: Position,
  { settlementPrice, settlement }: { readonly settlementPrice: DecimalText; readonly settlement: 'cash' | 'physical' },
): ProposedEnding {
  if (instrument.kind === 'stock') throw new DomainError('settlement-of-stock', { symbol: instrument.symbol });
  const value = valueInTheMoney(instrument, settlementPrice);
  const held = toDecimal(quantity);
  const contracts = toDecimalText(held.abs());
  if (settlement === 'cash') {
    return { kind: 'expiry', quantity: contracts, price: toDecimalText(Decimal.max(value, 0)) };
  }
  if (value.lessThan(EXERCISED_FROM)) return { kind: 'expiry', quantity: contracts, price: '0' };
  return { kind: held.isPositive() ? 'exercise' : 'assignment', quantity: contracts, price: '0' };
}

/** Per share of the multiplier; negative out of the money. */
function valueInTheMoney(option: OptionInstrument, settlementPrice: DecimalText): Decimal {
  const price = toDecimal(settlementPrice);
  if (price.isNegative()) throw new DomainError('settlement-price-negative', { settlementPrice });
  const multiplier = toDecimal(option.multiplier);
  if (!multiplier.greaterThan(0)) throw new DomainError('multiplier-invalid', { multiplier: option.multiplier });
  const { deliverable } = option;
  const delivered =
    deliverable === undefined
      ? price
      : price
          .times(toDecimal(deliverable.sharesPerContract))
          .plus(toDecimal(deliverable.cashPerContract))
          .dividedBy(multiplier);
  const above = delivered.minus(toDecimal(option.strikePrice));
  return option.type === 'call' ? above : above.negated();
}
