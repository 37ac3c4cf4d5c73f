import { type CalibrationBin } from '@/journal/scoring/calibration-curve';
import { scoreSentence } from '@/server/scores/score-sentence';

const bin = (changes: Partial<CalibrationBin>): CalibrationBin => ({
  forecast: 0.7,
  observed: 0.7,
  count: 40,
  low: 0.55,
  high: 0.82,
  consistentLow: 0.58,
  consistentHigh: 0.82,
  ...changes,
});
const own = { count: 80, whose: 'own', isSpoken: true } as const;

describe('the sentence over the scores', () => {
  it('says that a level lies within chance', () => {
    expect(scoreSentence([bin({ observed: 0.62 })], own)).toBe(
      'Your 70% calls came in 62% of the time over 40 cases: within what chance allows (55% to 82%).',
    );
  });

  it('says by how much a level was too sure, and not sure enough', () => {
    expect(scoreSentence([bin({ observed: 0.5, low: 0.35, high: 0.65 })], own)).toContain(
      'too sure by about 20 points',
    );
    expect(scoreSentence([bin({ observed: 0.95, low: 0.83, high: 0.99 })], own)).toContain(
      'not sure enough by about 25 points',
    );
  });

  it('speaks of the level that lies farthest out, and of none with fewer than ten cases', () => {
    const far = bin({ forecast: 0.3, observed: 0.55, low: 0.4, high: 0.7 });
    expect(scoreSentence([bin({}), far], own)).toContain('30% calls');
    expect(scoreSentence([bin({}), { ...far, count: 9 }], own)).toContain('70% calls');
    expect(scoreSentence([bin({ count: 9 })], own)).toBe(
      '80 odds are scored; no level of odds has enough cases to speak of yet.',
    );
  });

  it('tells a mentor whose calls they are', () => {
    expect(scoreSentence([bin({})], { ...own, whose: 'mentored' })).toMatch(/^Their 70% calls/);
  });
});
