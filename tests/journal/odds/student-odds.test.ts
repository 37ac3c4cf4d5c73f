import { oddsByDrift } from '@/journal/odds/odds-by-drift';
import { oddsBeyondLevel } from '@/journal/odds/odds-beyond-level';
import { studentBandCoverage, studentOddsBeyondLevel } from '@/journal/odds/student-odds';
import { touchOdds } from '@/journal/odds/touch-odds';
import { tenSessions } from '@/tests/journal/odds/level-questions';

describe('odds with an estimated volatility', () => {
  it.each([
    [1, 0.67, 3],
    [2, 0.94, 3],
    [3, 0.9926, 4],
  ])('covers the worked share within %d deviations of 20 returns', (deviations, share, digits) => {
    expect(studentBandCoverage({ deviations, returns: 20 })).toBeCloseTo(share, digits);
  });

  it('has fatter tails than the normal odds and comes to them with many returns', () => {
    const question = { spotPrice: 100, level: 110, totalDeviation: 0.04, logDrift: 0 };
    const normal = oddsBeyondLevel(question).above;
    const few = studentOddsBeyondLevel({ ...question, returns: 20 });
    expect(few.above).toBeGreaterThan(normal);
    expect(few.above + few.below).toBeCloseTo(1, 14);
    expect(studentOddsBeyondLevel({ ...question, returns: 1e6 }).above).toBeCloseTo(normal, 6);
  });

  it.each([1, 1.5, NaN, Infinity])('refuses %d returns', (returns) => {
    expect(() => studentBandCoverage({ deviations: 1, returns })).toThrow(
      expect.objectContaining({ code: 'returns-count-invalid' }),
    );
  });
});

describe('odds under the three drifts', () => {
  it('has the worked odds of the ten sessions, at low, base and high volatility', () => {
    const setting = { ...tenSessions, volatility: { low: 0.0114, base: 0.015, high: 0.0219 }, ownView: 0.001 };
    const odds = oddsByDrift(setting, (law) => oddsBeyondLevel({ spotPrice: 100, level: 102, ...law }).above);
    expect(odds.riskNeutral.base).toBeCloseTo(0.3413, 4);
    expect(odds.zeroReturn.low).toBeCloseTo(0.285, 3);
    expect(odds.zeroReturn.base).toBeCloseTo(0.3295, 4);
    expect(odds.zeroReturn.high).toBeCloseTo(0.374, 3);
    expect(odds.ownView?.base).toBeGreaterThan(odds.zeroReturn.base);
    expect(oddsByDrift({ ...setting, ownView: null }, () => 0).ownView).toBeNull();
  });

  it('has 65.1 % for touching the strike of the same-day index call', () => {
    const setting = {
      ...tenSessions,
      sessions: 0.3769,
      volatility: { low: 0.008, base: 0.009, high: 0.01 },
      ownView: null,
    };
    const touch = oddsByDrift(setting, (law) => touchOdds({ spotPrice: 4000, level: 4010, ...law }));
    expect(touch.zeroReturn.base).toBeCloseTo(0.651, 3);
    const inTheMoney = oddsByDrift(setting, (law) => oddsBeyondLevel({ spotPrice: 4000, level: 4010, ...law }).above);
    expect(inTheMoney.zeroReturn.base).toBeCloseTo(0.325, 3);
  });
});
