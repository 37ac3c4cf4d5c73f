import { type ExchangeCalendar, type ExchangeSession, nextSession } from '@/journal/sessions/exchange-calendar';
import { instantMilliseconds, instantOfMilliseconds } from '@/journal/sessions/instant';
import {
  type ClockSettings,
  FULL_SESSION_MINUTES,
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
    if (left <= inSession + ROUNDING) return { at: within(session, inSession - left, settings), session };
    left -= inSession;
    start = session.closesAt;
    session = nextSession(calendar, session.date);
  }
}

/** The instant at which this much of a session's variance is still to come. */
function within(session: ExchangeSession, remaining: number, { overnightShare }: ClockSettings): string {
  if (remaining <= ROUNDING) return session.closesAt;
  const minutesLeft = (remaining / (1 - overnightShare)) * FULL_SESSION_MINUTES;
  const milliseconds = instantMilliseconds(session.closesAt) - minutesLeft * 60_000;
  return instantOfMilliseconds(Math.max(instantMilliseconds(session.opensAt), Math.round(milliseconds)));
}
