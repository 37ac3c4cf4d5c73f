import fc from 'fast-check';
import { logDrift } from '@/journal/odds/log-drift';
import { oddsBeyondLevel } from '@/journal/odds/odds-beyond-level';
import { touchOdds } from '@/journal/odds/touch-odds';
import { levelQuestion, tenSessions } from '@/tests/journal/odds/level-questions';

fc.configureGlobal({ seed: 20261201 });

const plan = { spotPrice: 100, level: 102, totalDeviation: Math.sqrt(tenSessions.totalVariance), logDrift: 0 };

describe('touch odds', () => {
  it('has the worked odds of touching 102 in ten sessions', () => {
    expect(touchOdds(plan)).toBeCloseTo(0.6763, 4);
    const zeroReturn = logDrift({ drift: { kind: 'zeroReturn' }, ...tenSessions });
    expect(touchOdds({ ...plan, logDrift: zeroReturn })).toBeCloseTo(0.6696, 4);
  });

  it('is twice the odds of finishing beyond the level without log drift', () => {
    fc.assert(
      fc.property(levelQuestion, (question) => {
        const driftless = { ...question, logDrift: 0 };
        const { above, below } = oddsBeyondLevel(driftless);
        const beyond = question.level > question.spotPrice ? above : below;
        expect(Math.abs(touchOdds(driftless) / (2 * beyond) - 1)).toBeLessThanOrEqual(1e-14);
      }),
    );
  });

  it('is the same for a level as far below, against the opposite drift', () => {
    fc.assert(
      fc.property(levelQuestion, (question) => {
        const mirrored = {
          ...question,
          level: (question.spotPrice * question.spotPrice) / question.level,
          logDrift: -question.logDrift,
        };
        // The mirrored level is rounded; one rounding of it counts up to 6 deviations over the deviation.
        const rounding = (2.3e-16 * 20) / question.totalDeviation;
        expect(Math.abs(touchOdds(mirrored) / touchOdds(question) - 1)).toBeLessThanOrEqual(rounding + 1e-14);
      }),
    );
  });

  it('lies between the odds of finishing beyond and 1', () => {
    fc.assert(
      fc.property(levelQuestion, (question) => {
        const { above, below } = oddsBeyondLevel(question);
        const odds = touchOdds(question);
        expect(odds).toBeGreaterThanOrEqual(question.level > question.spotPrice ? above : below);
        expect(odds).toBeLessThanOrEqual(1);
      }),
    );
  });

  it('rises with more time at the same drift per time', () => {
    fc.assert(
      fc.property(levelQuestion, fc.double({ min: 1.01, max: 4, noNaN: true }), (question, factor) => {
        const longer = {
          ...question,
          totalDeviation: question.totalDeviation * Math.sqrt(factor),
          logDrift: question.logDrift * factor,
        };
        expect(touchOdds(longer)).toBeGreaterThanOrEqual(touchOdds(question) * (1 - 1e-14));
      }),
    );
  });

  it.each([
    { logDrift: 30, certain: true },
    { logDrift: -30, certain: false },
  ])(
    'neither overflows nor returns NaN under a drift of $logDrift at little deviation',
    ({ logDrift: drift, certain }) => {
      const odds = touchOdds({ spotPrice: 100, level: 150, totalDeviation: 0.001, logDrift: drift });
      expect(odds).toBe(certain ? 1 : 0);
    },
  );

  it('is 1 at the spot itself and decided by the drift without variance', () => {
    expect(touchOdds({ ...plan, level: 100 })).toBe(1);
    expect(touchOdds({ ...plan, totalDeviation: 0, logDrift: 0.02 })).toBe(1);
    expect(touchOdds({ ...plan, totalDeviation: 0, logDrift: 0.01 })).toBe(0);
  });

  it.each([{ spotPrice: NaN }, { level: 0 }, { totalDeviation: -1 }, { logDrift: Infinity }])(
    'throws level-question-invalid for %j',
    (change) => {
      expect(() => touchOdds({ ...plan, ...change })).toThrow(
        expect.objectContaining({ code: 'level-question-invalid' }),
      );
    },
  );
});
