import { isFlat, openPositions } from '@/journal/fills/position';
import { fillsInOrder, option, zqxaStock } from '@/tests/journal/fills/fill-fixtures';

const call = option('call', '102');

describe('openPositions', () => {
  it('nets buys and sells, short negative, and leaves out what is flat', () => {
    const fills = fillsInOrder([
      { kind: 'sell', instrument: call, quantity: '5', price: '1', fees: '0' },
      { kind: 'buy', instrument: zqxaStock, quantity: '10.5', price: '100', fees: '0' },
      { kind: 'buy', instrument: option('put', '97'), quantity: '2', price: '1', fees: '0' },
      { kind: 'buy', instrument: call, quantity: '2', price: '1', fees: '0' },
      { kind: 'expiry', instrument: option('put', '97'), quantity: '2', price: '0', fees: '0' },
    ]);
    expect(openPositions(fills)).toEqual([
      { instrument: call, quantity: '-3' },
      { instrument: zqxaStock, quantity: '10.5' },
    ]);
    expect(isFlat(fills)).toBe(false);
  });

  it('shows a short of 14 when a busted and a duplicate sale are counted', () => {
    const sale = { kind: 'sell', instrument: call, price: '0.6', fees: '0' } as const;
    const fills = fillsInOrder([
      { kind: 'buy', instrument: call, quantity: '10', price: '0.45', fees: '6.60' },
      ...['4', '4', '4', '6', '6'].map((quantity) => ({ ...sale, quantity })),
    ]);
    expect(openPositions(fills)).toEqual([{ instrument: call, quantity: '-14' }]);
  });

  it('is empty and flat without fills', () => {
    expect(openPositions([])).toEqual([]);
    expect(isFlat([])).toBe(true);
  });

  it('is flat once everything is closed', () => {
    const fills = fillsInOrder([
      { kind: 'buy', instrument: call, quantity: '0.3', price: '1', fees: '0' },
      { kind: 'sell', instrument: call, quantity: '0.1', price: '1', fees: '0' },
      { kind: 'sell', instrument: call, quantity: '0.2', price: '1', fees: '0' },
    ]);
    expect(isFlat(fills)).toBe(true);
  });
});
