import { type Fill, type Instrument } from '@/journal/fills/fill';
import { type InstrumentChange } from '@/journal/fills/instrument-change';
import { signEvents } from '@/journal/fills/signed-fill';
import { type Decimal, type DecimalText, toDecimalText } from '@/journal/money/decimal';

export interface Position {
  readonly instrument: Instrument;
  /** Contracts or shares; long is positive, short negative, never 0. */
  readonly quantity: DecimalText;
}

/**
 * What is open after all fills.
 * @param fills effective fills, any order. @param changes splits and other adjustments of what is held, any order.
 * @returns one position an instrument that is not flat, in the order the instruments were first traded.
 * @throws {DomainError} as signEvents.
 */
export function openPositions(fills: readonly Fill[], changes: readonly InstrumentChange[] = []): Position[] {
  const byKey = new Map<string, { instrument: Instrument; quantity: Decimal }>();
  const add = (key: string, instrument: Instrument, quantity: Decimal) => {
    const known = byKey.get(key);
    byKey.set(key, {
      instrument: known?.instrument ?? instrument,
      quantity: known === undefined ? quantity : known.quantity.plus(quantity),
    });
  };
  for (const event of signEvents(fills, changes)) {
    if (event.kind === 'fill') {
      add(event.key, event.fill.instrument, event.signedQuantity);
      continue;
    }
    byKey.delete(event.fromKey);
    add(event.toKey, event.change.to, event.changedQuantity);
  }
  return [...byKey.values()]
    .filter(({ quantity }) => !quantity.isZero())
    .map(({ instrument, quantity }) => ({ instrument, quantity: toDecimalText(quantity) }));
}

/**
 * True when nothing is open; also when there are no fills.
 * @throws {DomainError} as signEvents.
 */
export function isFlat(fills: readonly Fill[], changes: readonly InstrumentChange[] = []): boolean {
  return openPositions(fills, changes).length === 0;
}
