import { DomainError } from '@/journal/errors/domain-error';
import { type Instrument } from '@/journal/fills/fill';
import { type Decimal, type DecimalText, toDecimal } from '@/journal/money/decimal';
import { roundMoney } from '@/journal/money/rounding';

/**
 * A split, a symbol change or another adjustment of a contract: what is held of one instrument becomes a holding of another, or of
 * the same in another quantity. Money does not move: each lot keeps its value, its fees and the instant it was opened. A pair of
 * rows of a file (so many out, so many in) is one change.
 */
export interface InstrumentChange {
  readonly id: string;
  /** UTC, ISO 8601 with milliseconds. */
  readonly changedAt: string;
  /** Order among fills and changes of the same instant. */
  readonly sequence: number;
  readonly from: Instrument;
  readonly to: Instrument;
  /** So many of `from`, above 0, */
  readonly oldQuantity: DecimalText;
  /** become so many of `to`, above 0: '1' to '2' in a two-for-one split. */
  readonly newQuantity: DecimalText;
}

/** A ratio need not end (one for three); quantities are kept to this many decimals. */
export const CHANGED_QUANTITY_PLACES = 12;

export interface ChangeRatio {
  readonly newQuantity: Decimal;
  readonly oldQuantity: Decimal;
}

/**
 * The ratio of a change in exact numbers.
 * @throws {DomainError} `decimal-invalid`; `change-ratio-invalid` unless both quantities are above 0; `change-of-kind` for an option
 *   that would become shares, or shares an option.
 */
export function changeRatio(change: InstrumentChange): ChangeRatio {
  const ratio = { newQuantity: toDecimal(change.newQuantity), oldQuantity: toDecimal(change.oldQuantity) };
  if (!(ratio.newQuantity.greaterThan(0) && ratio.oldQuantity.greaterThan(0))) {
    throw new DomainError('change-ratio-invalid', {
      changeId: change.id,
      newQuantity: change.newQuantity,
      oldQuantity: change.oldQuantity,
    });
  }
  if (change.from.kind !== change.to.kind) throw new DomainError('change-of-kind', { changeId: change.id });
  return ratio;
}

/**
 * What a quantity becomes, half-even to 12 decimals, any sign.
 * @throws {DomainError} `change-leaves-nothing` when a holding would round to 0.
 */
export function changedQuantity(quantity: Decimal, { newQuantity, oldQuantity }: ChangeRatio): Decimal {
  const changed = roundMoney(quantity.times(newQuantity).dividedBy(oldQuantity), CHANGED_QUANTITY_PLACES);
  if (changed.isZero() && !quantity.isZero()) {
    throw new DomainError('change-leaves-nothing', { quantity: quantity.toString() });
  }
  return changed;
}
