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

  it('delivers another number of shares than the multiplier when the contract was adjusted', () => {
    const fill: Fill = { ...ended, kind: 'exercise', instrument: option('call', '97') };
    expect(sharesFromExercise(fill, { id: 'shares', sharesPerContract: '150', fees: '0.02' })).toMatchObject({
      quantity: '300',
      fees: '0.02',
    });
  });

  it.each<[string, Fill]>([
    ['a trade', { ...ended, kind: 'sell', instrument: option('call', '97') }],
    ['an expiry', { ...ended, kind: 'expiry', instrument: option('call', '97') }],
    ['stock', { ...ended, kind: 'exercise', instrument: zqxaStock }],
  ])('throws no-delivery for %s', (_what, fill) => {
    expect(() => sharesFromExercise(fill, { id: 'shares' })).toThrow(expect.objectContaining({ code: 'no-delivery' }));
  });

  it('throws quantity-not-positive when nothing would be delivered', () => {
    const fill: Fill = { ...ended, kind: 'exercise', instrument: option('call', '97') };
    expect(() => sharesFromExercise(fill, { id: 'shares', sharesPerContract: '0' })).toThrow(
      expect.objectContaining({ code: 'quantity-not-positive' }),
    );
  });
});
