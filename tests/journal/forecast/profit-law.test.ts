import { expiryPayoff } from '@/journal/contracts/expiry-payoff';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { planHorizon } from '@/journal/forecast/plan-horizon';
import { lawAt, planModel, profitAtExit } from '@/journal/forecast/plan-model';
import { profitLaw } from '@/journal/forecast/profit-law';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { longCall } from '@/tests/journal/forecast/plan-examples';
import { seededRandom } from '@/server/demo/seeded-random';

const price = { spotPrice: 100, logDrift: -0.001125, totalDeviation: 0.0474 };
const condor = expiryPayoff({
  legs: [
    { type: 'put', strikePrice: 92, signedShares: 100 },
    { type: 'put', strikePrice: 96, signedShares: -100 },
    { type: 'call', strikePrice: 104, signedShares: -100 },
    { type: 'call', strikePrice: 108, signedShares: 100 },
  ],
  cost: -120,
});
const law = profitLaw(condor.segments, price);

// Independent: draws of the same lognormal price put through the pay-off leg by leg.
const DRAWS = 400_000;
const random = seededRandom(42);
const profits = Array.from({ length: DRAWS }, () => {
  const end = price.spotPrice * Math.exp(price.logDrift + price.totalDeviation * random.normal());
  return 120 + 100 * (Math.max(0, 92 - end) - Math.max(0, 96 - end) - Math.max(0, end - 104) + Math.max(0, end - 108));
}).sort((left, right) => left - right);
const mean = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
const shareUpTo = (amount: number) => profits.filter((profit) => profit <= amount).length / DRAWS;
/** Four standard errors of a share. */
const SHARE_ERROR = 4 * Math.sqrt(0.25 / DRAWS);

describe('the law of a profit at expiry', () => {
  it('has the mean of the draws', () => {
    const centre = mean(profits);
    const deviation = Math.sqrt(mean(profits.map((profit) => (profit - centre) ** 2)));
    expect(Math.abs(law.mean - centre)).toBeLessThan((4 * deviation) / Math.sqrt(DRAWS));
  });

  it.each([-280, -200, -50, 0, 60, 119.99])('has the share of the draws up to %p', (amount) => {
    expect(Math.abs(law.atOrBelow(amount) - shareUpTo(amount))).toBeLessThan(SHARE_ERROR);
  });

  it('has two lumps, at the greatest loss and gain, and everything at or below the gain', () => {
    expect(law.lumps.map(({ profit }) => profit)).toEqual([-280, 120]);
    expect(law.atOrBelow(120)).toBeCloseTo(1, 12);
    expect(law.below(-280)).toBe(0);
    expect(law.atOrBelow(-280)).toBeCloseTo(law.lumps[0]?.probability ?? -1, 12);
  });

  it('has the expected shortfall and percentiles of the draws', () => {
    expect(Math.abs(law.expectedShortfall(0.2) - mean(profits.slice(0, DRAWS / 5)))).toBeLessThan(1);
    expect(law.quantile(0.03)).toBe(-280);
    expect(law.quantile(0.9)).toBe(120);
    expect(Math.abs(law.quantile(0.2) - (profits[DRAWS / 5] ?? 0))).toBeLessThan(2);
  });

  it('sums to 1 over lumps and continuous part', () => {
    const lumped = law.lumps.reduce((sum, { probability }) => sum + probability, 0);
    const between = law.below(120) - law.atOrBelow(-280);
    expect(lumped + between).toBeCloseTo(1, 12);
  });
});

describe('the law of a profit at an exit just before expiry', () => {
  // Independent: the profit averaged over the worst 5 % of a fine grid of normal deviates.
  it.each([1, 5, 9, 9.9])('has the expected shortfall of a sum over moves after %d of 10 sessions', (sessions) => {
    const input: ForecastInput = {
      ...longCall,
      legs: longCall.legs.map((leg) => ({ ...leg, quantity: 5 })),
      holding: { kind: 'sessions', sessions },
    };
    const model = planModel(input, planHorizon(input, usOptionsCalendar));
    const profitAt = profitAtExit(model);
    const deviation = 0.015 * Math.sqrt(sessions);
    const nodes = Array.from({ length: 100_001 }, (_, index) => -8 + (16 * index) / 100_000).map((z) => ({
      profit: profitAt(100 * Math.exp(deviation * z - deviation ** 2 / 2)),
      weight: Math.exp((-z * z) / 2),
    }));
    const whole = nodes.reduce((sum, { weight }) => sum + weight, 0);
    let left = 0.05;
    let shortfall = 0;
    for (const { profit, weight } of nodes.sort((one, other) => one.profit - other.profit)) {
      const share = Math.min(weight / whole, left);
      shortfall += (share * profit) / 0.05;
      left -= share;
    }
    expect(Math.abs(lawAt(model, 'exit', 0.015, input.drift).expectedShortfall(0.05) - shortfall)).toBeLessThan(0.5);
  });
});
