import { Temporal } from 'temporal-polyfill';
import { DomainError } from '@/journal/errors/domain-error';
import { type ExchangeCalendar, type ExchangeSession } from '@/journal/sessions/exchange-calendar';
import { dayNumber, type SessionDate, weekdayOfDay } from '@/journal/sessions/session-date';
import { usHolidays, type YearOfHolidays } from '@/journal/sessions/us-holidays';

const TIME_ZONE = 'America/New_York';
const FIRST_YEAR = 1990;
const LAST_YEAR = 2100;
const hours = { full: { minutes: 390, close: '16:00' }, early: { minutes: 210, close: '13:00' } } as const;

// A date's session never changes, so each is worked out once.
const years = new Map<number, YearOfHolidays>();
const sessions = new Map<SessionDate, ExchangeSession | null>();

/** US equity options: 9:30 to 16:00 New York time, to 13:00 on early closes; 1990 to 2100. */
export const usOptionsCalendar: ExchangeCalendar = {
  id: 'us-options',
  name: 'US equity options',
  timeZone: TIME_ZONE,
  sessionOn: (date) => {
    const known = sessions.get(date);
    if (known !== undefined) return known;
    const session = makeSession(date);
    sessions.set(date, session);
    return session;
  },
  closureReason: (date) => {
    const { closures } = holidaysOf(date);
    return isWeekend(date) ? 'weekend' : (closures.get(date) ?? null);
  },
};

function makeSession(date: SessionDate): ExchangeSession | null {
  const { closures, earlyCloses } = holidaysOf(date);
  if (isWeekend(date) || closures.has(date)) return null;
  const kind = earlyCloses.has(date) ? 'early' : 'full';
  return {
    date,
    kind,
    opensAt: instantOf(date, '09:30'),
    closesAt: instantOf(date, hours[kind].close),
    minutes: hours[kind].minutes,
  };
}

function isWeekend(date: SessionDate): boolean {
  return weekdayOfDay(dayNumber(date)) % 6 === 0;
}

function holidaysOf(date: SessionDate): YearOfHolidays {
  const year = Number(date.slice(0, 4));
  if (!(year >= FIRST_YEAR && year <= LAST_YEAR)) throw new DomainError('outside-calendar', { date });
  const known = years.get(year);
  if (known !== undefined) return known;
  const made = usHolidays(year);
  years.set(year, made);
  return made;
}

function instantOf(date: SessionDate, time: string): string {
  const local = Temporal.PlainDateTime.from(`${date}T${time}`);
  return local
    .toZonedDateTime(TIME_ZONE, { disambiguation: 'reject' })
    .toInstant()
    .toString({ fractionalSecondDigits: 3 });
}
