import * as fc from 'fast-check';
import { expiryValueProfit } from '@/journal/fills/expiry-value-profit';
import { type Fill } from '@/journal/fills/fill';
import { matchLots } from '@/journal/fills/lots';
import { premiumInBasis } from '@/journal/fills/premium-in-basis';
import { sharesFromExercise } from '@/journal/fills/underlying-shares';
import { assignedPutSpread, fillsInOrder, option, zqxaStock } from '@/tests/journal/fills/fill-fixtures';

const seed = 20261201;
const methods = ['fifo', 'lifo', 'average'] as const;
const fills = assignedPutSpread();
const [, , , assigned, , sold] = fills as [Fill, Fill, Fill, Fill, Fill, Fill]; // six by its own comment
const deliveries = [{ optionFillId: 'assigned', sharesFillId: 'shares' }];

describe('an assigned put whose premium goes into the basis of its shares', () => {
  it.each(methods)('makes 32.32 of the shares and -30.66 of the other put, 1.66 in all, by %s', (method) => {
    const { closed, realisedProfit, cashFlow, open } = premiumInBasis(fills, { method, deliveries });
    expect(closed.map((lot) => [lot.instrument.kind, lot.realisedProfit])).toEqual([
      ['option', '-30.66'],
      ['stock', '32.32'],
    ]);
    expect(closed[1]).toMatchObject({ openPrice: '96.22', openFees: '0.66', closeFees: '0.02' });
    expect([realisedProfit, cashFlow, open]).toEqual(['1.66', '1.66', []]);
  });

  it('keeps the premium out of the profit while the shares are held', () => {
    const held = premiumInBasis(fills.slice(0, -1), { method: 'fifo', deliveries });
    expect(held.realisedProfit).toBe('-30.66');
    expect(held.open).toMatchObject([{ instrument: zqxaStock, quantity: '100', price: '96.22', fees: '0.66' }]);
  });
});

describe('the profit of an option plan parted at its expiry value', () => {
  const parts = (settlement: string) =>
    expiryValueProfit(fills, { method: 'fifo', deliveries, settlementPrices: new Map([['assigned', settlement]]) });

  it('is -33.32 of the options and +34.98 of the shares carried overnight', () => {
    expect(parts('96.20')).toEqual({ options: '-33.32', carriedShares: '34.98', total: '1.66' });
  });

  it('takes an assignment out of the money as it came: the options keep their premium and a gain of the delivery', () => {
    expect(parts('97.10')).toEqual({ options: '56.68', carriedShares: '-55.02', total: '1.66' });
  });

  it('refuses a settlement price that is missing or negative, and a delivery that is none', () => {
    const refusal = (code: string) => expect.objectContaining({ code });
    expect(() => parts('-1')).toThrow(refusal('settlement-price-negative'));
    const options = { method: 'fifo', settlementPrices: new Map<string, string>() } as const;
    expect(() => expiryValueProfit(fills, { ...options, deliveries })).toThrow(refusal('settlement-price-missing'));
    const wrong = [{ optionFillId: 'f3', sharesFillId: 'shares' }];
    expect(() => expiryValueProfit(fills, { ...options, deliveries: wrong })).toThrow(refusal('delivery-unknown'));
    expect(() => premiumInBasis(fills, { method: 'fifo', deliveries: [...deliveries, ...deliveries] })).toThrow(
      refusal('delivery-repeated'),
    );
  });
});

describe('premiums in the basis', () => {
  it.each(methods)('give the totals of the plain view once all is flat, by %s (property)', (method) => {
    const opening = fc.record({ quantity: fc.integer({ min: 1, max: 7 }), cents: fc.integer({ min: 1, max: 999 }) });
    fc.assert(
      fc.property(
        fc.array(opening, { minLength: 1, maxLength: 6 }),
        fc.constantFrom('call' as const, 'put' as const),
        fc.boolean(),
        (openings, type, isShort) => {
          const instrument = option(type, '97');
          const total = openings.reduce((sum, { quantity }) => sum + quantity, 0);
          const opened = fillsInOrder(
            openings.map(({ quantity, cents }) => ({
              kind: isShort ? ('sell' as const) : ('buy' as const),
              instrument,
              quantity: String(quantity),
              price: (cents / 100).toFixed(2),
              fees: '0.67',
            })),
          );
          const ending: Fill = {
            ...assigned,
            kind: isShort ? 'assignment' : 'exercise',
            instrument,
            quantity: String(total),
          };
          const delivered = sharesFromExercise(ending, { id: 'shares' });
          const back: Fill = {
            ...sold,
            kind: delivered.kind === 'buy' ? 'sell' : 'buy',
            quantity: delivered.quantity,
          };
          const all = [...opened, ending, delivered, back];
          const view = premiumInBasis(all, { method, deliveries });
          const plain = matchLots(all, { method });
          expect([view.realisedProfit, view.cashFlow, view.open]).toEqual([plain.realisedProfit, plain.cashFlow, []]);
        },
      ),
      { seed, numRuns: 100 },
    );
  });
});
