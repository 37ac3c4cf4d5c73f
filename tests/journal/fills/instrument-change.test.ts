import * as fc from 'fast-check';
import { totalCashFlow } from '@/journal/fills/cash-flow';
import { type InstrumentChange } from '@/journal/fills/instrument-change';
import { matchLots } from '@/journal/fills/lots';
import { isFlat, openPositions } from '@/journal/fills/position';
import { Decimal } from '@/journal/money/decimal';
import { fillsInOrder, option, zqxaStock } from '@/tests/journal/fills/fill-fixtures';

const seed = 20261201;
const methods = ['fifo', 'lifo', 'average'] as const;
const other = { kind: 'stock', symbol: 'QYBD', multiplier: '1' } as const;
const refusal = (code: string) => expect.objectContaining({ code });
const change = (rest: Partial<InstrumentChange> = {}): InstrumentChange => ({
  id: 'change',
  changedAt: '2026-12-09T15:30:00.000Z',
  sequence: 0,
  from: zqxaStock,
  to: zqxaStock,
  oldQuantity: '1',
  newQuantity: '2',
  ...rest,
});
const later = { tradedAt: '2026-12-10T15:00:00.000Z' };
const bought = [
  { kind: 'buy' as const, instrument: zqxaStock, quantity: '100', price: '50', fees: '1.00' },
  { kind: 'buy' as const, instrument: zqxaStock, quantity: '50', price: '53', fees: '0.55' },
];

describe('a split', () => {
  it('doubles the shares at half the price, and keeps value, fees and age of each lot', () => {
    const { open } = matchLots(fillsInOrder(bought), { method: 'fifo', changes: [change()] });
    expect(open).toMatchObject([
      { quantity: '200', price: '25', value: '5000', fees: '1', fillId: 'f1', openedAt: '2026-12-09T15:00:00.000Z' },
      { quantity: '100', price: '26.5', value: '2650', fees: '0.55', fillId: 'f2' },
    ]);
  });

  it.each([
    // By hand: 150 shares at 30 less the cost; FIFO 150 x 25, LIFO 100 x 26.50 + 50 x 25, average 150 x 25.50.
    ['fifo', '750'],
    ['lifo', '600'],
    ['average', '675'],
  ] as const)('is matched by %s afterwards: %s before fees', (method, gross) => {
    const sold = { kind: 'sell' as const, instrument: zqxaStock, quantity: '150', price: '30', fees: '0', ...later };
    const { closed } = matchLots(fillsInOrder([...bought, sold]), { method, changes: [change()] });
    expect(closed.reduce((sum, lot) => sum.plus(lot.grossProfit), new Decimal(0)).toFixed()).toBe(gross);
  });

  it('of one for three loses nothing to a quantity and price that do not end', () => {
    const one = { kind: 'buy' as const, instrument: zqxaStock, quantity: '1', price: '10', fees: '0' };
    const reverse = change({ oldQuantity: '3', newQuantity: '1' });
    const fills = fillsInOrder([one, one]);
    const { open } = matchLots(fills, { method: 'fifo', changes: [reverse] });
    expect(open.map(({ quantity, value }) => [quantity, value])).toEqual([
      ['0.333333333334', '10'],
      ['0.333333333333', '10'],
    ]);
    expect(openPositions(fills, [reverse])).toEqual([{ instrument: zqxaStock, quantity: '0.666666666667' }]);
  });

  it('of what is not held at the time changes nothing', () => {
    const early = change({ changedAt: '2026-12-08T15:00:00.000Z' });
    expect(matchLots(fillsInOrder(bought), { method: 'fifo', changes: [early] })).toEqual(
      matchLots(fillsInOrder(bought), { method: 'fifo' }),
    );
  });
});

describe('an adjusted option', () => {
  const plain = option('call', '60');
  const adjusted = option('call', '40', {
    underlyingSymbol: 'ZQXA1',
    deliverable: { symbol: 'ZQXA', sharesPerContract: '150', cashPerContract: '0' },
  });
  const fills = fillsInOrder([{ kind: 'sell', instrument: plain, quantity: '2', price: '3.00', fees: '1.32' }]);
  const adjustment = change({ from: plain, to: adjusted, oldQuantity: '2', newQuantity: '2' });

  it('goes on under its new symbol with the premium of before and its own deliverable', () => {
    const { open } = matchLots(fills, { method: 'fifo', changes: [adjustment] });
    expect(open).toMatchObject([{ instrument: adjusted, direction: 'short', quantity: '2', price: '3', value: '600' }]);
  });

  it('expires on the side that is open', () => {
    const ended = { kind: 'expiry' as const, instrument: adjusted, quantity: '2', price: '0', fees: '0', ...later };
    const all = [...fills, ...fillsInOrder([{ ...ended, id: 'ended' }])];
    expect(isFlat(all, [adjustment])).toBe(true);
    expect(matchLots(all, { method: 'average', changes: [adjustment] }).realisedProfit).toBe('598.68');
    expect(totalCashFlow(all, [adjustment])).toBe('598.68');
  });

  it('may change its multiplier within one series', () => {
    const larger = { ...plain, multiplier: '150' };
    const { open } = matchLots(fills, {
      method: 'fifo',
      changes: [change({ from: plain, to: larger, newQuantity: '1' })],
    });
    expect(open).toMatchObject([{ quantity: '2', price: '2', value: '600' }]);
  });
});

describe('a change of symbol', () => {
  const renamed = change({ to: other, newQuantity: '1' });

  it('joins what is held of the new one, older lots first', () => {
    const held = { kind: 'buy' as const, instrument: other, quantity: '10', price: '40', fees: '0' };
    const fills = fillsInOrder([bought[0] ?? held, held, bought[1] ?? held]);
    const { open } = matchLots(fills, { method: 'fifo', changes: [renamed] });
    expect(open.map(({ fillId, instrument }) => [fillId, instrument])).toEqual([
      ['f1', other],
      ['f2', other],
      ['f3', other],
    ]);
    expect(matchLots(fills, { method: 'average', changes: [renamed] }).open).toMatchObject([
      { instrument: other, quantity: '160', value: '8050', openedAt: '2026-12-09T15:00:00.000Z' },
    ]);
  });

  it('refuses to turn a long into what is held short', () => {
    const short = { kind: 'sell' as const, instrument: other, quantity: '10', price: '40', fees: '0' };
    expect(() => openPositions(fillsInOrder([...bought, short]), [renamed])).toThrow(
      refusal('change-meets-opposite-position'),
    );
  });
});

describe('changes that cannot be', () => {
  const fills = fillsInOrder(bought);
  it.each<[string, Partial<InstrumentChange>]>([
    ['change-ratio-invalid', { newQuantity: '0' }],
    ['change-ratio-invalid', { oldQuantity: '-1' }],
    ['decimal-invalid', { newQuantity: '1e3' }],
    ['change-of-kind', { to: option('call', '60') }],
    ['change-leaves-nothing', { oldQuantity: '1000000000000000', newQuantity: '1' }],
    ['trade-time-invalid', { changedAt: 'noon' }],
    ['fill-repeated', { id: 'f1' }],
  ])('are refused with %s for %p', (code, rest) => {
    expect(() => matchLots(fills, { method: 'fifo', changes: [change(rest)] })).toThrow(refusal(code));
  });
});

describe('changes conserve', () => {
  const trade = fc.record({
    kind: fc.constantFrom('buy' as const, 'sell' as const),
    instrument: fc.constant(zqxaStock),
    quantity: fc.integer({ min: 1, max: 40 }).map(String),
    price: fc.integer({ min: 0, max: 20_000 }).map((cents) => new Decimal(cents).dividedBy(100).toFixed()),
    fees: fc.integer({ min: -50, max: 900 }).map((cents) => new Decimal(cents).dividedBy(100).toFixed()),
  });
  const whole = fc.integer({ min: 1, max: 7 });

  it.each(methods)('cash, fees and quantity, whatever the ratio, by %s (property)', (method) => {
    fc.assert(
      fc.property(
        fc.array(trade, { minLength: 1, maxLength: 20 }),
        fc.array(trade, { maxLength: 20 }),
        whole,
        whole,
        (before, after, oldQuantity, newQuantity) => {
          const fills = fillsInOrder([
            ...before,
            ...after.map((fill, index) => ({
              ...fill,
              tradedAt: `2026-12-10T15:00:${String(index).padStart(2, '0')}.000Z`,
            })),
          ]);
          const changes = [change({ oldQuantity: String(oldQuantity), newQuantity: String(newQuantity) })];
          const { open, realisedProfit, cashFlow, closed, fees } = matchLots(fills, { method, changes });
          const openCash = open.reduce(
            (sum, lot) => (lot.direction === 'long' ? sum.minus(lot.value) : sum.plus(lot.value)).minus(lot.fees),
            new Decimal(0),
          );
          expect(openCash.plus(realisedProfit).equals(cashFlow)).toBe(true);
          const borne = [...closed.flatMap((lot) => [lot.openFees, lot.closeFees]), ...open.map((lot) => lot.fees)];
          expect(borne.reduce((sum, fee) => sum.plus(fee), new Decimal(0)).equals(fees)).toBe(true);
          const held = open.reduce(
            (sum, lot) => (lot.direction === 'long' ? sum.plus(lot.quantity) : sum.minus(lot.quantity)),
            new Decimal(0),
          );
          expect(held.equals(openPositions(fills, changes)[0]?.quantity ?? 0)).toBe(true);
        },
      ),
      { seed, numRuns: 200 },
    );
  });
});
