import * as fc from 'fast-check';
import { averagedEffects } from '@/journal/attribution/averaged-effects';

const seed = 20261201;
const refusal = (code: string) => expect.objectContaining({ code });
const cornerOf = (isNew: readonly boolean[]) =>
  isNew.reduce((corner, is, factor) => corner + (is ? 2 ** factor : 0), 0);

describe('averagedEffects', () => {
  it('parts the change of the eight printed corners as +548.400, -143.375 and -55.625 for 500 shares', () => {
    // Worked outside this project; corners V(S, N, sd) in the order 000 100 010 110 001 101 011 111.
    const corners = [1.0752, 2.195, 0.794, 1.881, 0.9592, 2.0668, 0.7007, 1.774];
    const effects = averagedEffects((isNew) => corners[cornerOf(isNew)] ?? NaN, 3).map((effect) => 500 * effect);
    [548.4, -143.375, -55.625].forEach((expected, index) => expect(effects[index]).toBeCloseTo(expected, 10));
  });

  it('equals the mean over all six orders of changing one factor after the other', () => {
    const corner = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    const orders = [
      [0, 1, 2],
      [0, 2, 1],
      [1, 0, 2],
      [1, 2, 0],
      [2, 0, 1],
      [2, 1, 0],
    ];
    fc.assert(
      fc.property(fc.array(corner, { minLength: 8, maxLength: 8 }), (corners) => {
        const sums = [0, 0, 0];
        for (const order of orders) {
          let at = 0;
          for (const factor of order) {
            const next = at + 2 ** factor;
            sums[factor] = (sums[factor] ?? 0) + ((corners[next] ?? 0) - (corners[at] ?? 0)) / 6;
            at = next;
          }
        }
        const effects = averagedEffects((isNew) => corners[cornerOf(isNew)] ?? NaN, 3);
        effects.forEach((effect, factor) => expect(Math.abs(effect - (sums[factor] ?? NaN))).toBeLessThan(1e-8));
      }),
      { seed, numRuns: 200 },
    );
  });

  it.each([1, 2, 3, 4, 5, 6])('adds up to the whole change for %d factors', (count) => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -1e3, max: 1e3, noNaN: true }), { minLength: 2 ** count, maxLength: 2 ** count }),
        (corners) => {
          const effects = averagedEffects((isNew) => corners[cornerOf(isNew)] ?? NaN, count);
          const sum = effects.reduce((total, effect) => total + effect, 0);
          expect(Math.abs(sum - ((corners.at(-1) ?? NaN) - (corners[0] ?? NaN)))).toBeLessThan(1e-10);
        },
      ),
      { seed, numRuns: 50 },
    );
  });

  it('gives a factor that changes nothing no effect, and equal factors equal ones', () => {
    const [first, second, idle] = averagedEffects(
      ([one, two]) => Number(one) * 3 + Number(two) * 3 + Number(one && two),
      3,
    );
    expect([first, second, idle]).toEqual([3.5, 3.5, 0]);
  });

  it.each([0, 7, 1.5, NaN])('refuses %p factors', (count) => {
    expect(() => averagedEffects(() => 0, count)).toThrow(refusal('factor-count-invalid'));
  });

  it.each([NaN, Infinity])('refuses a corner of %p', (value) => {
    expect(() => averagedEffects(() => value, 2)).toThrow(refusal('corner-not-finite'));
  });
});
