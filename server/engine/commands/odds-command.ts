import { z } from 'zod';
import { DomainError } from '@/journal/errors/domain-error';
import { oddsBeyondLevel } from '@/journal/odds/odds-beyond-level';
import { touchOdds } from '@/journal/odds/touch-odds';
import { engineCommand } from '@/server/engine/commands/engine-command';

const oddsCaseSchema = z.strictObject({
  spot: z.number(),
  level: z.number(),
  dailyVolatility: z.number(),
  sessions: z.number(),
  /** Of the log price. */
  driftPerSession: z.number(),
});

/** Odds of finishing above and below a level, and of touching it on the way. */
export const oddsCommand = engineCommand(oddsCaseSchema, (one) => {
  const { spot, level, dailyVolatility, sessions, driftPerSession } = one;
  if (!(sessions >= 0)) throw new DomainError('sessions-invalid', { sessions });
  const question = {
    spotPrice: spot,
    level,
    totalDeviation: dailyVolatility * Math.sqrt(sessions),
    logDrift: driftPerSession * sessions,
  };
  return { ...oddsBeyondLevel(question), touch: touchOdds(question) };
});
