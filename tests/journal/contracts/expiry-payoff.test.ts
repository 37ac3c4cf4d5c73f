import fc from 'fast-check';
import { expiryPayoff, payoffAt } from '@/journal/contracts/expiry-payoff';

type Leg = Parameters<typeof expiryPayoff>[0]['legs'][number];
const call = (strikePrice: number, signedShares = 1): Leg => ({ type: 'call', strikePrice, signedShares });
const put = (strikePrice: number, signedShares = 1): Leg => ({ type: 'put', strikePrice, signedShares });

interface Row {
  readonly name: string;
  readonly legs: readonly Leg[];
  readonly shares?: number;
  readonly cost: number;
  readonly gain: number | null;
  readonly loss: number | null;
  readonly breakEvens: readonly number[];
}

// The table of break-evens and ends (Hull; Natenberg; common practice) with numbers put in: D or C = 2, strikes around 100, S0 = 100.
const table: readonly Row[] = [
  { name: 'long call', legs: [call(100)], cost: 2, gain: null, loss: -2, breakEvens: [102] },
  { name: 'long put', legs: [put(100)], cost: 2, gain: 98, loss: -2, breakEvens: [98] },
  { name: 'short put', legs: [put(100, -1)], cost: -2, gain: 2, loss: -98, breakEvens: [98] },
  { name: 'short call', legs: [call(100, -1)], cost: -2, gain: 2, loss: null, breakEvens: [102] },
  { name: 'covered call', legs: [call(105, -1)], shares: 1, cost: 98, gain: 7, loss: -98, breakEvens: [98] },
  { name: 'collar', legs: [put(95), call(105, -1)], shares: 1, cost: 101, gain: 4, loss: -6, breakEvens: [101] },
  { name: 'bull call', legs: [call(100), call(105, -1)], cost: 2, gain: 3, loss: -2, breakEvens: [102] },
  { name: 'bear put', legs: [put(100), put(95, -1)], cost: 2, gain: 3, loss: -2, breakEvens: [98] },
  { name: 'bull put', legs: [put(100, -1), put(95)], cost: -2, gain: 2, loss: -3, breakEvens: [98] },
  { name: 'bear call', legs: [call(100, -1), call(105)], cost: -2, gain: 2, loss: -3, breakEvens: [102] },
  { name: 'long straddle', legs: [call(100), put(100)], cost: 5, gain: null, loss: -5, breakEvens: [95, 105] },
  { name: 'short straddle', legs: [call(100, -1), put(100, -1)], cost: -5, gain: 5, loss: null, breakEvens: [95, 105] },
  { name: 'long strangle', legs: [call(105), put(95)], cost: 3, gain: null, loss: -3, breakEvens: [92, 108] },
  {
    name: 'iron condor',
    legs: [put(90), put(95, -1), call(105, -1), call(110)],
    cost: -2,
    gain: 2,
    loss: -3,
    breakEvens: [93, 107],
  },
  {
    name: 'long butterfly',
    legs: [call(95), call(100, -2), call(105)],
    cost: 2,
    gain: 3,
    loss: -2,
    breakEvens: [97, 103],
  },
  { name: 'ratio 1 by 2', legs: [call(100), call(105, -2)], cost: 1, gain: 4, loss: null, breakEvens: [101, 109] },
  { name: 'backspread', legs: [call(100, -1), call(105, 2)], cost: 1, gain: null, loss: -6, breakEvens: [111] },
];

describe('the pay-off at expiry', () => {
  it.each(table)('has the ends and break-evens of a $name', ({ legs, shares, cost, gain, loss, breakEvens }) => {
    const payoff = expiryPayoff({ legs, shares, cost });
    expect(payoff.greatestGain).toBe(gain);
    expect(payoff.greatestLoss).toBe(loss);
    expect(payoff.breakEvens).toEqual(breakEvens);
  });

  it('equals the sum of the options’ intrinsic values less the cost at any price', () => {
    const leg = fc.record({
      type: fc.constantFrom('call' as const, 'put' as const),
      strikePrice: fc.integer({ min: 50, max: 150 }),
      signedShares: fc.integer({ min: -500, max: 500 }),
    });
    fc.assert(
      fc.property(
        fc.array(leg, { maxLength: 6 }),
        fc.integer({ min: -9999, max: 9999 }),
        fc.double({ min: 0.01, max: 300, noNaN: true }),
        (legs, cost, price) => {
          const direct = legs.reduce(
            (sum, { type, strikePrice, signedShares }) =>
              sum + signedShares * Math.max(0, type === 'call' ? price - strikePrice : strikePrice - price),
            -cost,
          );
          expect(payoffAt(expiryPayoff({ legs, cost }), price)).toBeCloseTo(direct, 6);
        },
      ),
      { seed: 20261209, numRuns: 300 },
    );
  });

  it('refuses a strike of 0', () => {
    expect(() => expiryPayoff({ legs: [call(0)], cost: 0 })).toThrow('payoff-input-invalid');
  });
});
