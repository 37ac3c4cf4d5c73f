import { consistencyInterval } from '@/journal/scoring/consistency-interval';
import { reliabilityBand } from '@/journal/scoring/reliability-band';

const seed = 20261201;

describe('reliabilityBand', () => {
  it('is the binomial band where all forecasts are one value', () => {
    const forecasts = new Array<number>(50).fill(0.3);
    const { points, resamples } = reliabilityBand(forecasts, { seed });
    expect(resamples).toBe(1000);
    expect(points).toHaveLength(1);
    const exact = consistencyInterval(forecasts);
    // .20 and .40; a resampled 5 % point may lie one count off.
    expect(Math.abs((points[0]?.low ?? NaN) - exact.low)).toBeLessThanOrEqual(0.02);
    expect(Math.abs((points[0]?.high ?? NaN) - exact.high)).toBeLessThanOrEqual(0.02);
  });

  it('holds the diagonal, widens to the sparse ends and repeats with its seed', () => {
    const forecasts = Array.from({ length: 400 }, (_, index) => (index % 20) / 20 + 0.025);
    const band = reliabilityBand(forecasts, { seed });
    for (const { probability, low, high } of band.points) {
      expect(low).toBeLessThanOrEqual(probability);
      expect(high).toBeGreaterThanOrEqual(probability);
    }
    expect(reliabilityBand(forecasts, { seed })).toEqual(band);
    expect(reliabilityBand(forecasts, { seed: seed + 1 })).not.toEqual(band);
  });

  it('shows 200 points of many forecasts, the first and the last among them', () => {
    const forecasts = Array.from({ length: 5000 }, (_, index) => index / 4999);
    const { points, resamples } = reliabilityBand(forecasts, { seed });
    expect(resamples).toBe(100);
    expect(points).toHaveLength(200);
    expect([points[0]?.probability, points.at(-1)?.probability]).toEqual([0, 1]);
  });

  it('is a point where a forecast is certain', () => {
    expect(reliabilityBand([0, 0, 1], { seed }).points).toEqual([
      { probability: 0, low: 0, high: 0 },
      { probability: 1, low: 1, high: 1 },
    ]);
  });

  it('refuses no forecasts and a level of 1', () => {
    expect(() => reliabilityBand([], { seed })).toThrow(expect.objectContaining({ code: 'forecasts-missing' }));
    expect(() => reliabilityBand([0.5], { seed, level: 1 })).toThrow(
      expect.objectContaining({ code: 'confidence-invalid' }),
    );
  });
});
