import * as fc from 'fast-check';
import { attributeProfit } from '@/journal/attribution/attribute-profit';
import { attributedLot } from '@/journal/attribution/attributed-lot';
import { type ClosedLot } from '@/journal/fills/lot';
import { matchLots } from '@/journal/fills/lots';
import { fillsInOrder, option, zqxaStock } from '@/tests/journal/fills/fill-fixtures';
import { testDLeg, testDOptions } from '@/tests/journal/attribution/test-d-leg';

const seed = 20261201;
const { entry, exit } = testDLeg;
const asInTestD = (lots: readonly ClosedLot[]) =>
  lots.map((lot, index) => attributedLot(lot, { legId: String(index), entry, exit }));

describe('attributedLot', () => {
  it('carries test D from its fills to 318.35, bought in two parts', () => {
    const call = option('call', '102');
    const { closed, realisedProfit } = matchLots(
      fillsInOrder([
        { kind: 'buy', instrument: call, quantity: '2', price: '1.10', fees: '1.33' },
        { kind: 'buy', instrument: call, quantity: '3', price: '1.10', fees: '2.00' },
        { kind: 'sell', instrument: call, quantity: '5', price: '1.75', fees: '3.32' },
      ]),
      { method: 'fifo' },
    );
    const { total, legs } = attributeProfit(asInTestD(closed), testDOptions);
    expect(legs.map(({ legId, slippage }) => [legId, slippage])).toEqual([
      ['0', '-8'],
      ['1', '-12'],
    ]);
    expect(total).toMatchObject({ slippage: '-20', fees: '-6.65', markResidual: '-4.4', realisedProfit });
    expect(realisedProfit).toBe('318.35');
  });

  it('attributes exactly what the lots realised, short lots and stock too (property)', () => {
    const trade = fc.record({
      kind: fc.constantFrom('buy' as const, 'sell' as const),
      instrument: fc.constantFrom(option('call', '102'), option('put', '97'), zqxaStock),
      quantity: fc.integer({ min: 1, max: 20 }).map(String),
      price: fc.integer({ min: 0, max: 900 }).map((cents) => (cents / 100).toFixed(2)),
      fees: fc.integer({ min: -50, max: 900 }).map((cents) => (cents / 100).toFixed(2)),
    });
    fc.assert(
      fc.property(fc.array(trade, { minLength: 2, maxLength: 12 }), (trades) => {
        const { closed, realisedProfit } = matchLots(fillsInOrder(trades), { method: 'fifo' });
        fc.pre(closed.length > 0);
        const { total } = attributeProfit(asInTestD(closed), testDOptions);
        expect(total.realisedProfit).toBe(realisedProfit);
      }),
      { seed, numRuns: 200 },
    );
  });
});
