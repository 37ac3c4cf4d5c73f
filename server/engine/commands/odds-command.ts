import { z } from 'zod';
import { DomainError } from '@/journal/errors/domain-error';
import { touchOddsAtCloses } from '@/journal/odds/monitored-at-closes';
import { oddsBeyondLevel } from '@/journal/odds/odds-beyond-level';
import { studentOddsBeyondLevel } from '@/journal/odds/student-odds';
import { touchFirstOdds } from '@/journal/odds/touch-first-odds';
import { touchOdds } from '@/journal/odds/touch-odds';
import { engineCommand } from '@/server/engine/commands/engine-command';

const oddsCaseSchema = z.strictObject({
  spot: z.number(),
  level: z.number(),
  dailyVolatility: z.number(),
  sessions: z.number(),
  /** Of the log price. */
  driftPerSession: z.number(),
  /** On the other side of the spot: which of the two is touched first. */
  otherLevel: z.number().optional(),
  /** Evenly spaced looks, the last at the end: the odds of a touch that is seen at them. */
  closes: z.int().optional(),
  /** Returns the volatility was estimated from: the odds by Student's distribution beside the normal ones. */
  returns: z.int().optional(),
});

/** Odds of finishing above and below a level, and of touching it on the way. */
export const oddsCommand = engineCommand(oddsCaseSchema, (one) => {
  const { spot, level, dailyVolatility, sessions, driftPerSession, otherLevel, closes, returns } = one;
  if (!(sessions >= 0)) throw new DomainError('sessions-invalid', { sessions });
  const law = {
    spotPrice: spot,
    totalDeviation: dailyVolatility * Math.sqrt(sessions),
    logDrift: driftPerSession * sessions,
  };
  const question = { ...law, level };
  const first = otherLevel === undefined ? null : firstOf(law, level, otherLevel);
  return {
    ...oddsBeyondLevel(question),
    touch: touchOdds(question),
    ...(first === null ? {} : { touchFirst: first }),
    ...(closes === undefined ? {} : { touchAtCloses: touchOddsAtCloses({ ...question, closes }) }),
    ...(returns === undefined ? {} : { student: studentOddsBeyondLevel({ ...question, returns }) }),
  };
});

function firstOf(
  law: { spotPrice: number; totalDeviation: number; logDrift: number },
  level: number,
  otherLevel: number,
): { level: number; otherLevel: number; neither: number } {
  const [lowerLevel, upperLevel] = level < otherLevel ? [level, otherLevel] : [otherLevel, level];
  const { upperFirst, lowerFirst, neither } = touchFirstOdds({ ...law, lowerLevel, upperLevel });
  return level < otherLevel
    ? { level: lowerFirst, otherLevel: upperFirst, neither }
    : { level: upperFirst, otherLevel: lowerFirst, neither };
}
