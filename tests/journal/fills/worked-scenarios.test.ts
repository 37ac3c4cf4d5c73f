import { expiryPayoff, payoffAt } from '@/journal/contracts/expiry-payoff';
import { type Fill } from '@/journal/fills/fill';
import { matchLots } from '@/journal/fills/lots';
import { sharesFromExercise } from '@/journal/fills/underlying-shares';
import { fillsInOrder, option } from '@/tests/journal/fills/fill-fixtures';

const methods = ['fifo', 'lifo', 'average'] as const;
const stock = (symbol: string) => ({ kind: 'stock' as const, symbol, multiplier: '1' as const });

// Amounts worked outside this project.
describe('a covered call assigned early', () => {
  const call = option('call', '50', { underlyingSymbol: 'XJKO' });
  const opened = fillsInOrder([
    { kind: 'buy', instrument: stock('XJKO'), quantity: '100', price: '51.20', fees: '0' },
    { kind: 'sell', instrument: call, quantity: '1', price: '2.90', fees: '0.66' },
    { kind: 'assignment', instrument: call, quantity: '1', price: '0', fees: '0' },
  ]);
  const [, , assignment] = opened as [Fill, Fill, Fill];
  const fills = [...opened, { ...sharesFromExercise(assignment, { id: 'shares' }), sequence: 4 }];

  it.each(methods)('sells the shares at 50 and makes 169.34, without the dividend, by %s', (method) => {
    const { closed, realisedProfit, open } = matchLots(fills, { method });
    expect(closed.map((lot) => [lot.closeKind, lot.realisedProfit])).toEqual([
      ['assignment', '289.34'],
      ['sell', '-120'],
    ]);
    expect([realisedProfit, open]).toEqual(['169.34', []]);
  });
});

describe('three short calls pinned at the strike, two of them assigned', () => {
  const call = option('call', '50', { underlyingSymbol: 'RQUV' });
  const closeAt = '2026-12-18T21:00:00.000Z';
  const fills = fillsInOrder([
    { kind: 'sell', instrument: call, quantity: '3', price: '0.35', fees: '1.98' },
    { kind: 'assignment', instrument: call, quantity: '2', price: '0', fees: '0', tradedAt: closeAt },
    { kind: 'expiry', instrument: call, quantity: '1', price: '0', fees: '0', tradedAt: closeAt },
  ]);
  const [, assignment] = fills as [Fill, Fill, Fill];
  const shares = { ...sharesFromExercise(assignment, { id: 'shares' }), sequence: 4 };
  const back: Fill = { ...shares, id: 'back', kind: 'buy', price: '51.10', tradedAt: '2026-12-21T14:30:00.000Z' };

  it('leave 200 shares short over the weekend', () => {
    expect(matchLots([...fills, shares], { method: 'fifo' }).open).toMatchObject([
      { instrument: stock('RQUV'), direction: 'short', quantity: '200', price: '50' },
    ]);
  });

  it.each(methods)('lose 116.98 in all once they are bought back at 51.10, by %s', (method) => {
    const { closed, realisedProfit, open } = matchLots([...fills, shares, back], { method });
    expect(closed.map((lot) => lot.realisedProfit)).toEqual(['68.68', '34.34', '-220']);
    expect([realisedProfit, open]).toEqual(['-116.98', []]);
  });
});

describe('an iron condor settled in cash', () => {
  const condor = [
    { type: 'call' as const, strikePrice: 4050, signedShares: -100 },
    { type: 'call' as const, strikePrice: 4070, signedShares: 100 },
    { type: 'put' as const, strikePrice: 3950, signedShares: -100 },
    { type: 'put' as const, strikePrice: 3930, signedShares: 100 },
  ];

  it('breaks even at 3944.70 and 4055.30 before fees', () => {
    const { breakEvens } = expiryPayoff({ legs: condor, cost: -530 });
    expect(breakEvens).toHaveLength(2);
    expect(breakEvens[0]).toBeCloseTo(3944.7, 9);
    expect(breakEvens[1]).toBeCloseTo(4055.3, 9);
  });

  it('is worth -314.68 at 4058.40, at most 525.32 and at least -1,474.68 after fees, as its fills are', () => {
    const payoff = expiryPayoff({ legs: condor, cost: -530 + 4.68 });
    expect(payoffAt(payoff, 4058.4)).toBeCloseTo(-314.68, 9);
    expect(payoff.greatestGain).toBeCloseTo(525.32, 9);
    expect(payoff.greatestLoss).toBeCloseTo(-1474.68, 9);
  });
});
