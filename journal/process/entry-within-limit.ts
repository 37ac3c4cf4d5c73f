import { type PlannedLeg } from '@/journal/contracts/planned-leg';
import { type Fill } from '@/journal/fills/fill';
import { instrumentKey } from '@/journal/fills/instrument-key';
import { signFills, type SignedFill } from '@/journal/fills/signed-fill';
import { Decimal, type DecimalText, toDecimal, toDecimalText } from '@/journal/money/decimal';
import { roundMoney } from '@/journal/money/rounding';

export interface EntryWithinLimit {
  /** Premium of the planned structure at the average prices of the opening fills: paid positive, received negative, currency. */
  readonly netPremium: DecimalText;
  /** The same at the planned prices, and what more was allowed. */
  readonly limit: DecimalText;
  /** Above 0 when it was dearer (or brought less) than the limit. */
  readonly beyond: DecimalText;
  readonly isWithin: boolean;
}

interface PlannedEntry {
  readonly symbol: string;
  readonly multiplier: DecimalText;
  readonly legs: readonly PlannedLeg[];
  /** How much worse than planned the net premium may be, currency, 0 or more. */
  readonly allowance: DecimalText;
}

/**
 * Holds the prices of an entry against the planned ones. Every fill that built the planned side of a leg counts, at its price; what
 * was closed and opened again counts again.
 * @returns null while a leg has no opening fill, since a part of a structure has no price of its own.
 * @throws {DomainError} as signFills; `decimal-invalid`.
 * @see common practice.
 */
export function entryWithinLimit(plan: PlannedEntry, fills: readonly Fill[]): EntryWithinLimit | null {
  const openings = openingsBySeries(signFills(fills));
  const multiplier = toDecimal(plan.multiplier);
  let [paid, planned] = [new Decimal(0), new Decimal(0)];
  for (const leg of plan.legs) {
    const key = instrumentKey({ ...leg, kind: 'option', underlyingSymbol: plan.symbol, multiplier: plan.multiplier });
    const opened = openings.get(`${leg.side} ${key}`);
    if (opened === undefined) return null;
    const shares = multiplier.times(leg.side === 'buy' ? leg.quantity : -leg.quantity);
    paid = paid.plus(opened.value.dividedBy(opened.quantity).times(shares));
    planned = planned.plus(toDecimal(leg.premium).times(shares));
  }
  const limit = planned.plus(toDecimal(plan.allowance));
  const beyond = roundMoney(paid.minus(limit));
  return {
    netPremium: toDecimalText(roundMoney(paid)),
    limit: toDecimalText(roundMoney(limit)),
    beyond: toDecimalText(beyond),
    isWithin: !beyond.greaterThan(0),
  };
}

/** Quantity and price x quantity of what built a position, by side and series. */
function openingsBySeries(signed: readonly SignedFill[]): Map<string, { quantity: Decimal; value: Decimal }> {
  const openings = new Map<string, { quantity: Decimal; value: Decimal }>();
  const positions = new Map<string, Decimal>();
  for (const { key, signedQuantity, price } of signed) {
    const before = positions.get(key) ?? new Decimal(0);
    const after = before.plus(signedQuantity);
    positions.set(key, after);
    const isBuilt = after.abs().greaterThan(before.abs()) || after.isPositive() !== before.isPositive();
    if (!isBuilt || after.isZero()) continue;
    // A fill that closed one side and went on to the other opened only what is left of it.
    const isSameSide = !before.isZero() && before.isPositive() === after.isPositive();
    const quantity = isSameSide ? after.minus(before).abs() : after.abs();
    const opening = `${after.isPositive() ? 'buy' : 'sell'} ${key}`;
    const known = openings.get(opening) ?? { quantity: new Decimal(0), value: new Decimal(0) };
    openings.set(opening, {
      quantity: known.quantity.plus(quantity),
      value: known.value.plus(price.times(quantity)),
    });
  }
  return openings;
}
