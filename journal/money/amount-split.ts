import { DomainError } from '@/journal/errors/domain-error';
import { Decimal } from '@/journal/money/decimal';
import { roundMoney } from '@/journal/money/rounding';

/**
 * An amount dealt out over the parts of a quantity, part by part, to the cent (or to other places) and without loss: a part gets the rounded share of
 * all quantity dealt so far, less what was given before. The part that completes the quantity gets all that is left, also
 * fractions of a cent that the amount itself had. Immutable: each step gives the next state. (Common practice for split fees.)
 */
export interface AmountSplit {
  readonly amount: Decimal;
  readonly quantity: Decimal;
  readonly dealtQuantity: Decimal;
  readonly givenAmount: Decimal;
  /** Decimal places of every part but the last. */
  readonly places: number;
}

const nothing = new Decimal(0);

/**
 * @param amount any sign (a rebate is negative), currency.
 * @param quantity above 0.
 * @param places a whole number from 0; 2 by default.
 * @throws {DomainError} `quantity-not-positive`.
 */
export function startAmountSplit({
  amount,
  quantity,
  places = 2,
}: {
  amount: Decimal;
  quantity: Decimal;
  places?: number;
}): AmountSplit {
  if (!quantity.greaterThan(0)) throw new DomainError('quantity-not-positive', { quantity: quantity.toString() });
  return { amount, quantity, dealtQuantity: nothing, givenAmount: nothing, places };
}

/**
 * Deals the next part.
 * @param partQuantity above 0, at most what is left.
 * @returns the part's amount and the split after it.
 * @throws {DomainError} `quantity-not-positive`, `part-exceeds-quantity`.
 */
export function dealPart(split: AmountSplit, partQuantity: Decimal): { part: Decimal; split: AmountSplit } {
  if (!partQuantity.greaterThan(0))
    throw new DomainError('quantity-not-positive', { quantity: partQuantity.toString() });
  const dealtQuantity = split.dealtQuantity.plus(partQuantity);
  const left = split.quantity.comparedTo(dealtQuantity);
  if (left < 0) {
    throw new DomainError('part-exceeds-quantity', {
      quantity: split.quantity.toString(),
      dealt: dealtQuantity.toString(),
    });
  }
  const givenAmount =
    left === 0 ? split.amount : roundMoney(split.amount.times(dealtQuantity).dividedBy(split.quantity), split.places);
  return { part: givenAmount.minus(split.givenAmount), split: { ...split, dealtQuantity, givenAmount } };
}

/** What has not been dealt yet. */
export function undealtAmount(split: AmountSplit): Decimal {
  return split.amount.minus(split.givenAmount);
}
