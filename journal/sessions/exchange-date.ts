import { Temporal } from 'temporal-polyfill';
import { type SessionDate } from '@/journal/sessions/session-date';

/** The calendar date at an exchange at an instant. @param milliseconds since 1970, of a checked instant. */
export function exchangeDateAt(timeZone: string, milliseconds: number): SessionDate {
  return Temporal.Instant.fromEpochMilliseconds(milliseconds).toZonedDateTimeISO(timeZone).toPlainDate().toString();
}
