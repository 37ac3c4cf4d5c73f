import { totalCashFlow } from '@/journal/fills/cash-flow';
import { type Fill } from '@/journal/fills/fill';
import { type LotMethod } from '@/journal/fills/lot';
import { type MatchedLots, matchLots } from '@/journal/fills/lots';
import { option, zqxaStock } from '@/tests/journal/fills/fill-fixtures';
import { inUnits, matchInWholeNumbers, randomWholeFills } from '@/tests/journal/fills/whole-number-lots';

const instruments = [
  option('call', '102'),
  option('put', '97.5'),
  option('call', '4050', { underlyingSymbol: 'ZZIX' }),
  option('put', '12', { multiplier: '10' }),
  zqxaStock,
];
const methods = ['fifo', 'lifo', 'average'] as const;

function totalsOf({ open, realisedProfit, cashFlow, fees }: MatchedLots) {
  return {
    realised: inUnits(realisedProfit),
    cash: inUnits(cashFlow),
    fees: inUnits(fees),
    open: open.reduce(
      (sum, { direction, value, fees: borne }) =>
        sum + (direction === 'long' ? -inUnits(value) : inUnits(value)) - inUnits(borne),
      0n,
    ),
    openQuantity: open.reduce(
      (sum, { direction, quantity }) => sum + (direction === 'long' ? BigInt(quantity) : -BigInt(quantity)),
      0n,
    ),
  };
}

describe('matchLots on 100,000 random fills', () => {
  const whole = randomWholeFills(100_000, instruments);
  const fills = whole.map(({ fill }) => fill);
  const matched = new Map<LotMethod, MatchedLots>();
  beforeAll(() => {
    for (const method of methods) matched.set(method, matchLots(fills, { method }));
  });
  const by = (method: LotMethod) => matched.get(method) ?? matchLots(fills, { method });

  it('has every kind of fill, and closes far more than it leaves open', () => {
    expect(new Set(fills.map(({ kind }) => kind)).size).toBe(5);
    expect(by('fifo').closed.length).toBeGreaterThan(90_000);
    expect(by('fifo').open.length).toBeLessThan(200);
  });

  it.each(methods)('equals whole-number arithmetic to the last digit, by %s', (method) => {
    expect(totalsOf(by(method))).toEqual(matchInWholeNumbers(whole, method));
  });

  it.each(methods)('is cash flow in all: realised, and paid for what is open, by %s', (method) => {
    const { realised, open, cash } = totalsOf(by(method));
    expect(realised + open).toBe(cash);
  });

  it.each(methods)('adds up lot by lot to what it says in total, by %s', (method) => {
    const { closed, open, fees, realisedProfit } = by(method);
    const sum = (amounts: readonly string[]) => amounts.reduce((total, amount) => total + inUnits(amount), 0n);
    expect(sum(closed.map((lot) => lot.realisedProfit))).toBe(inUnits(realisedProfit));
    const borne = [...closed.flatMap((lot) => [lot.openFees, lot.closeFees]), ...open.map((lot) => lot.fees)];
    expect(sum(borne)).toBe(inUnits(fees));
  });
});

describe('matchLots on 10,000 random fills, made flat', () => {
  const fills = randomWholeFills(10_000, instruments).map(({ fill }) => fill);
  const closings = matchLots(fills, { method: 'fifo' }).open.map(
    ({ instrument, direction, quantity }, index): Fill => ({
      id: `closing${index}`,
      kind: direction === 'long' ? 'sell' : 'buy',
      instrument,
      quantity,
      price: '1.07',
      fees: '0.66',
      tradedAt: '2026-12-09T16:00:00.000Z',
      sequence: index,
    }),
  );

  it.each(methods)('realises its cash flow, which no method changes, by %s', (method) => {
    const { open, realisedProfit, cashFlow } = matchLots([...fills, ...closings], { method });
    expect(open).toEqual([]);
    expect([realisedProfit, cashFlow]).toEqual(Array(2).fill(totalCashFlow([...fills, ...closings])));
  });
});
