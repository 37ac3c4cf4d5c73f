import { DomainError } from '@/journal/errors/domain-error';
import { type Fill } from '@/journal/fills/fill';
import { instrumentKey } from '@/journal/fills/instrument-key';
import { Decimal, toDecimal } from '@/journal/money/decimal';

/** A checked fill in exact numbers, with the sign of its effect on the position: bought is positive, sold negative. */
export interface SignedFill {
  readonly fill: Fill;
  readonly key: string;
  readonly signedQuantity: Decimal;
  readonly price: Decimal;
  readonly fees: Decimal;
  readonly multiplier: Decimal;
}

/**
 * Checks fills, puts them in the order they took effect (instant, then sequence, then id) and gives each its sign. An expiry,
 * assignment or exercise takes the sign that closes the position it finds.
 * @param fills effective fills in any order, of any number of instruments; corrected and busted ones left out.
 * @throws {DomainError} `decimal-invalid`; `quantity-not-positive`, `price-negative`, `multiplier-invalid`, `trade-time-invalid`
 *   and `sequence-invalid` with the fill's id; `fill-repeated` for two fills of one id; `multipliers-mixed` within one series;
 *   `settlement-of-stock`; `settlement-exceeds-position` when more ends than is open; `settlement-side-wrong` for the
 *   assignment of a long or the exercise of a short option.
 */
export function signFills(fills: readonly Fill[]): SignedFill[] {
  const positions = new Map<string, { multiplier: Decimal; quantity: Decimal }>();
  const seenIds = new Set<string>();
  return inOrderOfEffect(fills).map((fill) => {
    if (seenIds.has(fill.id)) throw new DomainError('fill-repeated', { fillId: fill.id });
    seenIds.add(fill.id);
    const { quantity, price, fees, multiplier } = readAmounts(fill);
    const key = instrumentKey(fill.instrument);
    const position = positions.get(key) ?? { multiplier, quantity: new Decimal(0) };
    if (!position.multiplier.equals(multiplier)) {
      throw new DomainError('multipliers-mixed', {
        fillId: fill.id,
        multiplier: multiplier.toString(),
        earlierMultiplier: position.multiplier.toString(),
      });
    }
    const signedQuantity = signOf({ fill, quantity, open: position.quantity });
    positions.set(key, { multiplier, quantity: position.quantity.plus(signedQuantity) });
    return { fill, key, signedQuantity, price, fees, multiplier };
  });
}

function inOrderOfEffect(fills: readonly Fill[]): Fill[] {
  const timed = fills.map((fill) => {
    const time = Date.parse(fill.tradedAt);
    if (!Number.isFinite(time))
      throw new DomainError('trade-time-invalid', { fillId: fill.id, tradedAt: fill.tradedAt });
    if (!Number.isFinite(fill.sequence)) throw new DomainError('sequence-invalid', { fillId: fill.id });
    return { fill, time };
  });
  timed.sort(
    (one, other) =>
      one.time - other.time || one.fill.sequence - other.fill.sequence || (one.fill.id < other.fill.id ? -1 : 1),
  );
  return timed.map(({ fill }) => fill);
}

function readAmounts(fill: Fill) {
  const quantity = toDecimal(fill.quantity);
  const price = toDecimal(fill.price);
  const fees = toDecimal(fill.fees);
  const multiplier = toDecimal(fill.instrument.multiplier);
  if (!quantity.greaterThan(0))
    throw new DomainError('quantity-not-positive', { fillId: fill.id, quantity: fill.quantity });
  if (!price.greaterThanOrEqualTo(0)) throw new DomainError('price-negative', { fillId: fill.id, price: fill.price });
  const isMultiplierValid = fill.instrument.kind === 'stock' ? multiplier.equals(1) : multiplier.greaterThan(0);
  if (!isMultiplierValid) {
    throw new DomainError('multiplier-invalid', { fillId: fill.id, multiplier: fill.instrument.multiplier });
  }
  return { quantity, price, fees, multiplier };
}

function signOf({ fill, quantity, open }: { fill: Fill; quantity: Decimal; open: Decimal }): Decimal {
  if (fill.kind === 'buy') return quantity;
  if (fill.kind === 'sell') return quantity.negated();
  if (fill.instrument.kind === 'stock')
    throw new DomainError('settlement-of-stock', { fillId: fill.id, kind: fill.kind });
  if (quantity.greaterThan(open.abs())) {
    throw new DomainError('settlement-exceeds-position', {
      fillId: fill.id,
      kind: fill.kind,
      quantity: quantity.toString(),
      open: open.toString(),
    });
  }
  const isSideWrong =
    (fill.kind === 'assignment' && open.isPositive()) || (fill.kind === 'exercise' && open.isNegative());
  if (isSideWrong) {
    throw new DomainError('settlement-side-wrong', { fillId: fill.id, kind: fill.kind, open: open.toString() });
  }
  return open.isPositive() ? quantity.negated() : quantity;
}
