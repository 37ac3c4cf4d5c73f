import * as fc from 'fast-check';
import { type AmountSplit, dealPart, startAmountSplit, undealtAmount } from '@/journal/money/amount-split';
import { Decimal, toDecimal } from '@/journal/money/decimal';
import { roundMoney } from '@/journal/money/rounding';

const seed = 20261201;

function dealAll(amount: string, parts: readonly string[]): string[] {
  const quantity = parts.reduce((sum, part) => sum.plus(part), new Decimal(0));
  let split = startAmountSplit({ amount: toDecimal(amount), quantity });
  return parts.map((part) => {
    const dealt = dealPart(split, toDecimal(part));
    split = dealt.split;
    return dealt.part.toString();
  });
}

describe('an amount split', () => {
  it('deals 1.97 over 2 and 1 of 3 as 1.31 and 0.66', () => {
    expect(dealAll('1.97', ['2', '1'])).toEqual(['1.31', '0.66']);
  });

  it('deals 2.71 over 2 and 2 of 4 as 1.36 and 1.35: the half cent goes to the even cent of the sum so far', () => {
    expect(dealAll('2.71', ['2', '2'])).toEqual(['1.36', '1.35']);
  });

  it('gives the fractions of a cent an amount has to its last part', () => {
    expect(dealAll('0.0278', ['1', '1', '1'])).toEqual(['0.01', '0.01', '0.0078']);
  });

  it('deals a rebate like a fee with the sign turned', () => {
    expect(dealAll('-1.97', ['2', '1'])).toEqual(['-1.31', '-0.66']);
  });

  it('loses and adds nothing, and is never more than a cent from the even share so far (property)', () => {
    const parts = fc.array(fc.integer({ min: 1, max: 500 }), { minLength: 1, maxLength: 15 });
    fc.assert(
      fc.property(fc.integer({ min: -100_000, max: 100_000 }), parts, (cents, quantities) => {
        const amount = new Decimal(cents).dividedBy(100);
        const quantity = new Decimal(quantities.reduce((sum, part) => sum + part, 0));
        let split: AmountSplit = startAmountSplit({ amount, quantity });
        let given = new Decimal(0);
        for (const partQuantity of quantities) {
          const dealt = dealPart(split, new Decimal(partQuantity));
          split = dealt.split;
          given = given.plus(dealt.part);
          const evenShare = amount.times(split.dealtQuantity).dividedBy(quantity);
          expect(given.toString()).toBe(roundMoney(evenShare).toString());
        }
        expect(undealtAmount(split).isZero()).toBe(true);
        expect(given.equals(amount)).toBe(true);
      }),
      { seed, numRuns: 300 },
    );
  });

  it('refuses a quantity of 0 and more than is left', () => {
    const amount = toDecimal('1');
    expect(() => startAmountSplit({ amount, quantity: new Decimal(0) })).toThrow(
      expect.objectContaining({ code: 'quantity-not-positive' }),
    );
    const split = startAmountSplit({ amount, quantity: new Decimal(2) });
    expect(() => dealPart(split, new Decimal(0))).toThrow(expect.objectContaining({ code: 'quantity-not-positive' }));
    expect(() => dealPart(split, new Decimal(3))).toThrow(expect.objectContaining({ code: 'part-exceeds-quantity' }));
  });
});
