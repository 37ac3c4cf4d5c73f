import { type ExchangeCalendar, type ExchangeSession, nextSession } from '@/journal/sessions/exchange-calendar';
import { instantMilliseconds } from '@/journal/sessions/instant';
import {
  type ClockSettings,
  instantWithRemaining,
  sessionEndingAfter,
  sessionsBetween,
} from '@/journal/sessions/session-clock';

const ROUNDING = 1e-9;

/**
 * The moment a number of sessions after another on the session clock.
 * @param question.sessions above 0, fractions allowed. Whole sessions from a close end on a close; what falls in a night
 *   ends at the open, where the night is spent.
 * @throws {DomainError} as the clock's own functions.
 */
export function exitInstant(question: {
  readonly calendar: ExchangeCalendar;
  readonly from: string;
  readonly sessions: number;
  readonly settings: ClockSettings;
}): { readonly at: string; readonly session: ExchangeSession } {
  const { calendar, from, settings } = question;
  let session = sessionEndingAfter(calendar, instantMilliseconds(from));
  let start = from;
  let left = question.sessions;
  for (;;) {
    const inSession = sessionsBetween({ calendar, from: start, to: session.closesAt, settings });
    if (left <= inSession + ROUNDING) {
      const remaining = inSession - left;
      const at = remaining <= ROUNDING ? session.closesAt : instantWithRemaining(session, remaining, settings);
      return { at, session };
    }
    left -= inSession;
    start = session.closesAt;
    session = nextSession(calendar, session.date);
  }
}
