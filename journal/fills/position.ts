import { type Fill, type Instrument } from '@/journal/fills/fill';
import { signFills } from '@/journal/fills/signed-fill';
import { type Decimal, type DecimalText, toDecimalText } from '@/journal/money/decimal';

export interface Position {
  readonly instrument: Instrument;
  /** Contracts or shares; long is positive, short negative, never 0. */
  readonly quantity: DecimalText;
}

/**
 * What is open after all fills.
 * @param fills effective fills, any order.
 * @returns one position an instrument that is not flat, in the order the instruments were first traded.
 * @throws {DomainError} as signFills.
 */
export function openPositions(fills: readonly Fill[]): Position[] {
  const byKey = new Map<string, { instrument: Instrument; quantity: Decimal }>();
  for (const { fill, key, signedQuantity } of signFills(fills)) {
    const known = byKey.get(key);
    byKey.set(key, {
      instrument: known?.instrument ?? fill.instrument,
      quantity: known === undefined ? signedQuantity : known.quantity.plus(signedQuantity),
    });
  }
  return [...byKey.values()]
    .filter(({ quantity }) => !quantity.isZero())
    .map(({ instrument, quantity }) => ({ instrument, quantity: toDecimalText(quantity) }));
}

/**
 * True when nothing is open; also when there are no fills.
 * @throws {DomainError} as signFills.
 */
export function isFlat(fills: readonly Fill[]): boolean {
  return openPositions(fills).length === 0;
}
