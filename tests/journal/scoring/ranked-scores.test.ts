import { studentCumulative } from '@/journal/distributions/student-distribution';
import { normalRankedScore } from '@/journal/scoring/normal-ranked-score';
import { sampleRankedScore } from '@/journal/scoring/sample-ranked-score';
import { studentRankedScore } from '@/journal/scoring/student-ranked-score';

describe('ranked score of a Student forecast', () => {
  it.each([
    [3, 0.4],
    [5, -2.5],
    [12, 6],
  ])('is the integral of the squared distance of the distributions (%s degrees, outcome %s)', (degrees, outcome) => {
    // Trapezia of u with x = sinh u, in two parts that meet at the outcome; the far tails fall as a power.
    const area = (from: number, to: number, valueAt: (x: number) => number) => {
      const steps = 20_000;
      let sum = 0;
      for (let step = 0; step <= steps; step += 1) {
        const u = from + ((to - from) * step) / steps;
        sum += valueAt(Math.sinh(u)) ** 2 * Math.cosh(u) * (step === 0 || step === steps ? 0.5 : 1);
      }
      return (sum * (to - from)) / steps;
    };
    const at = Math.asinh(outcome);
    const integral =
      area(-14, at, (x) => studentCumulative(x, degrees)) + area(at, 14, (x) => studentCumulative(-x, degrees));
    const score = studentRankedScore({ location: 0, scale: 1, degreesOfFreedom: degrees, observed: outcome });
    expect(score).toBeCloseTo(integral, 6);
    const moved = studentRankedScore({ location: 3, scale: 2, degreesOfFreedom: degrees, observed: 3 + 2 * outcome });
    expect(moved).toBeCloseTo(2 * score, 10);
  });

  it('comes to that of the normal law with many degrees', () => {
    const normal = normalRankedScore({ mean: 0, standardDeviation: 1, observed: 0.7 });
    expect(studentRankedScore({ location: 0, scale: 1, degreesOfFreedom: 1e5, observed: 0.7 })).toBeCloseTo(normal, 4);
  });

  it.each([
    { location: Number.NaN, scale: 1, degreesOfFreedom: 5, observed: 0 },
    { location: 0, scale: 0, degreesOfFreedom: 5, observed: 0 },
    { location: 0, scale: 1, degreesOfFreedom: 1, observed: 0 },
    { location: 0, scale: 1, degreesOfFreedom: 5, observed: Infinity },
  ])('refuses %o', (forecast) => {
    expect(() => studentRankedScore(forecast)).toThrow('student-forecast-invalid');
  });
});

describe('ranked score of a sample', () => {
  it('is the distance to the outcome less half the mean distance within the sample', () => {
    expect(sampleRankedScore([3], 5)).toBe(2);
    // Pairs of 1, 2, 4: mean distance (1 + 3 + 2) · 2 / 9; to the outcome 3: (2 + 1 + 1) / 3.
    expect(sampleRankedScore([4, 1, 2], 3)).toBeCloseTo(4 / 3 - 6 / 9, 12);
  });

  it.each([
    ['too-few-values', [], 0],
    ['value-invalid', [1, Number.NaN], 0],
    ['value-invalid', [1], Infinity],
  ] as const)('throws %s', (code, sample, observed) => {
    expect(() => sampleRankedScore(sample, observed)).toThrow(code);
  });
});
