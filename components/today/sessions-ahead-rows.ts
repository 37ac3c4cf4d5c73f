import { type SessionAhead } from '@/components/charts/sessions-ahead';
import { addDays, dayNumber, weekdayOfDay } from '@/journal/sessions/session-date';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type Today } from '@/shared/today/today-endpoints';

const DAYS = 18;

/** The weekdays ahead from the next session on, with the expiries of what is running. */
export function sessionsAhead({ nextSession, running }: Pick<Today, 'nextSession' | 'running'>): SessionAhead[] {
  const dates = Array.from({ length: DAYS }, (_, index) => addDays(nextSession.sessionDate, index));
  return dates
    .filter((date) => weekdayOfDay(dayNumber(date)) % 6 !== 0)
    .map((date) => ({
      date,
      kind: usOptionsCalendar.sessionOn(date)?.kind ?? 'closed',
      marks: running.some(({ expirySessionDate }) => expirySessionDate === date) ? ['expiry'] : [],
    }));
}
