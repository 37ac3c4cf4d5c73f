import { sampleSizeRule } from '@/journal/scoring/sample-size-rule';
import { forecastScores, scoringSummary } from '@/journal/scoring/scoring-summary';

const alternating = (count: number) => ({
  forecasts: Array.from({ length: count }, (_, index) => (index % 4 === 0 ? 0.25 : 0.75)),
  outcomes: Array.from({ length: count }, (_, index) => index % 3 !== 0),
});

describe('sampleSizeRule', () => {
  it.each([
    [0, 'list-only'],
    [19, 'list-only'],
    [20, 'provisional'],
    [50, 'provisional'],
    [51, 'shown'],
  ])('of %d cases is %s', (count, rule) => {
    expect(sampleSizeRule(count)).toBe(rule);
  });

  it.each([-1, 1.5, NaN, Infinity])('refuses a count of %p', (count) => {
    expect(() => sampleSizeRule(count)).toThrow(expect.objectContaining({ code: 'count-invalid' }));
  });
});

describe('scoringSummary', () => {
  it('has no rates below 20 cases, and none for no cases', () => {
    const { forecasts, outcomes } = alternating(19);
    expect(scoringSummary(forecasts, outcomes)).toEqual({ count: 19, sampleRule: 'list-only', scores: null });
    expect(scoringSummary([], [])).toEqual({ count: 0, sampleRule: 'list-only', scores: null });
  });

  it('has all scores from 20 cases on', () => {
    const { forecasts, outcomes } = alternating(20);
    const summary = scoringSummary(forecasts, outcomes);
    expect(summary.sampleRule).toBe('provisional');
    expect(summary.scores).toEqual(forecastScores(forecasts, outcomes));
  });
});

describe('forecastScores', () => {
  it('puts the scores of one set together', () => {
    const forecasts = [0.25, 0.25, 0.25, 0.25, 0.75, 0.75, 0.75, 0.75, 0.75, 0.75];
    const outcomes = [true, false, false, false, true, true, true, true, false, false];
    const scores = forecastScores(forecasts, outcomes);
    expect(scores.meanBrierScore).toBeCloseTo(0.2125, 14);
    expect(scores.meanLogScore).toBeCloseTo(0.6173, 4);
    expect(scores.skill).toBeCloseTo(0.15, 14);
    expect(scores.baseRate).toBe(0.5);
    expect(scores.clippedCount).toBe(0);
    expect(scores.curve.points.map(({ count }) => count)).toEqual([4, 6]);
  });

  it('has no skill to speak of when everything happened', () => {
    expect(forecastScores([0.9, 0.8], [true, true]).skill).toBeNull();
  });
});
