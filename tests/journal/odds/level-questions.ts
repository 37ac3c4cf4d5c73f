import fc from 'fast-check';
import { type LevelQuestion } from '@/journal/odds/level-question';

/** Levels within six deviations, with drifts up to two deviations either way. */
export const levelQuestion: fc.Arbitrary<LevelQuestion> = fc
  .record({
    spotPrice: fc.double({ min: 1, max: 5000, noNaN: true }),
    totalDeviation: fc.double({ min: 0.0005, max: 1.5, noNaN: true }),
    levelInDeviations: fc.double({ min: -6, max: 6, noNaN: true }),
    driftInDeviations: fc.double({ min: -2, max: 2, noNaN: true }),
  })
  .map(({ spotPrice, totalDeviation, levelInDeviations, driftInDeviations }) => ({
    spotPrice,
    totalDeviation,
    level: spotPrice * Math.exp(levelInDeviations * totalDeviation),
    logDrift: driftInDeviations * totalDeviation,
  }));

/** The hold of ten sessions at 1.5 % a session that the worked values are about. */
export const tenSessions = {
  totalVariance: 0.00225,
  sessions: 10,
  years: 14 / 365,
  ratePerYear: 0.04,
  dividendYield: 0,
};
