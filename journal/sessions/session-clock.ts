import { DomainError } from '@/journal/errors/domain-error';
import {
  type ExchangeCalendar,
  type ExchangeSession,
  nextSession,
  previousSession,
} from '@/journal/sessions/exchange-calendar';
import { instantMilliseconds } from '@/journal/sessions/instant';
import { addDays, type SessionDate } from '@/journal/sessions/session-date';

/** How variance is spread over a session. */
export interface ClockSettings {
  /** Share of a full session's variance that falls before its open, 0 to 1; 0.30 is common practice. */
  readonly overnightShare: number;
}

export const FULL_SESSION_MINUTES = 390;
const MILLISECONDS_A_MINUTE = 60_000;

/**
 * The session clock: variance time in sessions. A full session counts 1: its overnight share is counted until it opens,
 * the rest runs flat by the minute to its close; an early close has fewer minutes and so counts less
 * (o + (1 − o)·210/390). Nothing runs while the market is closed, but the night is spent at the open.
 * @see French and Roll (1986), J. Financial Economics 17, on variance by open and closed hours; overnight share and flat
 *   minutes: common practice.
 */
interface ClockQuestion {
  readonly calendar: ExchangeCalendar;
  readonly settings: ClockSettings;
}

/**
 * Sessions of variance between two instants.
 * @returns 0 or more; whole from close to close; 0 when `to` is not later. Additive over any instant between.
 * @throws {DomainError} `overnight-share-out-of-range`, `instant-invalid`, `outside-calendar`.
 */
export function sessionsBetween(question: ClockQuestion & { readonly from: string; readonly to: string }): number {
  const { calendar, from, to, settings } = question;
  checkShare(settings);
  const start = instantMilliseconds(from);
  const end = instantMilliseconds(to);
  if (!(end > start)) return 0;
  let total = 0;
  let session = sessionEndingAfter(calendar, start);
  while (Date.parse(session.opensAt) <= end) {
    total += spentBy(session, end, settings) - spentBy(session, start, settings);
    session = nextSession(calendar, session.date);
  }
  return total;
}

/**
 * Sessions of variance left to an option's expiry.
 * @param question.settlement 'pm' settles at the close of the expiry session; 'am' from its openings, so that only the
 *   night before it counts.
 * @throws {DomainError} `expiry-not-a-session` and as {@link sessionsBetween}.
 */
export function sessionsToExpiry(
  question: ClockQuestion & {
    readonly from: string;
    readonly expirySessionDate: SessionDate;
    readonly settlement: 'pm' | 'am';
  },
): number {
  const { calendar, from, expirySessionDate, settlement, settings } = question;
  const session = calendar.sessionOn(expirySessionDate);
  if (session === null) throw new DomainError('expiry-not-a-session', { expirySessionDate });
  return sessionsBetween({ calendar, from, to: settlement === 'am' ? session.opensAt : session.closesAt, settings });
}

/** The session that is open at an instant (its open included, its close not), or null. */
export function sessionInProgress({
  calendar,
  at,
}: {
  readonly calendar: ExchangeCalendar;
  readonly at: string;
}): ExchangeSession | null {
  const time = instantMilliseconds(at);
  const session = sessionEndingAfter(calendar, time);
  return Date.parse(session.opensAt) <= time ? session : null;
}

/** The last session that has closed by an instant. */
export function latestCloseAt({
  calendar,
  at,
}: {
  readonly calendar: ExchangeCalendar;
  readonly at: string;
}): ExchangeSession {
  return previousSession(calendar, sessionEndingAfter(calendar, instantMilliseconds(at)).date);
}

/** The first session whose close lies after an instant. */
export function sessionEndingAfter(calendar: ExchangeCalendar, milliseconds: number): ExchangeSession {
  // An exchange's day is at most a day off the UTC date, so the search starts two days before it.
  const start = addDays(new Date(milliseconds).toISOString().slice(0, 10), -2);
  let session = nextSession(calendar, start);
  while (Date.parse(session.closesAt) <= milliseconds) session = nextSession(calendar, session.date);
  return session;
}

/** Variance of a session already spent at an instant: nothing before its open, the night at the open, all at the close. */
function spentBy(session: ExchangeSession, milliseconds: number, { overnightShare }: ClockSettings): number {
  const opens = Date.parse(session.opensAt);
  if (milliseconds < opens) return 0;
  const minutes = Math.min(session.minutes, (milliseconds - opens) / MILLISECONDS_A_MINUTE);
  return overnightShare + (1 - overnightShare) * (minutes / FULL_SESSION_MINUTES);
}

function checkShare({ overnightShare }: ClockSettings): void {
  if (!(overnightShare >= 0 && overnightShare <= 1))
    throw new DomainError('overnight-share-out-of-range', { overnightShare });
}
