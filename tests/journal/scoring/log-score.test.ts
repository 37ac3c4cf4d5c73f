import {
  clippedLogScore,
  logScore,
  logScoreFloor,
  meanClippedLogScore,
  meanLogScore,
} from '@/journal/scoring/log-score';

describe('logScore', () => {
  it('is 2.303 for an event that was given 10 %, and 4.605 for one given 1 %', () => {
    expect(logScore(0.1, true)).toBeCloseTo(2.303, 3);
    expect(logScore(0.01, true)).toBeCloseTo(4.605, 3);
  });

  it('is 0 for certainty that came right', () => {
    expect(logScore(1, true)).toBe(0);
    expect(logScore(0, false)).toBe(0);
  });

  it('is infinite for certainty that came wrong', () => {
    expect(logScore(0, true)).toBe(Infinity);
    expect(logScore(1, false)).toBe(Infinity);
  });

  it('keeps the digits of a tiny forecast that came right', () => {
    expect(logScore(1e-20, false)).toBe(1e-20);
  });

  it('refuses a probability outside 0 to 1', () => {
    expect(() => logScore(NaN, true)).toThrow(expect.objectContaining({ code: 'probability-invalid' }));
  });
});

describe('clippedLogScore', () => {
  it('clips and says so below the floor, and leaves the floor itself', () => {
    const worst = -Math.log(logScoreFloor);
    expect(clippedLogScore(0, true)).toEqual({ score: worst, isClipped: true });
    expect(clippedLogScore(1, false)).toEqual({ score: worst, isClipped: true });
    expect(clippedLogScore(logScoreFloor, true)).toEqual({ score: worst, isClipped: false });
    expect(clippedLogScore(0.3, true)).toEqual({ score: logScore(0.3, true), isClipped: false });
  });
});

describe('mean log scores', () => {
  const forecasts = [0.25, 0.25, 0.25, 0.25, 0.75, 0.75, 0.75, 0.75, 0.75, 0.75];
  const outcomes = [true, false, false, false, true, true, true, true, false, false];

  it('are 0.6173 for 0.25 four times with one hit and 0.75 six times with four', () => {
    expect(meanLogScore(forecasts, outcomes)).toBeCloseTo(0.6173, 4);
    expect(meanClippedLogScore(forecasts, outcomes)).toEqual({
      score: meanLogScore(forecasts, outcomes),
      clippedCount: 0,
    });
  });

  it('stay finite and count what was clipped only in the clipped form', () => {
    expect(meanLogScore([0, 0.5], [true, true])).toBe(Infinity);
    const { score, clippedCount } = meanClippedLogScore([0, 0.5], [true, true]);
    expect(score).toBeCloseTo((-Math.log(logScoreFloor) + Math.LN2) / 2, 14);
    expect(clippedCount).toBe(1);
  });
});
