import fc from 'fast-check';
import { expiryPayoff, payoffAt } from '@/journal/contracts/expiry-payoff';
import { kellyOutcomes, logGrowth } from '@/journal/sizing/kelly-outcomes';
import { kellyProfit } from '@/journal/sizing/kelly-profit';
import { cappedKelly, kellySize } from '@/journal/sizing/kelly-size';
import { breakEvenProbability, kellyTwoOutcomes } from '@/journal/sizing/kelly-two-outcomes';

const spread = { win: 55, loss: 145 };
const twoProfits = (probability: number, win: number, loss: number) => [
  { profit: win, probability },
  { profit: -loss, probability: 1 - probability },
];

describe('Kelly for two outcomes', () => {
  it('is 10% at 40% for 2 to 1', () => {
    expect(kellyTwoOutcomes({ probability: 0.4, win: 2, loss: 1 })).toBeCloseTo(0.1, 12);
  });

  it('is +9.1% at 75%, −9.1% at 70% and 0 at 72.5% for a credit spread that wins 55 or loses 145', () => {
    expect(kellyTwoOutcomes({ probability: 0.75, ...spread })).toBeCloseTo(0.091, 3);
    expect(kellyTwoOutcomes({ probability: 0.7, ...spread })).toBeCloseTo(-0.091, 3);
    expect(breakEvenProbability(spread)).toBeCloseTo(0.725, 12);
    expect(kellyTwoOutcomes({ probability: 0.725, ...spread })).toBeCloseTo(0, 12);
  });

  it('keeps 75.7% of the growth at half of it, about none at twice', () => {
    const outcomes = twoProfits(0.4, 2, 1);
    const best = logGrowth(outcomes, 0.1);
    expect(logGrowth(outcomes, 0.05) / best).toBeCloseTo(0.757, 3);
    expect(Math.abs(logGrowth(outcomes, 0.2) / best)).toBeLessThan(0.1);
  });

  it.each([
    { probability: 1.1, win: 1, loss: 1 },
    { probability: NaN, win: 1, loss: 1 },
    { probability: 0.5, win: 0, loss: 1 },
    { probability: 0.5, win: 1, loss: Infinity },
  ])('refuses %p', (outcomes) => {
    expect(() => kellyTwoOutcomes(outcomes)).toThrow('kelly-input-invalid');
  });
});

describe('Kelly for any profits', () => {
  it('is that of two outcomes where there are two', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 0.99, noNaN: true }),
        fc.double({ min: 0.05, max: 20, noNaN: true }),
        fc.double({ min: 0.05, max: 20, noNaN: true }),
        (probability, win, loss) => {
          expect(kellyOutcomes(twoProfits(probability, win, loss))).toBeCloseTo(
            kellyTwoOutcomes({ probability, win, loss }),
            9,
          );
        },
      ),
      { seed: 20261209, numRuns: 200 },
    );
  });

  it('grows less at any other share', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -5, max: 8, noNaN: true }), { minLength: 1, maxLength: 8 }),
        fc.double({ min: 0, max: 0.95, noNaN: true }),
        (profits, other) => {
          const all = [...profits, -5, 8];
          const outcomes = all.map((profit) => ({ profit, probability: 1 / all.length }));
          const best = Math.max(0, kellyOutcomes(outcomes));
          expect(logGrowth(outcomes, best)).toBeGreaterThanOrEqual(logGrowth(outcomes, other) - 1e-12);
        },
      ),
      { seed: 20261209, numRuns: 200 },
    );
  });

  it.each<[string, { profit: number; probability: number }[], string]>([
    ['no outcome', [], 'kelly-outcomes-invalid'],
    ['odds that do not sum to 1', [{ profit: -1, probability: 0.5 }], 'kelly-outcomes-invalid'],
    ['a profit without end', twoProfits(0.5, Infinity, 1), 'kelly-outcomes-invalid'],
    ['nothing to lose', [{ profit: 1, probability: 1 }], 'kelly-no-loss'],
    ['nothing to gain', [{ profit: -1, probability: 1 }], 'kelly-no-gain'],
  ])('refuses %s', (_, outcomes, code) => {
    expect(() => kellyOutcomes(outcomes)).toThrow(code);
  });

  it('refuses to lay a share on that would leave nothing', () => {
    expect(() => logGrowth(twoProfits(0.5, 1, 1), 1)).toThrow('kelly-fraction-invalid');
  });
});

describe('Kelly for a profit over a lognormal price', () => {
  const price = { spotPrice: 100, logDrift: -(0.0474 ** 2) / 2, totalDeviation: 0.0474 };
  const bullPut = expiryPayoff({
    legs: [
      { type: 'put', strikePrice: 97, signedShares: -100 },
      { type: 'put', strikePrice: 95, signedShares: 100 },
    ],
    cost: -53.7,
  });
  const question = {
    profitAt: (spotPrice: number) => payoffAt(bullPut, spotPrice),
    bends: [97, 95].map((strike) => ({ price: strike, width: 0 })),
    price,
    greatestLoss: bullPut.greatestLoss,
  };

  it('is where a fine sum of the log growth is highest', () => {
    const fraction = kellyProfit(question);
    const STEPS = 40_000;
    const growth = (share: number) => {
      let sum = 0;
      for (let index = 0; index < STEPS; index += 1) {
        const standard = -9 + (18 * (index + 0.5)) / STEPS;
        const profit = question.profitAt(100 * Math.exp(price.logDrift + price.totalDeviation * standard));
        sum += (Math.exp(-0.5 * standard ** 2) * Math.log1p((share * profit) / 146.3) * 18) / STEPS;
      }
      return sum;
    };
    const step = 1e-3;
    const [below, at, above] = [growth(fraction - step), growth(fraction), growth(fraction + step)];
    const vertex = fraction + (step / 2) * ((below - above) / (below - 2 * at + above));
    expect(Math.abs(vertex - fraction)).toBeLessThan(1e-5);
  });

  it('refuses a loss without limit', () => {
    expect(() => kellyProfit({ ...question, greatestLoss: null })).toThrow('kelly-loss-unlimited');
  });
});

describe('the size by Kelly', () => {
  it('is no trade where the best estimate loses, unsure where the interval of the odds does', () => {
    const size = (low: number, base: number, high: number) =>
      kellySize({ ...spread, probability: { low, base, high } }).verdict;
    expect(size(0.6, 0.7, 0.8)).toBe('no-trade');
    expect(size(0.7, 0.75, 0.8)).toBe('unsure');
    expect(size(0.74, 0.8, 0.86)).toBe('trade');
  });

  it('uses a quarter and nothing below 0', () => {
    const { fraction, capped } = kellySize({ ...spread, probability: { low: 0.7, base: 0.75, high: 0.8 } });
    expect(capped).toEqual({ low: 0, base: fraction.base / 4, high: fraction.high / 4 });
  });

  it.each<[string, () => unknown, string]>([
    [
      'a loss without limit',
      () => kellySize({ win: 1, loss: null, probability: { low: 0.5, base: 0.5, high: 0.5 } }),
      'kelly-loss-unlimited',
    ],
    ['an interval out of order', () => cappedKelly({ low: 0.2, base: 0.1, high: 0.3 }), 'kelly-interval-order'],
    ['half of Kelly', () => cappedKelly({ low: 0, base: 0.1, high: 0.3 }, 0.5), 'kelly-share-invalid'],
  ])('refuses %s', (_, call, code) => {
    expect(call).toThrow(code);
  });
});
