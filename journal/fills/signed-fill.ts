import { DomainError } from '@/journal/errors/domain-error';
import { type Fill } from '@/journal/fills/fill';
import {
  changedQuantity,
  changeRatio,
  type ChangeRatio,
  type InstrumentChange,
} from '@/journal/fills/instrument-change';
import { instrumentKey } from '@/journal/fills/instrument-key';
import { Decimal, toDecimal } from '@/journal/money/decimal';

/** A checked fill in exact numbers, with the sign of its effect on the position: bought is positive, sold negative. */
export interface SignedFill {
  readonly kind: 'fill';
  readonly fill: Fill;
  readonly key: string;
  readonly signedQuantity: Decimal;
  readonly price: Decimal;
  readonly fees: Decimal;
  readonly multiplier: Decimal;
}

/** A checked change of an instrument that is held. */
export interface SignedChange {
  readonly kind: 'change';
  readonly change: InstrumentChange;
  readonly fromKey: string;
  readonly toKey: string;
  readonly ratio: ChangeRatio;
  /** What is held of the new instrument because of it; short is negative. */
  readonly changedQuantity: Decimal;
}

interface OpenPosition {
  readonly multiplier: Decimal;
  readonly quantity: Decimal;
}

/**
 * Checks fills, puts them in the order they took effect (instant, then sequence, then id) and gives each its sign. An expiry,
 * assignment or exercise takes the sign that closes the position it finds.
 * @param fills effective fills in any order, of any number of instruments; corrected and busted ones left out.
 * @param changes splits and other adjustments, any order; those of what is not held at the time have no effect.
 * @throws {DomainError} as signEvents.
 */
export function signFills(fills: readonly Fill[], changes: readonly InstrumentChange[] = []): SignedFill[] {
  return signEvents(fills, changes).filter((event) => event.kind === 'fill');
}

/**
 * As signFills, with the changes of what is held between the fills.
 * @throws {DomainError} `decimal-invalid`; `strike-not-positive`; `quantity-not-positive`, `price-negative`, `multiplier-invalid`, `trade-time-invalid`
 *   and `sequence-invalid` with the fill's id; `fill-repeated` for two fills or changes of one id; `multipliers-mixed` within one
 *   series; `settlement-of-stock`; `settlement-exceeds-position` when more ends than is open; `settlement-side-wrong` for the
 *   assignment of a long or the exercise of a short option; `change-meets-opposite-position` when long would become short of the
 *   same; and as changeRatio and changedQuantity.
 */
export function signEvents(
  fills: readonly Fill[],
  changes: readonly InstrumentChange[] = [],
): (SignedFill | SignedChange)[] {
  const positions = new Map<string, OpenPosition>();
  const seenIds = new Set<string>();
  return inOrderOfEffect(fills, changes).flatMap(({ id, event }): (SignedFill | SignedChange)[] => {
    if (seenIds.has(id)) throw new DomainError('fill-repeated', { fillId: id });
    seenIds.add(id);
    if ('from' in event) {
      const signed = signChange(event, positions);
      return signed === null ? [] : [signed];
    }
    return [signFill(event, positions)];
  });
}

function signFill(fill: Fill, positions: Map<string, OpenPosition>): SignedFill {
  const { quantity, price, fees, multiplier } = readAmounts(fill);
  const key = instrumentKey(fill.instrument);
  const position = positions.get(key) ?? { multiplier, quantity: new Decimal(0) };
  requireOneMultiplier({ id: fill.id, multiplier, position });
  const signedQuantity = signOf({ fill, quantity, open: position.quantity });
  positions.set(key, { multiplier, quantity: position.quantity.plus(signedQuantity) });
  return { kind: 'fill', fill, key, signedQuantity, price, fees, multiplier };
}

function signChange(change: InstrumentChange, positions: Map<string, OpenPosition>): SignedChange | null {
  const [fromKey, toKey] = [instrumentKey(change.from), instrumentKey(change.to)];
  const ratio = changeRatio(change);
  const multiplier = readMultiplier({ id: change.id, instrument: change.to });
  const held = positions.get(fromKey);
  if (held === undefined || held.quantity.isZero()) return null;
  requireOneMultiplier({
    id: change.id,
    multiplier: readMultiplier({ id: change.id, instrument: change.from }),
    position: held,
  });
  positions.delete(fromKey);
  const other = positions.get(toKey) ?? { multiplier, quantity: new Decimal(0) };
  requireOneMultiplier({ id: change.id, multiplier, position: other });
  const changed = changedQuantity(held.quantity, ratio);
  if (!other.quantity.isZero() && other.quantity.isPositive() !== changed.isPositive()) {
    throw new DomainError('change-meets-opposite-position', { changeId: change.id });
  }
  positions.set(toKey, { multiplier, quantity: other.quantity.plus(changed) });
  return { kind: 'change', change, fromKey, toKey, ratio, changedQuantity: changed };
}

interface TimedEvent {
  readonly id: string;
  readonly sequence: number;
  readonly time: number;
  readonly event: Fill | InstrumentChange;
}

function inOrderOfEffect(fills: readonly Fill[], changes: readonly InstrumentChange[]): TimedEvent[] {
  const timed = [
    ...fills.map((fill) => timedEvent(fill, fill.tradedAt)),
    ...changes.map((change) => timedEvent(change, change.changedAt)),
  ];
  return timed.sort(
    (one, other) => one.time - other.time || one.sequence - other.sequence || (one.id < other.id ? -1 : 1),
  );
}

function timedEvent(event: Fill | InstrumentChange, at: string): TimedEvent {
  const { id, sequence } = event;
  const time = Date.parse(at);
  if (!Number.isFinite(time)) throw new DomainError('trade-time-invalid', { fillId: id, tradedAt: at });
  if (!Number.isFinite(sequence)) throw new DomainError('sequence-invalid', { fillId: id });
  return { id, sequence, time, event };
}

function requireOneMultiplier({
  id,
  multiplier,
  position,
}: {
  readonly id: string;
  readonly multiplier: Decimal;
  readonly position: OpenPosition;
}): void {
  if (position.multiplier.equals(multiplier)) return;
  throw new DomainError('multipliers-mixed', {
    fillId: id,
    multiplier: multiplier.toString(),
    earlierMultiplier: position.multiplier.toString(),
  });
}

function readMultiplier({ id, instrument }: Pick<Fill, 'id' | 'instrument'>): Decimal {
  const multiplier = toDecimal(instrument.multiplier);
  const isValid = instrument.kind === 'stock' ? multiplier.equals(1) : multiplier.greaterThan(0);
  if (!isValid) throw new DomainError('multiplier-invalid', { fillId: id, multiplier: instrument.multiplier });
  return multiplier;
}

function readAmounts(fill: Fill) {
  const quantity = toDecimal(fill.quantity);
  const price = toDecimal(fill.price);
  const fees = toDecimal(fill.fees);
  if (!quantity.greaterThan(0))
    throw new DomainError('quantity-not-positive', { fillId: fill.id, quantity: fill.quantity });
  if (!price.greaterThanOrEqualTo(0)) throw new DomainError('price-negative', { fillId: fill.id, price: fill.price });
  return { quantity, price, fees, multiplier: readMultiplier(fill) };
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
