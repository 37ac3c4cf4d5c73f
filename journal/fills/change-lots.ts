import { type CarriedLot } from '@/journal/fills/lot-book';
import { CHANGED_QUANTITY_PLACES } from '@/journal/fills/instrument-change';
import { type SignedChange } from '@/journal/fills/signed-fill';
import { DomainError } from '@/journal/errors/domain-error';
import { dealPart, startAmountSplit } from '@/journal/money/amount-split';
import { Decimal } from '@/journal/money/decimal';

/**
 * Gives lots their quantities after a change, so that they add up to the changed position whatever the ratio; value and fees stay.
 * @throws {DomainError} `change-leaves-nothing` when one of them would round to 0.
 */
export function changeLots(lots: readonly CarriedLot[], { changedQuantity }: SignedChange): CarriedLot[] {
  const before = lots.reduce((sum, { quantity }) => sum.plus(quantity), new Decimal(0));
  let split = startAmountSplit({
    amount: changedQuantity.abs(),
    quantity: before,
    places: CHANGED_QUANTITY_PLACES,
  });
  return lots.map((lot) => {
    const dealt = dealPart(split, lot.quantity);
    split = dealt.split;
    if (!dealt.part.greaterThan(0)) {
      throw new DomainError('change-leaves-nothing', { quantity: lot.quantity.toString() });
    }
    return { ...lot, quantity: dealt.part };
  });
}
