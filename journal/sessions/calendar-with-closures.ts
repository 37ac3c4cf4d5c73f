import { Temporal } from 'temporal-polyfill';
import { DomainError } from '@/journal/errors/domain-error';
import { type ExchangeCalendar, type ExchangeSession } from '@/journal/sessions/exchange-calendar';
import { dayNumber, type SessionDate } from '@/journal/sessions/session-date';

/** Days a desk knows of that the calendar does not: an unplanned closure, a shortened day. */
export interface OwnClosures {
  readonly closedDates: readonly { readonly date: SessionDate; readonly reason: string }[];
  /** `closesAt` in the exchange's time, 'HH:MM', after the session's open and before its close. */
  readonly earlyCloses: readonly { readonly date: SessionDate; readonly closesAt: string }[];
}

/**
 * A calendar with a desk's own closures on top.
 * @throws {DomainError} `session-date-invalid`, `early-close-invalid` with the date (also on a closed day), `outside-calendar`.
 */
export function calendarWithClosures(calendar: ExchangeCalendar, own: OwnClosures): ExchangeCalendar {
  const reasons = new Map(own.closedDates.map(({ date, reason }) => [checked(date), reason]));
  const shortened = new Map(
    own.earlyCloses.map(({ date, closesAt }) => [
      checked(date),
      shorten(calendar.sessionOn(date), { date, closesAt, timeZone: calendar.timeZone }),
    ]),
  );
  return {
    ...calendar,
    sessionOn: (date) => (reasons.has(date) ? null : (shortened.get(date) ?? calendar.sessionOn(date))),
    closureReason: (date) => reasons.get(date) ?? calendar.closureReason(date),
  };
}

function checked(date: SessionDate): SessionDate {
  dayNumber(date);
  return date;
}

function shorten(
  session: ExchangeSession | null,
  { date, closesAt, timeZone }: { readonly date: SessionDate; readonly closesAt: string; readonly timeZone: string },
): ExchangeSession {
  if (session === null || !/^([01]\d|2[0-3]):[0-5]\d$/.test(closesAt))
    throw new DomainError('early-close-invalid', { date });
  const at = Temporal.PlainDateTime.from(`${date}T${closesAt}`).toZonedDateTime(timeZone).toInstant();
  const minutes = (at.epochMilliseconds - Date.parse(session.opensAt)) / 60_000;
  if (!(minutes > 0 && minutes < session.minutes)) throw new DomainError('early-close-invalid', { date });
  return { ...session, kind: 'early', minutes, closesAt: at.toString({ fractionalSecondDigits: 3 }) };
}
