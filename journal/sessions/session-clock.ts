import { DomainError } from '@/journal/errors/domain-error';
import {
  type ExchangeCalendar,
  type ExchangeSession,
  nextSession,
  previousSession,
} from '@/journal/sessions/exchange-calendar';
import { instantMilliseconds, instantOfMilliseconds } from '@/journal/sessions/instant';
import {
  checkIntradayProfile,
  elapsedShareAt,
  type IntradayProfile,
  varianceShareAt,
} from '@/journal/sessions/intraday-profile';
import { addDays, dateOfDay, dayNumber, type SessionDate } from '@/journal/sessions/session-date';

/** How variance is spread over a session. */
export interface ClockSettings {
  /** Share of a full session's variance that falls before its open, 0 to 1; 0.30 is common practice. */
  readonly overnightShare: number;
  /** What a night that spans a closed day counts for, in nights, 1 to 10; 1 when not given. */
  readonly weekendNightWeight?: number;
  /** How the open hours' variance is spread; flat when not given. */
  readonly intradayProfile?: IntradayProfile;
}

export const FULL_SESSION_MINUTES = 390;
const MILLISECONDS_A_MINUTE = 60_000;

/**
 * The session clock: variance time in sessions. A full session counts 1: its overnight share is counted until it opens,
 * the rest runs flat by the minute to its close; an early close has fewer minutes and so counts less
 * (o + (1 − o)·210/390). Nothing runs while the market is closed, but the night is spent at the open. A weight counts a night over a
 * closed day for more; a profile spreads the open hours' variance by its own weights, over an early close's fewer minutes too.
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
 * @throws {DomainError} `overnight-share-out-of-range`, `weekend-night-weight-out-of-range`, `intraday-profile-invalid`,
 *   `instant-invalid`, `outside-calendar`, `session-date-invalid` (before year 0).
 */
export function sessionsBetween(question: ClockQuestion & { readonly from: string; readonly to: string }): number {
  const { calendar, from, to, settings } = question;
  checkSettings(settings);
  const start = instantMilliseconds(from);
  const end = instantMilliseconds(to);
  if (!(end > start)) return 0;
  let total = 0;
  let session = sessionEndingAfter(calendar, start);
  while (Date.parse(session.opensAt) <= end) {
    const night = nightBefore(calendar, session, settings);
    total += spentBy(session, { at: end, night, settings }) - spentBy(session, { at: start, night, settings });
    // The last session of the calendar has none after it.
    if (Date.parse(session.closesAt) >= end) break;
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
  const start = addDays(dateOfDay(Math.floor(milliseconds / 86_400_000)), -2);
  let session = nextSession(calendar, start);
  while (Date.parse(session.closesAt) <= milliseconds) session = nextSession(calendar, session.date);
  return session;
}

/**
 * The instant in a session after which this much of its variance is still to come; its open at the earliest.
 * @param remaining sessions of variance, 0 or more.
 * @throws {DomainError} `intraday-profile-invalid`, `instant-out-of-range`.
 */
export function instantWithRemaining(session: ExchangeSession, remaining: number, settings: ClockSettings): string {
  const { overnightShare, intradayProfile } = settings;
  const opens = Date.parse(session.opensAt);
  const closes = Date.parse(session.closesAt);
  const whole = (1 - overnightShare) * (session.minutes / FULL_SESSION_MINUTES);
  if (!(remaining < whole)) return session.opensAt;
  if (intradayProfile === undefined) {
    const minutesLeft = (remaining / (1 - overnightShare)) * FULL_SESSION_MINUTES;
    return instantOfMilliseconds(Math.max(opens, Math.round(closes - minutesLeft * MILLISECONDS_A_MINUTE)));
  }
  const elapsed = elapsedShareAt(intradayProfile, 1 - remaining / whole);
  return instantOfMilliseconds(Math.round(opens + (closes - opens) * elapsed));
}

/** Variance of the night before a session, spent at its open. */
function nightBefore(
  calendar: ExchangeCalendar,
  session: ExchangeSession,
  { overnightShare, weekendNightWeight = 1 }: ClockSettings,
): number {
  if (weekendNightWeight === 1) return overnightShare;
  const nights = dayNumber(session.date) - dayNumber(previousSession(calendar, session.date).date);
  return nights > 1 ? overnightShare * weekendNightWeight : overnightShare;
}

/** Variance of a session already spent at an instant: nothing before its open, the night at the open, all at the close. */
function spentBy(
  session: ExchangeSession,
  { at, night, settings }: { readonly at: number; readonly night: number; readonly settings: ClockSettings },
): number {
  const opens = Date.parse(session.opensAt);
  if (at < opens) return 0;
  const { overnightShare, intradayProfile } = settings;
  const minutes = Math.min(session.minutes, (at - opens) / MILLISECONDS_A_MINUTE);
  const counted =
    intradayProfile === undefined
      ? minutes
      : session.minutes * varianceShareAt(intradayProfile, minutes / session.minutes);
  return night + (1 - overnightShare) * (counted / FULL_SESSION_MINUTES);
}

function checkSettings({ overnightShare, weekendNightWeight = 1, intradayProfile }: ClockSettings): void {
  if (!(overnightShare >= 0 && overnightShare <= 1))
    throw new DomainError('overnight-share-out-of-range', { overnightShare });
  if (!(weekendNightWeight >= 1 && weekendNightWeight <= 10))
    throw new DomainError('weekend-night-weight-out-of-range', { weekendNightWeight });
  if (intradayProfile !== undefined) checkIntradayProfile(intradayProfile);
}
