import * as fc from 'fast-check';
import { type Fill } from '@/journal/fills/fill';
import { matchLots } from '@/journal/fills/lots';
import { Decimal, toDecimal } from '@/journal/money/decimal';
import { roundMoney } from '@/journal/money/rounding';
import { assignedPutSpread, fillsInOrder, option, zqxaStock } from '@/tests/journal/fills/fill-fixtures';

const seed = 20261201;
const methods = ['fifo', 'lifo', 'average'] as const;
const call = option('call', '102');

const fieldSeries = fillsInOrder([
  { kind: 'buy', instrument: call, quantity: '2', price: '1.20', fees: '1.30' },
  { kind: 'buy', instrument: call, quantity: '3', price: '1.35', fees: '1.97' },
  { kind: 'sell', instrument: call, quantity: '4', price: '1.80', fees: '2.71' },
  { kind: 'sell', instrument: call, quantity: '1', price: '0.95', fees: '0.66' },
]);

/** Realised profit by the fill that closed. */
function profitByClosingFill(fills: readonly Fill[], method: (typeof methods)[number]): Record<string, string> {
  const totals = new Map<string, Decimal>();
  for (const { closeFillId, realisedProfit } of matchLots(fills, { method }).closed) {
    totals.set(closeFillId, toDecimal(realisedProfit).plus(totals.get(closeFillId) ?? 0));
  }
  return Object.fromEntries([...totals].map(([id, total]) => [id, total.toFixed(2)]));
}

describe('matchLots on two buys and two sells of one series', () => {
  it('matches oldest first: 204.68 and -41.32', () => {
    expect(profitByClosingFill(fieldSeries, 'fifo')).toEqual({ f3: '204.68', f4: '-41.32' });
    const { closed } = matchLots(fieldSeries, { method: 'fifo' });
    expect(closed.map(({ openFees, closeFees, realisedProfit }) => [openFees, closeFees, realisedProfit])).toEqual([
      ['1.3', '1.36', '117.34'],
      ['1.31', '1.35', '87.34'],
      ['0.66', '0.66', '-41.32'],
    ]);
  });

  it('matches newest first: 189.67 and -26.31', () => {
    expect(profitByClosingFill(fieldSeries, 'lifo')).toEqual({ f3: '189.67', f4: '-26.31' });
    const [first, second] = matchLots(fieldSeries, { method: 'lifo' }).closed;
    expect([first?.realisedProfit, second?.realisedProfit]).toEqual(['131', '58.67']);
  });

  it('matches at the average price 1.29 and the pooled fee 3.27: 198.67 and -35.31', () => {
    expect(profitByClosingFill(fieldSeries, 'average')).toEqual({ f3: '198.67', f4: '-35.31' });
    const { closed } = matchLots(fieldSeries, { method: 'average' });
    expect(closed.map(({ openFillId, openPrice, openFees }) => [openFillId, openPrice, openFees])).toEqual([
      [null, '1.29', '2.62'],
      [null, '1.29', '0.65'],
    ]);
  });

  it.each(methods)('realises 163.36 in total by %s, which is its cash flow', (method) => {
    expect(matchLots(fieldSeries, { method })).toMatchObject({
      open: [],
      realisedProfit: '163.36',
      cashFlow: '163.36',
      fees: '6.64',
    });
  });

  it('takes the fills in any order', () => {
    expect(matchLots([...fieldSeries].reverse(), { method: 'fifo' })).toEqual(
      matchLots(fieldSeries, { method: 'fifo' }),
    );
  });
});

describe('matchLots on options that end', () => {
  it('closes an assigned put and an expired put at 0 and carries the shares at the strike: 77.34, -30.66, -45.02', () => {
    const { closed, open, realisedProfit, cashFlow } = matchLots(assignedPutSpread(), { method: 'fifo' });
    expect(closed.map((lot) => [lot.closeKind, lot.direction, lot.realisedProfit])).toEqual([
      ['expiry', 'long', '-30.66'],
      ['assignment', 'short', '77.34'],
      ['sell', 'long', '-45.02'],
    ]);
    expect(open).toEqual([]);
    expect([realisedProfit, cashFlow]).toEqual(['1.66', '1.66']);
  });

  const condor = { underlyingSymbol: 'ZZIX' };
  const condorOpenings = [
    { kind: 'sell', instrument: option('call', '4050', condor), quantity: '1', price: '6.10', fees: '1.17' },
    { kind: 'buy', instrument: option('call', '4070', condor), quantity: '1', price: '3.20', fees: '1.17' },
    { kind: 'sell', instrument: option('put', '3950', condor), quantity: '1', price: '5.80', fees: '1.17' },
    { kind: 'buy', instrument: option('put', '3930', condor), quantity: '1', price: '3.40', fees: '1.17' },
  ] as const;
  const endings = (callSpread: readonly [string, string], putSpread: readonly [string, string]) =>
    [...callSpread, ...putSpread].map((price, index) => ({
      kind: 'expiry' as const,
      instrument: condorOpenings[index]?.instrument ?? call,
      quantity: '1',
      price,
      fees: '0',
    }));

  it.each([
    ['loses 314.68 at settlement 4058.40', endings(['8.40', '0'], ['0', '0']), '-314.68'],
    ['gains at most 525.32, between the short strikes', endings(['0', '0'], ['0', '0']), '525.32'],
    ['loses at most 1,474.68, beyond a long strike', endings(['70', '50'], ['0', '0']), '-1474.68'],
  ])('settles a condor in cash: %s', (_claim, closings, profit) => {
    const { realisedProfit, cashFlow, open } = matchLots(fillsInOrder([...condorOpenings, ...closings]), {
      method: 'fifo',
    });
    expect([realisedProfit, cashFlow, open.length]).toEqual([profit, profit, 0]);
  });
});

describe('matchLots on a fill that closes and reverses', () => {
  const reversal = fillsInOrder([
    { kind: 'buy', instrument: call, quantity: '3', price: '1.00', fees: '1.95' },
    { kind: 'sell', instrument: call, quantity: '5', price: '1.50', fees: '3.27' },
    { kind: 'buy', instrument: call, quantity: '2', price: '1.40', fees: '1.30' },
  ]);

  it.each(methods)('splits it at zero and its fee without loss, by %s', (method) => {
    const afterTwo = matchLots(reversal.slice(0, 2), { method });
    expect(afterTwo.closed.map(({ quantity, openFees, closeFees }) => [quantity, openFees, closeFees])).toEqual([
      ['3', '1.95', '1.96'],
    ]);
    expect(afterTwo.open).toMatchObject([
      { direction: 'short', quantity: '2', price: '1.5', fees: '1.31', openedAt: reversal[1]?.tradedAt },
    ]);
    const afterAll = matchLots(reversal, { method });
    expect(afterAll.closed.at(-1)).toMatchObject({
      direction: 'short',
      grossProfit: '20',
      openFees: '1.31',
      closeFees: '1.3',
    });
    expect(afterAll.realisedProfit).toBe(afterAll.cashFlow);
  });
});

describe('matchLots on effective fills after a correction and a bust', () => {
  it('realises 88.70 and leaves nothing open', () => {
    const fills = fillsInOrder([
      { kind: 'buy', instrument: call, quantity: '10', price: '0.45', fees: '6.60' },
      { kind: 'sell', instrument: call, quantity: '4', price: '0.60', fees: '2.68' },
      { kind: 'sell', instrument: call, quantity: '6', price: '0.52', fees: '4.02' },
    ]);
    expect(profitByClosingFill(fills, 'fifo')).toEqual({ f2: '54.68', f3: '34.02' });
    expect(matchLots(fills, { method: 'fifo' })).toMatchObject({ realisedProfit: '88.7', open: [] });
  });
});

describe('matchLots at an average that does not end', () => {
  it('gives the last part closed what the rounding of the others left', () => {
    const fills = fillsInOrder([
      { kind: 'buy', instrument: zqxaStock, quantity: '1', price: '10', fees: '0' },
      { kind: 'buy', instrument: zqxaStock, quantity: '2', price: '10.01', fees: '0' },
      { kind: 'sell', instrument: zqxaStock, quantity: '1', price: '11', fees: '0' },
      { kind: 'sell', instrument: zqxaStock, quantity: '2', price: '11', fees: '0' },
    ]);
    const { closed, realisedProfit } = matchLots(fills, { method: 'average' });
    expect(closed.map((lot) => [lot.openPrice, lot.realisedProfit])).toEqual([
      ['10.006666666667', '0.993333333333'],
      ['10.006666666666', '1.986666666667'],
    ]);
    expect(realisedProfit).toBe('2.98');
  });
});

const tick = fc.integer({ min: 0, max: 2000 }).map((ticks) => new Decimal(ticks).dividedBy(100).toFixed());
const feeText = fc.integer({ min: -50, max: 900 }).map((cents) => new Decimal(cents).dividedBy(100).toFixed());
const trade = fc.record({
  kind: fc.constantFrom('buy' as const, 'sell' as const),
  instrument: fc.constantFrom(call, option('put', '97'), zqxaStock),
  quantity: fc.integer({ min: 1, max: 40 }).map(String),
  price: tick,
  fees: feeText,
});

/** The fills, and after them those that make every position flat. */
function madeFlat(trades: readonly Omit<Fill, 'id' | 'tradedAt' | 'sequence'>[]): Fill[] {
  const open = matchLots(fillsInOrder(trades), { method: 'fifo' }).open;
  const closings = open.map(({ instrument, direction, quantity }) => ({
    kind: direction === 'long' ? ('sell' as const) : ('buy' as const),
    instrument,
    quantity,
    price: '1.07',
    fees: '0.66',
  }));
  return fillsInOrder([...trades, ...closings]);
}

describe('matchLots keeps every cent', () => {
  const trades = fc.array(trade, { minLength: 1, maxLength: 30 });

  it.each(methods)('realises the sum of the cash flows once all is flat, by %s (property)', (method) => {
    fc.assert(
      fc.property(trades, (some) => {
        const { open, realisedProfit, cashFlow } = matchLots(madeFlat(some), { method });
        expect(open).toEqual([]);
        expect(realisedProfit).toBe(cashFlow);
      }),
      { seed, numRuns: 150 },
    );
  });

  it.each(methods)('bears every fee once, closed or still open, by %s (property)', (method) => {
    fc.assert(
      fc.property(trades, (some) => {
        const { open, closed, fees } = matchLots(fillsInOrder(some), { method });
        const borne = [...closed.flatMap((lot) => [lot.openFees, lot.closeFees]), ...open.map((lot) => lot.fees)];
        expect(borne.reduce((sum, fee) => sum.plus(fee), new Decimal(0)).toFixed()).toBe(toDecimal(fees).toFixed());
      }),
      { seed, numRuns: 150 },
    );
  });

  it.each(methods)('gives the same totals for the same fills in any order of rows, by %s (property)', (method) => {
    fc.assert(
      fc.property(trades, fc.nat(), (some, turn) => {
        const fills = fillsInOrder(some);
        const at = turn % fills.length;
        const turned = [...fills.slice(at), ...fills.slice(0, at)].reverse();
        expect(matchLots(turned, { method })).toEqual(matchLots(fills, { method }));
      }),
      { seed, numRuns: 100 },
    );
  });

  it.each(methods)('gives the same totals when fills are split into partial fills, by %s (property)', (method) => {
    fc.assert(
      fc.property(trades, (some) => {
        const whole = madeFlat(some);
        const parts = whole.flatMap((fill) => inTwoParts(fill));
        const [one, other] = [matchLots(whole, { method }), matchLots(parts, { method })];
        expect([other.realisedProfit, other.cashFlow, other.fees]).toEqual([
          one.realisedProfit,
          one.cashFlow,
          one.fees,
        ]);
        expect(other.open).toEqual([]);
      }),
      { seed, numRuns: 150 },
    );
  });

  it.each(['fifo', 'lifo'] as const)(
    'has the same gross profit while open when fills are split, by %s (property)',
    (method) => {
      const gross = (fills: readonly Fill[]) =>
        matchLots(fills, { method })
          .closed.reduce((sum, lot) => sum.plus(lot.grossProfit), new Decimal(0))
          .toFixed();
      fc.assert(
        fc.property(trades, (some) => {
          const whole = fillsInOrder(some);
          expect(gross(whole.flatMap((fill) => inTwoParts(fill)))).toBe(gross(whole));
        }),
        { seed, numRuns: 100 },
      );
    },
  );
});

function inTwoParts(fill: Fill): Fill[] {
  const quantity = toDecimal(fill.quantity);
  if (quantity.lessThan(2)) return [fill];
  const first = quantity.dividedToIntegerBy(3).plus(1).lessThan(quantity)
    ? quantity.dividedToIntegerBy(3).plus(1)
    : new Decimal(1);
  const fee = toDecimal(fill.fees);
  const firstFee = roundMoney(fee.times(first).dividedBy(quantity));
  return [
    { ...fill, id: `${fill.id}a`, quantity: first.toFixed(), fees: firstFee.toFixed(), sequence: fill.sequence },
    {
      ...fill,
      id: `${fill.id}b`,
      quantity: quantity.minus(first).toFixed(),
      fees: fee.minus(firstFee).toFixed(),
      sequence: fill.sequence + 0.5,
    },
  ];
}
