import { DomainError } from '@/journal/errors/domain-error';
import { addDays, dateOf, dayNumber, type SessionDate, weekdayOfDay } from '@/journal/sessions/session-date';

/** One trading day. */
export interface ExchangeSession {
  readonly date: SessionDate;
  readonly kind: 'full' | 'early';
  /** UTC instants, ISO 8601 with milliseconds. */
  readonly opensAt: string;
  readonly closesAt: string;
  readonly minutes: number;
}

/** The days and hours of an exchange. */
export interface ExchangeCalendar {
  readonly id: string;
  readonly name: string;
  readonly timeZone: string;
  /** The session of a date, or null when the exchange is closed. */
  readonly sessionOn: (date: SessionDate) => ExchangeSession | null;
  /** Why the exchange is closed that day, or null when it is not. */
  readonly closureReason: (date: SessionDate) => string | null;
}

/** No run of closed days is longer; a search that passes it has left the calendar. */
const LONGEST_CLOSURE_DAYS = 30;

/**
 * The first session after a date.
 * @throws {DomainError} `outside-calendar`.
 */
export function nextSession(calendar: ExchangeCalendar, date: SessionDate): ExchangeSession {
  return search(calendar, date, 1);
}

/** The last session before a date. @throws {DomainError} `outside-calendar`. */
export function previousSession(calendar: ExchangeCalendar, date: SessionDate): ExchangeSession {
  return search(calendar, date, -1);
}

/** The session of a date, else the last one before it. @throws {DomainError} `outside-calendar`. */
export function sessionOnOrBefore(calendar: ExchangeCalendar, date: SessionDate): ExchangeSession {
  return calendar.sessionOn(date) ?? previousSession(calendar, date);
}

function search(calendar: ExchangeCalendar, date: SessionDate, step: 1 | -1): ExchangeSession {
  for (let days = 1; days <= LONGEST_CLOSURE_DAYS; days += 1) {
    const session = calendar.sessionOn(addDays(date, step * days));
    if (session !== null) return session;
  }
  throw new DomainError('outside-calendar', { date });
}

/**
 * The session a number of sessions after a date.
 * @param sessions whole, 0 or more; 0 gives the date's own session, or the last one before it.
 * @throws {DomainError} `session-count-invalid`, `outside-calendar`.
 */
export function addSessions(calendar: ExchangeCalendar, date: SessionDate, sessions: number): ExchangeSession {
  if (!(Number.isInteger(sessions) && sessions >= 0)) throw new DomainError('session-count-invalid', { sessions });
  let session = sessionOnOrBefore(calendar, date);
  for (let count = 0; count < sessions; count += 1) session = nextSession(calendar, session.date);
  return session;
}

/** Sessions from one date through another, both included, oldest first. */
export function sessionsInRange(
  calendar: ExchangeCalendar,
  { from, through }: { readonly from: SessionDate; readonly through: SessionDate },
): ExchangeSession[] {
  const sessions: ExchangeSession[] = [];
  const last = dayNumber(through);
  for (let day = dayNumber(from), date = from; day <= last; day += 1, date = addDays(date, 1)) {
    const session = calendar.sessionOn(date);
    if (session !== null) sessions.push(session);
  }
  return sessions;
}

/** Number of sessions strictly after one date, up to and including another; 0 when that is not later. */
export function countSessions(
  calendar: ExchangeCalendar,
  { after, through }: { readonly after: SessionDate; readonly through: SessionDate },
): number {
  return sessionsInRange(calendar, { from: addDays(after, 1), through }).length;
}

/**
 * Sessions of a calendar year: what a daily volatility is annualised by when the count matters (252 is a display convention).
 * @param year whole, within the calendar.
 * @throws {DomainError} `outside-calendar`, `session-date-invalid`.
 */
export function sessionsInYear(calendar: ExchangeCalendar, year: number): number {
  return sessionsInRange(calendar, { from: dateOf(year, 1, 1), through: dateOf(year, 12, 31) }).length;
}

/**
 * Standard monthly expiration: the third Friday, or the session before it when that Friday is closed.
 * @param question.month 1 to 12.
 * @see exchange practice for US equity options since February 2015.
 */
export function monthlyExpiration(
  calendar: ExchangeCalendar,
  { year, month }: { readonly year: number; readonly month: number },
): SessionDate {
  const first = dayNumber(dateOf(year, month, 1));
  const toFriday = (5 - weekdayOfDay(first) + 7) % 7;
  return sessionOnOrBefore(calendar, dateOf(year, month, 1 + toFriday + 14)).date;
}
