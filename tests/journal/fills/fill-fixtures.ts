import { type Fill, type Instrument, type OptionInstrument } from '@/journal/fills/fill';
import { sharesFromExercise } from '@/journal/fills/underlying-shares';

export const zqxaStock: Instrument = { kind: 'stock', symbol: 'ZQXA', multiplier: '1' };

export function option(
  type: 'call' | 'put',
  strikePrice: string,
  more: Partial<OptionInstrument> = {},
): OptionInstrument {
  return {
    kind: 'option',
    underlyingSymbol: 'ZQXA',
    expirySessionDate: '2026-12-18',
    type,
    strikePrice,
    multiplier: '100',
    ...more,
  };
}

/** Fills a minute apart in the order given, with ids f1, f2 and so on. */
export function fillsInOrder(fills: readonly (Omit<Fill, 'id' | 'tradedAt' | 'sequence'> & Partial<Fill>)[]): Fill[] {
  return fills.map((fill, index) => ({
    id: `f${index + 1}`,
    tradedAt: new Date(Date.UTC(2026, 11, 9, 15, index)).toISOString(),
    sequence: index + 1,
    ...fill,
  }));
}

/**
 * Worked outside this project: sell a 97 put at 0.78, buy a 95 put at 0.30, 0.66 each; settled at 96.20, assigned, the 100 shares
 * sold at 96.55 in the next session for a fee of 0.02. In order: both openings, the expiry, the assignment, the shares, their sale.
 */
export function assignedPutSpread(): Fill[] {
  const [shortPut, longPut] = [option('put', '97'), option('put', '95')];
  const tradedAt = '2026-12-18T21:00:00.000Z';
  const fills = fillsInOrder([
    { kind: 'sell', instrument: shortPut, quantity: '1', price: '0.78', fees: '0.66' },
    { kind: 'buy', instrument: longPut, quantity: '1', price: '0.30', fees: '0.66' },
    { kind: 'expiry', instrument: longPut, quantity: '1', price: '0', fees: '0', tradedAt },
    { kind: 'assignment', instrument: shortPut, quantity: '1', price: '0', fees: '0', tradedAt, id: 'assigned' },
  ]);
  const shares = fills.slice(3).map((assigned) => sharesFromExercise(assigned, { id: 'shares' }));
  const sales = shares.map((bought): Fill => ({
    ...bought,
    id: 'sold',
    kind: 'sell',
    price: '96.55',
    fees: '0.02',
    tradedAt: '2026-12-21T14:30:00.000Z',
  }));
  return [...fills, ...shares, ...sales];
}
