import { type Fill, type Instrument, type OptionInstrument } from '@/journal/fills/fill';

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
