import { sessionsInRange } from '@/journal/sessions/exchange-calendar';
import { instantMilliseconds, instantOfMilliseconds } from '@/journal/sessions/instant';
import { addDays, dateOfDay, dayNumber, weekdayOfDay } from '@/journal/sessions/session-date';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';

/** Monday to Sunday in New York, named by its first and last session. */
export interface SessionWeek {
  readonly startSessionDate: string;
  readonly endSessionDate: string;
  /** Instants between which what a person did belongs to the week: from the first on, before the second. */
  readonly from: string;
  readonly before: string;
}

const OPEN_AFTER_MIDNIGHT_MS = 9.5 * 3_600_000;
const DAY_MS = 24 * 3_600_000;

/**
 * The week a date lies in.
 * @param date 'YYYY-MM-DD', a session or not, inside the years the calendar knows.
 * @throws {RangeError} when the calendar knows no session of that week. Common practice.
 */
export function sessionWeek(date: string): SessionWeek {
  const day = dayNumber(date);
  const monday = dateOfDay(day - ((weekdayOfDay(day) + 6) % 7));
  const sessions = sessionsInRange(usOptionsCalendar, { from: monday, through: addDays(monday, 6) });
  const [first] = sessions;
  const last = sessions.at(-1);
  if (first === undefined || last === undefined) throw new RangeError('A week has a session.');
  // Clocks change in the night to Sunday, so that from Monday on every day has 24 hours.
  const daysLate = dayNumber(first.date) - dayNumber(monday);
  const from = instantMilliseconds(first.opensAt) - OPEN_AFTER_MIDNIGHT_MS - daysLate * DAY_MS;
  return {
    startSessionDate: first.date,
    endSessionDate: last.date,
    from: instantOfMilliseconds(from),
    before: nextMonday(monday),
  };
}

/** Midnight in New York with which the Monday after begins. */
function nextMonday(monday: string): string {
  const [next] = sessionsInRange(usOptionsCalendar, { from: addDays(monday, 7), through: addDays(monday, 13) });
  if (next === undefined) throw new RangeError('A week has a session.');
  const daysLate = dayNumber(next.date) - dayNumber(monday) - 7;
  return instantOfMilliseconds(instantMilliseconds(next.opensAt) - OPEN_AFTER_MIDNIGHT_MS - daysLate * DAY_MS);
}
