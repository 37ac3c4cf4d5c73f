import { seededRandom } from '@/journal/random/seeded-random';
import { defaultOvernightShare, overnightShare } from '@/journal/volatility/overnight-share';
import { simulateBars } from '@/tests/journal/volatility/simulate-bars';

const simulated = (seed: number, count: number, nightShare: number) =>
  simulateBars(seededRandom(seed), { count, nightShare, steps: 1, isSeenAllTheTime: true });

describe('the share of variance that comes by night', () => {
  it('is the sum of squared nights over that of nights and days', () => {
    // Nights of 1 %, days of 2 %, in turn up and down: 1/(1 + 4).
    let close = 100;
    const bars = Array.from({ length: 22 }, (_, at) => {
      const sign = at % 2 === 0 ? 1 : -1;
      const open = close * Math.exp(sign * 0.01);
      close = open * Math.exp(-sign * 0.02);
      return { open, high: Math.max(open, close), low: Math.min(open, close), close };
    });
    const share = overnightShare(bars, { seed: 1, resamples: 200 });
    expect(share?.share).toBeCloseTo(0.2, 12);
    expect(share?.nights).toBe(21);
    // Every session is like the others, so that drawing them anew changes nothing.
    expect(share?.low).toBeCloseTo(0.2, 12);
    expect(share?.high).toBeCloseTo(0.2, 12);
  });

  it('has an interval that holds the truth in about 95 % of simulated half years', () => {
    const trials = 200;
    let held = 0;
    for (let trial = 0; trial < trials; trial += 1) {
      const share = overnightShare(simulated(trial, 121, 0.3), { seed: trial, resamples: 200 });
      if (share !== null && share.low <= 0.3 && 0.3 <= share.high) held += 1;
    }
    // Three standard errors of 200 trials are 4.6 points.
    expect(Math.abs(held / trials - 0.95)).toBeLessThan(0.046);
  });

  it('is 0 without nights and 1 without days', () => {
    const still = simulated(3, 30, 0);
    expect(overnightShare(still, { seed: 1, resamples: 100 })).toMatchObject({ share: 0, low: 0, high: 0 });
    const flat = simulated(3, 30, 1);
    expect(overnightShare(flat, { seed: 1, resamples: 100 })?.share).toBeCloseTo(1, 12);
  });

  it('is none from fewer than 20 nights or where nothing moved, and 0.30 stands in', () => {
    expect(overnightShare(simulated(4, 20, 0.3), { seed: 1 })).toBeNull();
    expect(overnightShare([], { seed: 1 })).toBeNull();
    expect(overnightShare(new Array(30).fill({ open: 1, high: 1, low: 1, close: 1 }), { seed: 1 })).toBeNull();
    expect(defaultOvernightShare).toBe(0.3);
  });

  it('refuses a bar whose close lies outside its range, naming its row', () => {
    const bars = simulated(5, 30, 0.3);
    bars[7] = { open: 1, high: 1, low: 1, close: 2 };
    const run = () => overnightShare(bars, { seed: 1 });
    expect(run).toThrow(expect.objectContaining({ code: 'bar-invalid', details: expect.objectContaining({ row: 7 }) }));
  });
});
