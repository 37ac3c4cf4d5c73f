import { totalCashFlow } from '@/journal/fills/cash-flow';
import { type Fill } from '@/journal/fills/fill';
import { sharesFromExercise } from '@/journal/fills/underlying-shares';
import { option, zqxaStock } from '@/tests/journal/fills/fill-fixtures';

const ended: Omit<Fill, 'kind' | 'instrument'> = {
  id: 'ended',
  quantity: '2',
  price: '0',
  fees: '5.00',
  tradedAt: '2026-12-18T21:00:00.000Z',
  sequence: 4,
};

describe('sharesFromExercise', () => {
  it.each([
    ['exercise', 'call', 'buy'],
    ['exercise', 'put', 'sell'],
    ['assignment', 'call', 'sell'],
    ['assignment', 'put', 'buy'],
  ] as const)('makes of the %s of a %s a %s of 200 shares at the strike', (kind, type, side) => {
    expect(sharesFromExercise({ ...ended, kind, instrument: option(type, '97') }, { id: 'shares' })).toEqual({
      id: 'shares',
      kind: side,
      instrument: zqxaStock,
      quantity: '200',
      price: '97',
      fees: '0',
      tradedAt: '2026-12-18T21:00:00.000Z',
      sequence: 4,
    });
  });

  it('pays the strike times the multiplier for what an adjusted contract delivers, cash taken off', () => {
    // By hand: 2 contracts x (97 x 100 - 12.50) = 19,375 for 300 shares; 19,375 / 300 = 64.58333..., its rest 1e-10 in the fees.
    const deliverable = { symbol: 'ZQXA', sharesPerContract: '150', cashPerContract: '12.50' };
    const instrument = option('call', '97', { underlyingSymbol: 'ZQXA1', deliverable });
    const bought = sharesFromExercise({ ...ended, kind: 'exercise', instrument }, { id: 'shares', fees: '0.02' });
    expect(bought).toMatchObject({
      kind: 'buy',
      instrument: zqxaStock,
      quantity: '300',
      price: '64.583333333333',
      fees: '0.0200000001',
    });
    expect(totalCashFlow([bought])).toBe('-19375.02');
    const sold = sharesFromExercise({ ...ended, kind: 'assignment', instrument }, { id: 'shares', fees: '0.02' });
    expect(totalCashFlow([sold])).toBe('19374.98');
  });

  it.each<[string, Fill]>([
    ['a trade', { ...ended, kind: 'sell', instrument: option('call', '97') }],
    ['an expiry', { ...ended, kind: 'expiry', instrument: option('call', '97') }],
    ['stock', { ...ended, kind: 'exercise', instrument: zqxaStock }],
  ])('throws no-delivery for %s', (_what, fill) => {
    expect(() => sharesFromExercise(fill, { id: 'shares' })).toThrow(expect.objectContaining({ code: 'no-delivery' }));
  });

  const adjusted = (sharesPerContract: string, cashPerContract: string): Fill => ({
    ...ended,
    kind: 'exercise',
    instrument: option('call', '97', { deliverable: { symbol: 'ZQXA', sharesPerContract, cashPerContract } }),
  });

  it('throws quantity-not-positive when nothing would be delivered', () => {
    expect(() => sharesFromExercise(adjusted('0', '0'), { id: 'shares' })).toThrow(
      expect.objectContaining({ code: 'quantity-not-positive' }),
    );
  });

  it.each(['-0.01', '9700.01'])('throws delivery-cash-invalid for %s in cash beside the shares', (cash) => {
    expect(() => sharesFromExercise(adjusted('100', cash), { id: 'shares' })).toThrow(
      expect.objectContaining({ code: 'delivery-cash-invalid' }),
    );
  });
});
