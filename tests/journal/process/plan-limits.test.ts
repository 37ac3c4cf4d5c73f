import { type PlannedLeg } from '@/journal/contracts/planned-leg';
import { type Fill } from '@/journal/fills/fill';
import { entryWithinLimit } from '@/journal/process/entry-within-limit';
import { sizeWithinPlan } from '@/journal/process/size-within-plan';
import { fillsInOrder, option, zqxaStock } from '@/tests/journal/fills/fill-fixtures';

const leg = (id: string, side: 'buy' | 'sell', strikePrice: string, premium: string): PlannedLeg => ({
  id,
  side,
  type: 'put',
  strikePrice,
  expirySessionDate: '2026-12-18',
  quantity: 2,
  premium,
});
const plan = {
  symbol: 'ZQXA',
  multiplier: '100',
  legs: [leg('short', 'sell', '97', '0.78'), leg('long', 'buy', '95', '0.30')],
};
const fill = (kind: 'buy' | 'sell', strikePrice: string, quantity: string, price = '0.50') => ({
  kind,
  instrument: option('put', strikePrice),
  quantity,
  price,
  fees: '0',
});

describe('sizeWithinPlan', () => {
  const isWithin = (fills: Fill[]) => sizeWithinPlan(plan, fills).isWithin;

  it('holds for the planned contracts in parts, closed and opened again', () => {
    const fills = fillsInOrder([
      fill('sell', '97', '1'),
      fill('sell', '97.00', '1'),
      fill('buy', '95', '2'),
      fill('buy', '97', '2'),
      fill('sell', '97', '2'),
    ]);
    expect(sizeWithinPlan(plan, fills)).toEqual({
      isWithin: true,
      legs: [
        { legId: 'short', planned: '-2', greatest: '-2', isWithin: true },
        { legId: 'long', planned: '2', greatest: '2', isWithin: true },
      ],
    });
  });

  it('is broken by a contract more, even for a moment', () => {
    const fills = fillsInOrder([fill('sell', '97', '3'), fill('buy', '97', '1')]);
    expect(sizeWithinPlan(plan, fills).legs[0]).toMatchObject({ greatest: '-3', isWithin: false });
  });

  it('is broken by the wrong side and by a series that is not planned', () => {
    expect(isWithin(fillsInOrder([fill('buy', '97', '1')]))).toBe(false);
    const { legs } = sizeWithinPlan(plan, fillsInOrder([fill('buy', '96', '1')]));
    expect(legs[2]).toEqual({ legId: null, planned: '0', greatest: '1', isWithin: false });
  });

  it('does not count the shares of a delivery, and holds without fills', () => {
    const shares = { kind: 'buy' as const, instrument: zqxaStock, quantity: '200', price: '97', fees: '0' };
    expect(isWithin(fillsInOrder([shares]))).toBe(true);
    expect(isWithin([])).toBe(true);
  });
});

describe('entryWithinLimit', () => {
  const limited = (fills: Fill[], allowance = '0') => entryWithinLimit({ ...plan, allowance }, fills);
  const entered = (short: string, long: string) =>
    fillsInOrder([fill('sell', '97', '2', short), fill('buy', '95', '2', long)]);

  it('holds at the planned credit of 96.00 and above', () => {
    expect(limited(entered('0.78', '0.30'))).toEqual({ netPremium: '-96', limit: '-96', beyond: '0', isWithin: true });
    expect(limited(entered('0.80', '0.30'))).toMatchObject({ beyond: '-4', isWithin: true });
  });

  it('is broken below it, by more than what was allowed', () => {
    expect(limited(entered('0.76', '0.30'))).toMatchObject({ netPremium: '-92', beyond: '4', isWithin: false });
    expect(limited(entered('0.76', '0.30'), '4')).toMatchObject({ limit: '-92', isWithin: true });
  });

  it('takes the average of partial fills, at the planned size', () => {
    const fills = fillsInOrder([
      fill('sell', '97', '1', '0.70'),
      fill('sell', '97', '2', '0.85'),
      fill('buy', '95', '1', '0.32'),
    ]);
    // (0.70 + 2 x 0.85) / 3 = 0.80 for two, less two at 0.32.
    expect(limited(fills)?.netPremium).toBe('-96');
  });

  it('leaves closing fills out, and of one that reverses takes what it opened', () => {
    const fills = [
      ...entered('0.78', '0.30'),
      ...fillsInOrder([{ ...fill('buy', '97', '2', '9.99'), id: 'closing', tradedAt: '2026-12-10T15:00:00.000Z' }]),
    ];
    expect(limited(fills)?.netPremium).toBe('-96');
    const reversed = fillsInOrder([
      fill('buy', '97', '1', '0.10'),
      fill('sell', '97', '3', '0.78'),
      fill('buy', '95', '2', '0.30'),
    ]);
    expect(limited(reversed)?.netPremium).toBe('-96');
  });

  it('cannot be said while a leg is not opened', () => {
    expect(limited(fillsInOrder([fill('sell', '97', '2')]))).toBeNull();
    expect(limited([])).toBeNull();
  });
});
