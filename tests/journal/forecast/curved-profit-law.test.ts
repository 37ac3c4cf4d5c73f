import fc from 'fast-check';
import { normalCumulative } from '@/journal/distributions/normal-distribution';
import { curvedProfitLaw } from '@/journal/forecast/curved-profit-law';
import { profitLaw, type LognormalPrice } from '@/journal/forecast/profit-law';
import { repricedCurve } from '@/journal/forecast/repriced-curve';
import { expiryPayoff } from '@/journal/contracts/expiry-payoff';
import { seededRandom } from '@/journal/random/seeded-random';
import { type RepricedLeg } from '@/journal/scenarios/reprice';

const dailyVolatility = 0.015;
const leg = (type: 'call' | 'put', strikePrice: number, signedShares: number): RepricedLeg => ({
  type,
  strikePrice,
  signedShares,
  dailyVolatility,
});
const positions: readonly (readonly [string, readonly RepricedLeg[], number])[] = [
  ['a long call', [leg('call', 102, 100)], 120],
  ['a bull put', [leg('put', 97, -100), leg('put', 95, 100)], -55],
  ['an iron condor', [leg('put', 92, 100), leg('put', 96, -100), leg('call', 104, -100), leg('call', 108, 100)], -120],
  ['a short straddle', [leg('call', 100, -100), leg('put', 100, -100)], -380],
  ['a butterfly', [leg('call', 95, 100), leg('call', 100, -200), leg('call', 105, 100)], 140],
  ['a backspread', [leg('call', 100, -100), leg('call', 104, 200)], 20],
];
const left = [7, 1, 0.1, 0.001, 1e-6];
const cases = positions.flatMap(([name, legs, costs]) =>
  left.map((sessions) => ({ name, legs, costs, sessions, held: 10 - sessions })),
);
type Case = (typeof cases)[number];

const curveOf = ({ legs, costs, sessions }: Pick<Case, 'legs' | 'costs' | 'sessions'>) =>
  repricedCurve({
    legs,
    costs,
    moment: { sessions, years: (sessions * 1.4) / 365, ratePerYear: 0.03, dividendYield: 0.01 },
  });
const priceOf = (held: number): LognormalPrice => {
  const totalDeviation = dailyVolatility * Math.sqrt(held);
  return { spotPrice: 100, logDrift: -(totalDeviation ** 2) / 2, totalDeviation };
};

/** Independent: every sign change on a fine even grid, closed in by halving, and the normal odds between them. */
function oddsAbove(profitOf: (standard: number) => number, amount: number): number {
  const GRID = 20_000;
  let odds = 0;
  let isAbove = profitOf(-9) > amount;
  let from = -Infinity;
  for (let index = 1; index <= GRID; index += 1) {
    const standard = -9 + (18 * index) / GRID;
    if (profitOf(standard) > amount === isAbove) continue;
    let [low, high] = [standard - 18 / GRID, standard];
    for (let halving = 0; halving < 50; halving += 1) {
      const middle = (low + high) / 2;
      if (profitOf(middle) > amount === isAbove) low = middle;
      else high = middle;
    }
    if (isAbove) odds += normalCumulative(low) - normalCumulative(from);
    from = low;
    isAbove = !isAbove;
  }
  return isAbove ? odds + 1 - normalCumulative(from) : odds;
}

describe('the law of a profit before expiry', () => {
  it.each(cases)('has the odds of profit of $name with $sessions sessions left to 1e-11', (one) => {
    const curve = curveOf(one);
    const price = priceOf(one.held);
    const profitOf = (standard: number) =>
      curve.profitAt(price.spotPrice * Math.exp(price.logDrift + price.totalDeviation * standard));
    const law = curvedProfitLaw(curve, price);
    for (const amount of [0, -30, 25]) {
      expect(Math.abs(1 - law.atOrBelow(amount) - oddsAbove(profitOf, amount))).toBeLessThan(1e-11);
    }
  });

  it.each(cases)('has quantiles of $name with $sessions sessions left that its odds lead back to', (one) => {
    const law = curvedProfitLaw(curveOf(one), priceOf(one.held));
    for (const probability of [0.001, 0.05, 0.25, 0.5, 0.75, 0.95, 0.999]) {
      const amount = law.quantile(probability);
      expect(law.atOrBelow(amount + 1e-7)).toBeGreaterThanOrEqual(probability - 1e-9);
      expect(law.below(amount - 1e-7)).toBeLessThanOrEqual(probability + 1e-9);
    }
  });

  it.each(cases)('has mean and expected shortfall of $name with $sessions sessions left of a fine sum', (one) => {
    const curve = curveOf(one);
    const price = priceOf(one.held);
    const law = curvedProfitLaw(curve, price);
    const STEPS = 40_000;
    const nodes = Array.from({ length: STEPS }, (_, index) => {
      const standard = -9 + (18 * (index + 0.5)) / STEPS;
      return {
        profit: curve.profitAt(price.spotPrice * Math.exp(price.logDrift + price.totalDeviation * standard)),
        weight: (Math.exp(-0.5 * standard * standard) * 18) / STEPS / Math.sqrt(2 * Math.PI),
      };
    });
    const mean = nodes.reduce((sum, { profit, weight }) => sum + profit * weight, 0);
    let rest = 0.05;
    let worst = 0;
    for (const { profit, weight } of nodes.sort((first, second) => first.profit - second.profit)) {
      const share = Math.min(weight, rest);
      worst += share * profit;
      rest -= share;
    }
    // The sum of midpoints is itself good to the square of its step where the profit has a corner.
    expect(Math.abs(law.mean - mean)).toBeLessThan(1e-4);
    expect(Math.abs(law.expectedShortfall(0.05) - worst / 0.05)).toBeLessThan(1e-3);
  });

  it('tends to the law at expiry as the last second goes', () => {
    for (const [, legs, cost] of positions) {
      const price = priceOf(10);
      const curved = curvedProfitLaw(curveOf({ legs, costs: cost, sessions: 0 }), price);
      const straight = profitLaw(expiryPayoff({ legs, cost }).segments, price);
      expect(curved.mean).toBeCloseTo(straight.mean, 6);
      expect(Math.abs(curved.atOrBelow(0) - straight.atOrBelow(0))).toBeLessThan(1e-11);
      expect(curved.quantile(0.05)).toBeCloseTo(straight.quantile(0.05), 6);
      expect(curved.expectedShortfall(0.05)).toBeCloseTo(straight.expectedShortfall(0.05), 6);
      expect(curved.least).toBeCloseTo(straight.least, 6);
      expect(curved.most).toBeCloseTo(straight.most, 6);
    }
  });

  it('has the shares of 200,000 draws', () => {
    const random = seededRandom(20261209);
    const one = { legs: positions[2]?.[1] ?? [], costs: -120, sessions: 0.1 };
    const curve = curveOf(one);
    const price = priceOf(9.9);
    const law = curvedProfitLaw(curve, price);
    const draws = Array.from({ length: 200_000 }, () =>
      curve.profitAt(price.spotPrice * Math.exp(price.logDrift + price.totalDeviation * random.normal())),
    );
    for (const amount of [-250, -100, 0, 50, 100, 115]) {
      const share = draws.filter((profit) => profit <= amount).length / draws.length;
      expect(Math.abs(law.atOrBelow(amount) - share)).toBeLessThan(4 * Math.sqrt(0.25 / draws.length));
    }
  });

  it('has ranges of profit whose odds sum to those of profit, apart and in order', () => {
    for (const one of cases) {
      const law = curvedProfitLaw(curveOf(one), priceOf(one.held));
      const ranges = law.rangesAbove(0);
      const sum = ranges.reduce((total, { probability }) => total + probability, 0);
      expect(Math.abs(sum - (1 - law.atOrBelow(0)))).toBeLessThan(1e-12);
      for (const [index, { from, to }] of ranges.entries()) {
        expect(to).toBeGreaterThan(from);
        expect(from).toBeGreaterThanOrEqual(ranges[index - 1]?.to ?? 0);
      }
    }
  });

  it('has one lump for what is worth the same everywhere', () => {
    const box = [leg('call', 95, 100), leg('call', 105, -100), leg('put', 105, 100), leg('put', 95, -100)];
    const law = curvedProfitLaw(curveOf({ legs: box, costs: 950, sessions: 3 }), priceOf(7));
    expect(law.lumps).toHaveLength(1);
    expect(law.quantile(0.05)).toBeCloseTo(law.quantile(0.95), 8);
    expect(law.atOrBelow(law.lumps[0]?.profit ?? 0)).toBe(1);
  });

  it('scales with the size of the position', () => {
    const quantity = fc.integer({ min: 2, max: 1000 });
    fc.assert(
      fc.property(quantity, fc.constantFrom(...cases), (times, one) => {
        const small = curvedProfitLaw(curveOf(one), priceOf(one.held));
        const large = curvedProfitLaw(
          curveOf({
            ...one,
            legs: one.legs.map((each) => ({ ...each, signedShares: each.signedShares * times })),
            costs: one.costs * times,
          }),
          priceOf(one.held),
        );
        expect(Math.abs(large.atOrBelow(0) - small.atOrBelow(0))).toBeLessThan(1e-10);
        expect(Math.abs(large.quantile(0.3) / times - small.quantile(0.3))).toBeLessThan(1e-7);
      }),
      { seed: 20261209, numRuns: 60 },
    );
  });
});
