import * as fc from 'fast-check';
import { brierScore, brierSkill, meanBrierScore } from '@/journal/scoring/brier-score';

const seed = 20261201;

describe('brierScore', () => {
  it.each([
    [0.325, true, 0.455625],
    [0.203, false, 0.041209],
    [0.5, true, 0.25],
    [1, true, 0],
    [0, true, 1],
  ])('of %d when the event came %p is %d', (forecast, outcome, score) => {
    expect(brierScore(forecast, outcome)).toBeCloseTo(score, 15);
  });

  it('takes 1 and 0 for true and false', () => {
    expect(brierScore(0.3, 1)).toBe(brierScore(0.3, true));
    expect(brierScore(0.3, 0)).toBe(brierScore(0.3, false));
  });

  it('is in expectation least when the forecast is the true probability (property)', () => {
    const probability = fc.double({ min: 0, max: 1, noNaN: true });
    fc.assert(
      fc.property(probability, probability, (truth, forecast) => {
        const expected = (said: number) => truth * brierScore(said, true) + (1 - truth) * brierScore(said, false);
        expect(expected(forecast)).toBeGreaterThanOrEqual(expected(truth) - 1e-15);
      }),
      { seed, numRuns: 300 },
    );
  });

  it.each([-0.01, 1.01, NaN, Infinity])('refuses a probability of %p', (forecast) => {
    expect(() => brierScore(forecast, true)).toThrow(expect.objectContaining({ code: 'probability-invalid' }));
  });

  it('refuses an outcome that is neither', () => {
    // @ts-expect-error what arrives without types must be refused too
    expect(() => brierScore(0.5, 0.5)).toThrow(expect.objectContaining({ code: 'outcome-invalid' }));
    // @ts-expect-error the same
    expect(() => brierScore(0.5, undefined)).toThrow(expect.objectContaining({ code: 'outcome-invalid' }));
    // @ts-expect-error the same, and null must not pass for 0
    expect(() => brierScore(0.5, null)).toThrow(expect.objectContaining({ code: 'outcome-invalid' }));
  });
});

describe('meanBrierScore', () => {
  it('is 0.2125 for 0.25 four times with one hit and 0.75 six times with four', () => {
    const forecasts = [0.25, 0.25, 0.25, 0.25, 0.75, 0.75, 0.75, 0.75, 0.75, 0.75];
    const outcomes = [true, false, false, false, true, true, true, true, false, false];
    expect(meanBrierScore(forecasts, outcomes)).toBeCloseTo(0.2125, 15);
  });

  it('refuses no forecasts, and another number of outcomes', () => {
    expect(() => meanBrierScore([], [])).toThrow(expect.objectContaining({ code: 'forecasts-missing' }));
    expect(() => meanBrierScore([0.5], [])).toThrow(expect.objectContaining({ code: 'outcomes-not-matching' }));
  });

  it('names the index of a bad forecast', () => {
    expect(() => meanBrierScore([0.5, 2], [true, true])).toThrow(
      expect.objectContaining({ code: 'probability-invalid', details: { index: 1, probability: 2 } }),
    );
  });
});

describe('brierSkill', () => {
  it('is the share of the reference’s score that is saved', () => {
    expect(brierSkill({ score: 0.2125, referenceScore: 0.25 })).toBeCloseTo(0.15, 15);
    expect(brierSkill({ score: 0.3, referenceScore: 0.25 })).toBeCloseTo(-0.2, 15);
  });

  it('is unknown against a perfect reference', () => {
    expect(brierSkill({ score: 0, referenceScore: 0 })).toBeNull();
  });

  it.each([-0.1, NaN, Infinity])('refuses a score of %p', (score) => {
    expect(() => brierSkill({ score, referenceScore: 0.25 })).toThrow(
      expect.objectContaining({ code: 'score-invalid' }),
    );
    expect(() => brierSkill({ score: 0.25, referenceScore: score })).toThrow(
      expect.objectContaining({ code: 'score-invalid' }),
    );
  });
});
