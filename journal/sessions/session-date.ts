import { DomainError } from '@/journal/errors/domain-error';

/** A day of the exchange's calendar, 'YYYY-MM-DD'; it belongs to no time zone but the exchange's. */
export type SessionDate = string;

const MILLISECONDS_A_DAY = 86_400_000;

/** Whether a text is an existing date written 'YYYY-MM-DD'. */
export function isSessionDate(text: string): boolean {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text)) return false;
  const time = Date.parse(`${text}T00:00:00Z`);
  return Number.isFinite(time) && new Date(time).toISOString().startsWith(text);
}

/**
 * Number of days since 1970-01-01, so that days can be counted with whole numbers.
 * @throws {DomainError} `session-date-invalid` with the text.
 */
export function dayNumber(date: SessionDate): number {
  if (!isSessionDate(date)) throw new DomainError('session-date-invalid', { date: date.slice(0, 40) });
  return Date.parse(`${date}T00:00:00Z`) / MILLISECONDS_A_DAY;
}

const FIRST_DAY = Date.parse('0000-01-01T00:00:00Z') / MILLISECONDS_A_DAY;
const LAST_DAY = Date.parse('9999-12-31T00:00:00Z') / MILLISECONDS_A_DAY;

/** The date of a day number, years 0 to 9999. @throws {DomainError} `session-date-invalid` with the day. */
export function dateOfDay(day: number): SessionDate {
  const isValid = Number.isInteger(day) && day >= FIRST_DAY && day <= LAST_DAY;
  if (!isValid) throw new DomainError('session-date-invalid', { day });
  return new Date(day * MILLISECONDS_A_DAY).toISOString().slice(0, 10);
}

/** Day of the week of a day number: 0 Sunday to 6 Saturday. */
export function weekdayOfDay(day: number): number {
  return (((day + 4) % 7) + 7) % 7; // 1970-01-01 was a Thursday
}

/** A date some calendar days later, earlier when negative. @throws {DomainError} `session-date-invalid`. */
export function addDays(date: SessionDate, days: number): SessionDate {
  return dateOfDay(dayNumber(date) + days);
}

/** The date built from its numbers; `month` is 1 to 12. */
export function dateOf(year: number, month: number, day: number): SessionDate {
  const pad = (value: number, digits: number) => String(value).padStart(digits, '0');
  return `${pad(year, 4)}-${pad(month, 2)}-${pad(day, 2)}`;
}
