import { type Fill } from '@/journal/fills/fill';
import { signFills } from '@/journal/fills/signed-fill';
import { fillsInOrder, option, zqxaStock } from '@/tests/journal/fills/fill-fixtures';

const call = option('call', '102');
const buy = { kind: 'buy', instrument: call, quantity: '2', price: '1.20', fees: '1.30' } as const;
const sell = { ...buy, kind: 'sell' } as const;
const ending = { ...buy, price: '0', fees: '0' };

const signs = (fills: readonly Fill[]) =>
  signFills(fills).map(({ fill, signedQuantity }) => `${fill.id} ${signedQuantity}`);

describe('signFills', () => {
  it('orders by instant, then sequence, then id', () => {
    const at = '2026-12-09T15:00:00.000Z';
    const fills = [
      { ...buy, id: 'late', tradedAt: '2026-12-09T16:00:00.000Z', sequence: 1 },
      { ...buy, id: 'b', tradedAt: at, sequence: 7 },
      { ...buy, id: 'a', tradedAt: at, sequence: 7 },
      { ...sell, id: 'first', tradedAt: at, sequence: 3 },
    ];
    expect(signs(fills)).toEqual(['first -2', 'a 2', 'b 2', 'late 2']);
  });

  it('compares instants, not their texts', () => {
    const fills = [
      { ...buy, id: 'second', tradedAt: '2026-12-09T15:00:00.000Z', sequence: 1 },
      { ...buy, id: 'first', tradedAt: '2026-12-09T15:30:00.000+01:00', sequence: 2 },
    ];
    expect(signs(fills)).toEqual(['first 2', 'second 2']);
  });

  it('lets an expiry close whichever side is open', () => {
    expect(signs(fillsInOrder([buy, { ...ending, kind: 'expiry' }]))).toEqual(['f1 2', 'f2 -2']);
    expect(signs(fillsInOrder([sell, { ...ending, kind: 'expiry', quantity: '1' }]))).toEqual(['f1 -2', 'f2 1']);
  });

  it('takes strikes 102 and 102.00 as one series', () => {
    const fills = fillsInOrder([buy, { ...ending, kind: 'exercise', instrument: option('call', '102.00') }]);
    expect(new Set(signFills(fills).map(({ key }) => key)).size).toBe(1);
  });

  it('keeps series apart that differ in type, strike, expiry or underlying', () => {
    const others = [
      option('put', '102'),
      option('call', '103'),
      option('call', '102', { expirySessionDate: '2026-12-24' }),
      option('call', '102', { underlyingSymbol: 'HVYQ' }),
      zqxaStock,
    ];
    const fills = fillsInOrder([buy, ...others.map((instrument) => ({ ...buy, instrument }))]);
    expect(new Set(signFills(fills).map(({ key }) => key)).size).toBe(6);
  });

  it.each<[string, Parameters<typeof fillsInOrder>[0]]>([
    ['quantity-not-positive', [{ ...buy, quantity: '0' }]],
    ['quantity-not-positive', [{ ...buy, quantity: '-1' }]],
    ['decimal-invalid', [{ ...buy, quantity: '1e3' }]],
    ['decimal-invalid', [{ ...buy, price: '' }]],
    ['decimal-invalid', [{ ...buy, fees: 'NaN' }]],
    ['price-negative', [{ ...buy, price: '-0.01' }]],
    ['multiplier-invalid', [{ ...buy, instrument: option('call', '102', { multiplier: '0' }) }]],
    ['strike-not-positive', [{ ...buy, instrument: option('call', '0') }]],
    ['multipliers-mixed', [buy, { ...buy, instrument: option('call', '102', { multiplier: '10' }) }]],
    ['trade-time-invalid', [{ ...buy, tradedAt: 'yesterday' }]],
    ['sequence-invalid', [{ ...buy, sequence: NaN }]],
    ['fill-repeated', [buy, { ...buy, id: 'f1' }]],
    [
      'settlement-of-stock',
      [
        { ...buy, instrument: zqxaStock },
        { ...ending, instrument: zqxaStock, kind: 'expiry' },
      ],
    ],
    ['settlement-exceeds-position', [buy, { ...ending, kind: 'expiry', quantity: '3' }]],
    ['settlement-exceeds-position', [{ ...ending, kind: 'expiry' }]],
    ['settlement-exceeds-position', [sell, { ...ending, kind: 'assignment', quantity: '2.5' }]],
    ['settlement-side-wrong', [buy, { ...ending, kind: 'assignment' }]],
    ['settlement-side-wrong', [sell, { ...ending, kind: 'exercise' }]],
  ])('throws %s (case %#)', (code, fills) => {
    expect(() => signFills(fillsInOrder(fills))).toThrow(expect.objectContaining({ code }));
  });
});
