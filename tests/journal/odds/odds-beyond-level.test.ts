import fc from 'fast-check';
import { logDrift } from '@/journal/odds/log-drift';
import { oddsBeyondLevel } from '@/journal/odds/odds-beyond-level';
import { europeanOptionValue } from '@/journal/pricing/european-option';
import { levelQuestion, tenSessions } from '@/tests/journal/odds/level-questions';

fc.configureGlobal({ seed: 20261201 });

const totalDeviation = Math.sqrt(tenSessions.totalVariance);

describe('odds beyond a level', () => {
  it.each([
    {
      name: 'risk-neutral',
      logMean: logDrift({ drift: { kind: 'riskNeutral' }, ...tenSessions }),
      itm: 0.3413,
      profit: 0.2561,
    },
    {
      name: 'zero return',
      logMean: logDrift({ drift: { kind: 'zeroReturn' }, ...tenSessions }),
      itm: 0.3295,
      profit: 0.2458,
    },
    { name: 'the median at the spot', logMean: 0, itm: 0.3382, profit: null },
  ])('has the worked odds of 102 and of the break-even under $name', ({ logMean, itm, profit }) => {
    const question = { spotPrice: 100, totalDeviation, logDrift: logMean };
    expect(oddsBeyondLevel({ ...question, level: 102 }).above).toBeCloseTo(itm, 4);
    if (profit !== null) expect(oddsBeyondLevel({ ...question, level: 103.2 }).above).toBeCloseTo(profit, 4);
  });

  it('is the chance in the money that pricing uses under the risk-neutral drift', () => {
    const option = { type: 'call', spotPrice: 100, strikePrice: 102, dailyVolatility: 0.015, ...tenSessions } as const;
    const { above } = oddsBeyondLevel({
      spotPrice: 100,
      level: 102,
      totalDeviation,
      logDrift: logDrift({ drift: { kind: 'riskNeutral' }, ...tenSessions }),
    });
    expect(Math.abs(above - europeanOptionValue(option).oddsInTheMoney)).toBeLessThanOrEqual(1e-15);
  });

  it('splits certainty between above and below', () => {
    fc.assert(
      fc.property(levelQuestion, (question) => {
        const { above, below } = oddsBeyondLevel(question);
        expect(Math.abs(above + below - 1)).toBeLessThanOrEqual(2.3e-16);
      }),
    );
  });

  it('falls as the level rises', () => {
    fc.assert(
      fc.property(levelQuestion, fc.double({ min: 1.01, max: 2, noNaN: true }), (question, factor) => {
        const higher = oddsBeyondLevel({ ...question, level: question.level * factor });
        expect(higher.above).toBeLessThanOrEqual(oddsBeyondLevel(question).above);
      }),
    );
  });

  it('keeps its digits fifteen deviations out', () => {
    const question = { spotPrice: 100, level: 100 * Math.exp(0.15), totalDeviation: 0.01, logDrift: 0 };
    const tail = 3.6709661993127e-51; // P(Z > 15) to 14 digits
    expect(Math.abs(oddsBeyondLevel(question).above / tail - 1)).toBeLessThanOrEqual(1e-12);
  });

  it('lets the drift decide without variance, and neither side at the level itself', () => {
    const still = { spotPrice: 100, totalDeviation: 0 };
    expect(oddsBeyondLevel({ ...still, level: 101, logDrift: 0.02 })).toEqual({ above: 1, below: 0 });
    expect(oddsBeyondLevel({ ...still, level: 101, logDrift: 0 })).toEqual({ above: 0, below: 1 });
    expect(oddsBeyondLevel({ ...still, level: 100, logDrift: 0 })).toEqual({ above: 0, below: 0 });
  });

  it.each([
    { spotPrice: 0 },
    { spotPrice: NaN },
    { level: -1 },
    { level: Infinity },
    { totalDeviation: -0.1 },
    { totalDeviation: NaN },
    { logDrift: NaN },
  ])('throws level-question-invalid for %j', (change) => {
    const question = { spotPrice: 100, level: 102, totalDeviation: 0.05, logDrift: 0, ...change };
    expect(() => oddsBeyondLevel(question)).toThrow(expect.objectContaining({ code: 'level-question-invalid' }));
  });
});
