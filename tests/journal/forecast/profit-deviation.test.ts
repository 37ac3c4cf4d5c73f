import { normalCumulative } from '@/journal/distributions/normal-distribution';
import { profitDeviation } from '@/journal/forecast/profit-deviation';

describe('the deviation of a sealed profit distribution', () => {
  it('is that of two lumps', () => {
    const lumps = [
      { profit: -100, probability: 0.25 },
      { profit: 60, probability: 0.75 },
    ];
    expect(profitDeviation({ lumps, classes: [] })).toBeCloseTo(160 * Math.sqrt(0.25 * 0.75), 12);
  });

  it('is 0 for one lump and for nothing', () => {
    expect(profitDeviation({ lumps: [{ profit: 5, probability: 1 }], classes: [] })).toBe(0);
    expect(profitDeviation({ lumps: [], classes: [] })).toBe(0);
  });

  it('is that of an even class', () => {
    expect(profitDeviation({ lumps: [], classes: [{ from: 0, to: 12, probability: 1 }] })).toBeCloseTo(
      Math.sqrt(12),
      12,
    );
  });

  it('is within 2 percent for a normal profit in twelve classes between its outer half percents', () => {
    const edge = 2.5758;
    const at = (index: number) => -edge + (index * edge) / 6;
    const classes = Array.from({ length: 12 }, (_, index) => ({
      from: 50 * at(index),
      to: 50 * at(index + 1),
      probability: normalCumulative(at(index + 1)) - normalCumulative(at(index)),
    }));
    expect(Math.abs(profitDeviation({ lumps: [], classes }) / 50 - 1)).toBeLessThan(0.02);
  });
});
