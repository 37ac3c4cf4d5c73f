import { normalCumulative } from '@/journal/distributions/normal-distribution';
import { profitPercentile, type ProfitCumulative } from '@/journal/outcome/profit-percentile';

const spot = 100;
const totalDeviation = 0.015 * Math.sqrt(10);
const below = (price: number) =>
  price <= 0 ? 0 : normalCumulative((Math.log(price / spot) + totalDeviation ** 2 / 2) / totalDeviation);

/** One 102 call bought at 1.20 with a fee of 0.65, held to expiry: loses 120.65 wherever it ends worthless. */
const longCall: ProfitCumulative = {
  below: (profit) => (profit <= -120.65 ? 0 : below(102 + (profit + 120.65) / 100)),
  atOrBelow: (profit) => (profit < -120.65 ? 0 : below(102 + (profit + 120.65) / 100)),
};

/** A 97/95 put spread sold at 0.55 with fees of 1.30: gains 53.70 above 97, loses 146.30 below 95. */
const bullPut: ProfitCumulative = {
  below: (profit) => (profit <= -146.3 ? 0 : profit > 53.7 ? 1 : below(97 - (53.7 - profit) / 100)),
  atOrBelow: (profit) => (profit < -146.3 ? 0 : profit >= 53.7 ? 1 : below(97 - (53.7 - profit) / 100)),
};

describe('profitPercentile', () => {
  it('is the interval from 0 to 0.670 when a bought call ends worthless', () => {
    const { low, middle, high } = profitPercentile({ profit: -120.65, distribution: longCall });
    expect(low).toBe(0);
    expect(high).toBeCloseTo(0.6705, 4);
    expect(middle).toBe(high / 2);
  });

  it('is 0.829 when the underlying of that call ends at 104.50', () => {
    const { low, high } = profitPercentile({ profit: 129.35, distribution: longCall });
    expect(low).toBeCloseTo(0.829, 3);
    expect(high).toBe(low);
  });

  it('is 0.214 when the underlying of a sold put spread ends at 96.20', () => {
    const { low, high } = profitPercentile({ profit: -26.3, distribution: bullPut });
    expect(low).toBeCloseTo(0.214, 3);
    expect(high).toBe(low);
  });

  it('reaches up to 1 on the greatest gain of that spread', () => {
    expect(profitPercentile({ profit: 53.7, distribution: bullPut }).high).toBe(1);
  });

  it.each([NaN, Infinity])('refuses a profit of %p', (profit) => {
    expect(() => profitPercentile({ profit, distribution: longCall })).toThrow(
      expect.objectContaining({ code: 'profit-not-finite' }),
    );
  });

  it.each([
    [0.5, 0.4],
    [-0.1, 0.4],
    [0.5, 1.1],
    [NaN, 0.5],
    [0.5, NaN],
  ])('refuses a distribution that says %d below and %d at or below', (low, high) => {
    const distribution = { below: () => low, atOrBelow: () => high };
    expect(() => profitPercentile({ profit: 1, distribution })).toThrow(
      expect.objectContaining({ code: 'profit-distribution-invalid' }),
    );
  });
});
