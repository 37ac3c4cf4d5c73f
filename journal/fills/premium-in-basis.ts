import { type Delivery, deliveryFills } from '@/journal/fills/delivery';
import { exactPrice } from '@/journal/fills/exact-price';
import { type Fill } from '@/journal/fills/fill';
import { type InstrumentChange } from '@/journal/fills/instrument-change';
import { type ClosedLot, type LotMethod } from '@/journal/fills/lot';
import { type MatchedLots, matchLots } from '@/journal/fills/lots';
import { Decimal, toDecimal, toDecimalText } from '@/journal/money/decimal';

/**
 * The same fills with the premium of exercised and assigned options carried into the shares they delivered: those option lots are
 * left out, and the shares come at the strike less a premium received, or more by one paid, and bear the option's fees. The totals
 * are those of matchLots once all is flat; while shares are held, their part of the premium is not realised yet.
 * @param fills effective fills, any order. @param options.deliveries which exercise or assignment made which shares.
 * @returns as matchLots; `cashFlow` and `fees` are those of the plain view.
 * @throws {DomainError} as matchLots; `delivery-unknown`, `delivery-repeated`; `price-negative` when more premium was received than
 *   the shares cost.
 * @see common practice; not a statement of tax.
 */
export function premiumInBasis(
  fills: readonly Fill[],
  {
    method,
    deliveries,
    changes = [],
  }: { method: LotMethod; deliveries: readonly Delivery[]; changes?: readonly InstrumentChange[] },
): MatchedLots {
  const plain = matchLots(fills, { method, changes });
  const carried = new Map<string, Fill>();
  const endings = new Set<string>();
  for (const { optionFill, sharesFill } of deliveryFills(fills, deliveries)) {
    endings.add(optionFill.id);
    const lots = plain.closed.filter(({ closeFillId }) => closeFillId === optionFill.id);
    carried.set(sharesFill.id, withPremium(sharesFill, lots));
  }
  const shares = matchLots(
    fills.filter(({ instrument }) => instrument.kind === 'stock').map((fill) => carried.get(fill.id) ?? fill),
    { method, changes: changes.filter(({ from }) => from.kind === 'stock') },
  );
  const options = plain.closed.filter(
    ({ instrument, closeFillId }) => instrument.kind === 'option' && !endings.has(closeFillId),
  );
  const closed = [...options, ...shares.closed].sort(
    (one, other) => Date.parse(one.closedAt) - Date.parse(other.closedAt),
  );
  return {
    closed,
    open: [...plain.open.filter(({ instrument }) => instrument.kind === 'option'), ...shares.open],
    realisedProfit: toDecimalText(sumOf(closed.map(({ realisedProfit }) => realisedProfit))),
    fees: plain.fees,
    cashFlow: plain.cashFlow,
  };
}

function withPremium(shares: Fill, lots: readonly ClosedLot[]): Fill {
  const gross = sumOf(lots.map(({ grossProfit }) => grossProfit));
  const quantity = toDecimal(shares.quantity);
  const paid = toDecimal(shares.price).times(quantity);
  const isBuy = shares.kind === 'buy';
  const { price, rest } = exactPrice({ amount: isBuy ? paid.minus(gross) : paid.plus(gross), quantity });
  const fees = sumOf([shares.fees, ...lots.flatMap(({ openFees, closeFees }) => [openFees, closeFees])]);
  return {
    ...shares,
    price: toDecimalText(price),
    fees: toDecimalText(isBuy ? fees.plus(rest) : fees.minus(rest)),
  };
}

function sumOf(amounts: readonly string[]): Decimal {
  return amounts.reduce((sum, amount) => sum.plus(toDecimal(amount)), new Decimal(0));
}
