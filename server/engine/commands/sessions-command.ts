import { z } from 'zod';
import { DomainError } from '@/journal/errors/domain-error';
import { countSessions } from '@/journal/sessions/exchange-calendar';
import { sessionsBetween } from '@/journal/sessions/session-clock';
import { uShapedProfile } from '@/journal/sessions/intraday-profile';
import { isSessionDate } from '@/journal/sessions/session-date';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { defaultOvernightShare } from '@/journal/volatility/overnight-share';
import { engineCommand } from '@/server/engine/commands/engine-command';

const sessionsCaseSchema = z.strictObject({
  from: z.string(),
  to: z.string(),
  overnightShare: z.number().default(defaultOvernightShare),
  /** How much more the night over a weekend or holiday counts than another, 1 to 10. */
  weekendNightWeight: z.number().default(1),
  intradayProfile: z.enum(['flat', 'uShaped']).default('flat'),
});

/** Sessions after one date through another, or the session clock between two instants. */
export const sessionsCommand = engineCommand(sessionsCaseSchema, (one) => {
  const { from, to, overnightShare, weekendNightWeight } = one;
  if (isSessionDate(from) && isSessionDate(to)) {
    return { sessions: countSessions(usOptionsCalendar, { after: from, through: to }) };
  }
  if (isSessionDate(from) || isSessionDate(to)) throw new DomainError('date-and-instant-mixed', { from, to });
  const settings = {
    overnightShare,
    weekendNightWeight,
    ...(one.intradayProfile === 'uShaped' ? { intradayProfile: uShapedProfile } : {}),
  };
  return { sessions: sessionsBetween({ calendar: usOptionsCalendar, from, to, settings }) };
});
