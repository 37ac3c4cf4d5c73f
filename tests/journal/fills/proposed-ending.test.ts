import { overdueOptions, proposedEnding } from '@/journal/fills/proposed-ending';
import { fillsInOrder, option, zqxaStock } from '@/tests/journal/fills/fill-fixtures';

const call = option('call', '50');
const refusal = (code: string) => expect.objectContaining({ code });

describe('overdueOptions', () => {
  const fills = fillsInOrder([
    { kind: 'sell', instrument: call, quantity: '3', price: '0.35', fees: '0' },
    { kind: 'buy', instrument: zqxaStock, quantity: '10', price: '50', fees: '0' },
    {
      kind: 'buy',
      instrument: option('call', '60', { expirySessionDate: '2026-12-24' }),
      quantity: '1',
      price: '1',
      fees: '0',
    },
  ]);

  it('are those open after the day of their expiry, and no stock', () => {
    expect(overdueOptions(fills, { sessionDate: '2026-12-18' })).toEqual([]);
    expect(overdueOptions(fills, { sessionDate: '2026-12-21' })).toEqual([{ instrument: call, quantity: '-3' }]);
    expect(overdueOptions(fills, { sessionDate: '2026-12-28' })).toHaveLength(2);
  });
});

describe('proposedEnding', () => {
  const ending = (quantity: string, settlementPrice: string, settlement: 'cash' | 'physical', instrument = call) =>
    proposedEnding({ instrument, quantity }, { settlementPrice, settlement });

  it('assigns a short call that closes a cent in the money, and lets it expire below that', () => {
    expect(ending('-3', '50.01', 'physical')).toEqual({ kind: 'assignment', quantity: '3', price: '0' });
    expect(ending('-3', '50.009', 'physical')).toEqual({ kind: 'expiry', quantity: '3', price: '0' });
    expect(ending('-3', '49.60', 'physical')).toMatchObject({ kind: 'expiry' });
  });

  it('exercises a long put in the money', () => {
    expect(ending('2', '49', 'physical', option('put', '50'))).toMatchObject({ kind: 'exercise', quantity: '2' });
  });

  it('settles in cash at the value, to its last digit', () => {
    const index = option('call', '4050', { underlyingSymbol: 'ZZIX' });
    expect(ending('-1', '4058.40', 'cash', index)).toEqual({ kind: 'expiry', quantity: '1', price: '8.4' });
    expect(ending('-1', '4040', 'cash', index)).toMatchObject({ price: '0' });
  });

  it('values an adjusted contract by what it delivers', () => {
    // 150 shares at 33.50 and 12.50 in cash for a strike of 50 x 100: 37.50 in the money.
    const deliverable = { symbol: 'ZQXA', sharesPerContract: '150', cashPerContract: '12.50' };
    const adjusted = option('call', '50', { underlyingSymbol: 'ZQXA1', deliverable });
    expect(ending('1', '33.50', 'cash', adjusted).price).toBe('0.375');
    expect(ending('1', '33.50', 'physical', adjusted).kind).toBe('exercise');
    expect(ending('1', '33.20', 'physical', adjusted).kind).toBe('expiry');
  });

  it('refuses stock and a negative settlement value', () => {
    const asked = { settlementPrice: '50', settlement: 'cash' } as const;
    expect(() => proposedEnding({ instrument: zqxaStock, quantity: '1' }, asked)).toThrow(
      refusal('settlement-of-stock'),
    );
    expect(() => ending('1', '-1', 'cash')).toThrow(refusal('settlement-price-negative'));
  });
});
