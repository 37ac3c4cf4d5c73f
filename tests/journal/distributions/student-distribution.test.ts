import { studentCumulative } from '@/journal/distributions/student-distribution';

/** The continued fraction that jstat uses stops at 3e-7 of itself; measured against the closed forms below 1.3e-8. */
const knownAccuracy = 1.3e-8;

describe('Student distribution', () => {
  it.each([
    { t: 12.706, degrees: 1 },
    { t: 2.228, degrees: 10 },
    { t: 2.086, degrees: 20 },
    { t: 2.042, degrees: 30 },
  ])('holds 97.5 % below the printed value $t at $degrees degrees of freedom', ({ t, degrees }) => {
    expect(Math.abs(studentCumulative(t, degrees) - 0.975)).toBeLessThanOrEqual(0.00003); // the table's three decimals
  });

  it.each([-50, -8, -3, -1, -0.1, 0, 0.1, 1, 3, 8, 50])('has the closed forms of 1 and 2 degrees at t = %p', (t) => {
    expect(Math.abs(studentCumulative(t, 1) - (0.5 + Math.atan(t) / Math.PI))).toBeLessThanOrEqual(knownAccuracy);
    const two = 0.5 + t / (2 * Math.sqrt(2 + t * t));
    expect(Math.abs(studentCumulative(t, 2) - two)).toBeLessThanOrEqual(knownAccuracy);
  });

  it('covers 67.0, 94.0 and 99.26 % within 1, 2 and 3 deviations at 19 degrees of freedom', () => {
    for (const [deviations, coverage] of [
      [1, 0.67],
      [2, 0.94],
      [3, 0.9926],
    ] as const) {
      expect(Math.abs(1 - 2 * studentCumulative(-deviations, 19) - coverage)).toBeLessThanOrEqual(0.0005);
    }
  });

  it('is symmetric', () => {
    for (const t of [0.3, 1, 2.5, 7]) {
      expect(Math.abs(studentCumulative(t, 7) + studentCumulative(-t, 7) - 1)).toBeLessThanOrEqual(2.3e-16);
    }
  });

  it.each([0, -2, NaN, Infinity])('throws degrees-of-freedom-invalid for %p degrees', (degrees) => {
    expect(() => studentCumulative(1, degrees)).toThrow(
      expect.objectContaining({ code: 'degrees-of-freedom-invalid' }),
    );
  });
});
