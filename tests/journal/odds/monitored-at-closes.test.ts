import { normalDensity, normalUpperTail } from '@/journal/distributions/normal-distribution';
import { touchFirstOddsAtCloses, touchOddsAtCloses } from '@/journal/odds/monitored-at-closes';
import { oddsBeyondLevel } from '@/journal/odds/odds-beyond-level';
import { touchFirstOdds } from '@/journal/odds/touch-first-odds';
import { touchOdds } from '@/journal/odds/touch-odds';

const plan = { spotPrice: 100, level: 102, totalDeviation: 0.015 * Math.sqrt(10), logDrift: 0 };

/**
 * Exact odds of being at or above a level at one of n looks: the density of the paths still below is carried from look to look by
 * Simpson's rule on an even grid that ends at the level.
 */
function exactAtLooks({ gap, looks }: { gap: number; looks: number }): number {
  const deviation = 1 / Math.sqrt(looks);
  const points = 801;
  const low = gap - 9;
  const step = (gap - low) / (points - 1);
  const places = Array.from({ length: points }, (_, index) => low + index * step);
  const weight = (index: number) => (step / 3) * (index === 0 || index === points - 1 ? 1 : index % 2 === 1 ? 4 : 2);
  const kernel = (from: number, to: number) => normalDensity((to - from) / deviation) / deviation;
  let density = places.map((place) => kernel(0, place));
  let touched = normalUpperTail(gap / deviation);
  for (let look = 2; look <= looks; look += 1) {
    const before = density;
    touched += before.reduce(
      (sum, value, index) => sum + weight(index) * value * normalUpperTail((gap - (places[index] ?? 0)) / deviation),
      0,
    );
    density = places.map((place) =>
      before.reduce((sum, value, index) => sum + weight(index) * value * kernel(places[index] ?? 0, place), 0),
    );
  }
  return touched;
}

describe('levels watched at the closes', () => {
  it('has the worked 54.7 % of finding 102 reached at one of ten closes', () => {
    expect(touchOddsAtCloses({ ...plan, closes: 10 })).toBeCloseTo(0.547, 3);
  });

  it.each([
    { closes: 2, within: 0.013 },
    { closes: 5, within: 0.01 },
    { closes: 10, within: 0.01 },
  ])('lies within $within of the exact odds at $closes looks', ({ closes, within }) => {
    const gap = Math.log(1.02) / plan.totalDeviation;
    const exact = exactAtLooks({ gap, looks: closes });
    expect(Math.abs(touchOddsAtCloses({ ...plan, closes }) - exact)).toBeLessThanOrEqual(within);
  });

  it('is exactly the odds of finishing beyond for one look', () => {
    expect(touchOddsAtCloses({ ...plan, closes: 1 })).toBe(oddsBeyondLevel(plan).above);
    const lower = { ...plan, level: 97 };
    expect(touchOddsAtCloses({ ...lower, closes: 1 })).toBe(oddsBeyondLevel(lower).below);
  });

  it('rises with the number of looks, towards watching without a break', () => {
    const odds = [1, 2, 5, 10, 100, 1e4, 1e8].map((closes) => touchOddsAtCloses({ ...plan, closes }));
    expect([...odds].sort((a, b) => a - b)).toEqual(odds);
    expect(touchOdds(plan) - (odds.at(-1) ?? 0)).toBeLessThanOrEqual(1e-4);
  });

  it('finds both of two levels later than watching without a break does', () => {
    const question = { ...plan, upperLevel: 102, lowerLevel: 97 };
    const [looks, always] = [touchFirstOddsAtCloses({ ...question, closes: 10 }), touchFirstOdds(question)];
    expect(looks.upperFirst).toBeLessThan(always.upperFirst);
    expect(looks.lowerFirst).toBeLessThan(always.lowerFirst);
    const once = touchFirstOddsAtCloses({ ...question, closes: 1 });
    expect(once.upperFirst).toBe(oddsBeyondLevel(plan).above);
    expect(once.lowerFirst + once.upperFirst + once.neither).toBeCloseTo(1, 15);
  });

  it('knows a level at the spot price as touched', () => {
    expect(touchOddsAtCloses({ ...plan, level: 100, closes: 3 })).toBe(1);
  });

  it.each([0, -1, 1.5, NaN, Infinity])('throws closes-invalid for %d looks', (closes) => {
    expect(() => touchOddsAtCloses({ ...plan, closes })).toThrow(expect.objectContaining({ code: 'closes-invalid' }));
  });
});
