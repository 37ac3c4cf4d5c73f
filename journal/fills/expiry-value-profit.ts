import { type Delivery, deliveryFills } from '@/journal/fills/delivery';
import { type Fill } from '@/journal/fills/fill';
import { type InstrumentChange } from '@/journal/fills/instrument-change';
import { type LotMethod } from '@/journal/fills/lot';
import { matchLots } from '@/journal/fills/lots';
import { type DecimalText, Decimal, toDecimal, toDecimalText } from '@/journal/money/decimal';
import { DomainError } from '@/journal/errors/domain-error';

export interface ExpiryValueProfit {
  /** What the options made with the delivered shares valued at the settlement: the part an option plan is scored on. */
  readonly options: DecimalText;
  /** What the shares made from there on. */
  readonly carriedShares: DecimalText;
  /** Both, which is the realised profit. */
  readonly total: DecimalText;
}

/**
 * Parts the realised profit at the delivery: options at the value they had when they were settled, and the shares carried on.
 * @param settlementPrices per share by the id of the exercise or assignment, decimal text, 0 or more.
 * @throws {DomainError} as matchLots; `delivery-unknown`, `delivery-repeated`; `settlement-price-missing`,
 *   `settlement-price-negative`.
 * @see common practice.
 */
export function expiryValueProfit(
  fills: readonly Fill[],
  {
    method,
    deliveries,
    settlementPrices,
    changes = [],
  }: {
    method: LotMethod;
    deliveries: readonly Delivery[];
    settlementPrices: ReadonlyMap<string, DecimalText>;
    changes?: readonly InstrumentChange[];
  },
): ExpiryValueProfit {
  const { closed, realisedProfit } = matchLots(fills, { method, changes });
  let options = closed
    .filter(({ instrument }) => instrument.kind === 'option')
    .reduce((sum, lot) => sum.plus(toDecimal(lot.realisedProfit)), new Decimal(0));
  for (const { optionFill, sharesFill } of deliveryFills(fills, deliveries)) {
    const text = settlementPrices.get(optionFill.id);
    if (text === undefined) throw new DomainError('settlement-price-missing', { fillId: optionFill.id });
    const settlement = toDecimal(text);
    if (settlement.isNegative()) throw new DomainError('settlement-price-negative', { fillId: optionFill.id });
    const gained = settlement.minus(toDecimal(sharesFill.price)).times(toDecimal(sharesFill.quantity));
    options = sharesFill.kind === 'buy' ? options.plus(gained) : options.minus(gained);
  }
  const total = toDecimal(realisedProfit);
  return {
    options: toDecimalText(options),
    carriedShares: toDecimalText(total.minus(options)),
    total: toDecimalText(total),
  };
}
