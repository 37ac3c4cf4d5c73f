import { realisedMove } from '@/journal/outcome/realised-move';

const question = { startPrice: 100, endPrice: 103.1, dailyVolatility: 0.015, sessions: 5, logDrift: 0 };

describe('realisedMove', () => {
  it('puts 100 to 103.10 in 5 sessions of 1.5 % at 0.910 sigmas, place 0.819', () => {
    const { logReturn, inSigmas, percentile } = realisedMove(question);
    expect(logReturn).toBeCloseTo(Math.log(1.031), 15);
    expect(inSigmas).toBeCloseTo(0.91, 3);
    expect(percentile).toBeCloseTo(0.819, 3);
  });

  it('puts it at place 0.813 when the volatility comes from 20 returns, and at none when it is no estimate', () => {
    expect(realisedMove({ ...question, degreesOfFreedom: 19 }).studentPercentile).toBeCloseTo(0.813, 3);
    expect(realisedMove(question).studentPercentile).toBeNull();
    expect(() => realisedMove({ ...question, degreesOfFreedom: 0 })).toThrow(
      expect.objectContaining({ code: 'degrees-of-freedom-invalid' }),
    );
  });

  it('puts 4000 to 4021.50 in 0.3769 sessions of 0.90 % at 0.970 sigmas', () => {
    const move = { startPrice: 4000, endPrice: 4021.5, dailyVolatility: 0.009, sessions: 0.376923, logDrift: 0 };
    expect(realisedMove(move).inSigmas).toBeCloseTo(0.97, 3);
  });

  it('takes the drift off for the place in the forecast and not for the sigmas', () => {
    const logDrift = -0.5 * 0.015 ** 2 * 5;
    const drifted = realisedMove({ ...question, logDrift });
    expect(drifted.inSigmas).toBe(realisedMove(question).inSigmas);
    expect(drifted.percentile).toBeGreaterThan(realisedMove(question).percentile);
  });

  it('is in the middle when the price ends at the median of the forecast', () => {
    const { percentile } = realisedMove({ ...question, endPrice: 100 * Math.exp(-0.002), logDrift: -0.002 });
    expect(percentile).toBeCloseTo(0.5, 14);
  });

  it('keeps the digits of a place far out in the lower tail', () => {
    const { inSigmas, percentile } = realisedMove({ ...question, endPrice: 70 });
    expect(inSigmas).toBeLessThan(-10);
    expect(percentile).toBeGreaterThan(0);
    expect(percentile).toBeLessThan(1e-24);
  });

  it.each(['startPrice', 'endPrice', 'dailyVolatility', 'sessions'] as const)(
    'refuses a %s of 0, NaN or infinity',
    (name) => {
      for (const value of [0, -1, NaN, Infinity]) {
        expect(() => realisedMove({ ...question, [name]: value })).toThrow(
          expect.objectContaining({ code: 'realised-move-invalid' }),
        );
      }
    },
  );

  it('refuses a drift that is not finite', () => {
    expect(() => realisedMove({ ...question, logDrift: NaN })).toThrow(
      expect.objectContaining({ code: 'realised-move-invalid' }),
    );
  });
});
