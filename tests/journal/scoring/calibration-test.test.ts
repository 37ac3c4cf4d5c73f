import { countAgainstForecast, spiegelhalterTest } from '@/journal/scoring/calibration-test';

const forecasts = [0.25, 0.25, 0.25, 0.25, 0.75, 0.75, 0.75, 0.75, 0.75, 0.75];
const outcomes = [true, false, false, false, true, true, true, true, false, false];

describe('countAgainstForecast', () => {
  it('compares 5 events with 5.5 expected: z -0.37', () => {
    const { expected, observed, z } = countAgainstForecast(forecasts, outcomes);
    expect([expected, observed]).toEqual([5.5, 5]);
    expect(z).toBeCloseTo(-0.37, 2);
  });

  it('compares a week of twelve, 7 with 6.0: z 0.61', () => {
    const week = [0.3, 0.3, 0.3, 0.3, 0.5, 0.5, 0.5, 0.5, 0.7, 0.7, 0.7, 0.7];
    const { z } = countAgainstForecast(week, [1, 1, 0, 0, 1, 1, 0, 0, 1, 1, 1, 0]);
    expect(z).toBeCloseTo(0.61, 2);
  });

  it('has no z when every forecast was certain', () => {
    expect(countAgainstForecast([0, 1], [true, true])).toEqual({ expected: 1, observed: 2, z: null });
  });
});

describe('spiegelhalterTest', () => {
  it('gives z 0.365', () => {
    const test = spiegelhalterTest(forecasts, outcomes);
    expect(test?.z).toBeCloseTo(0.365, 3);
    expect(test?.pValue).toBeCloseTo(0.715, 3);
  });

  it('cannot judge forecasts of 0, 0.5 and 1', () => {
    expect(spiegelhalterTest([0, 0.5, 1], [false, true, true])).toBeNull();
  });

  it('refuses no forecasts', () => {
    expect(() => spiegelhalterTest([], [])).toThrow(expect.objectContaining({ code: 'forecasts-missing' }));
  });
});
