import { addDays, dateOf, dayNumber, type SessionDate, weekdayOfDay } from '@/journal/sessions/session-date';

const [SUNDAY, MONDAY, TUESDAY, THURSDAY, FRIDAY, SATURDAY] = [0, 1, 2, 4, 5, 6] as const;

/** Days the exchange is closed, or closes early, in one year. */
export interface YearOfHolidays {
  readonly closures: ReadonlyMap<SessionDate, string>;
  readonly earlyCloses: ReadonlyMap<SessionDate, string>;
}

/** Closures no rule gives: decided for one day (dates from memory of the exchanges' notices). */
const specialClosures: readonly (readonly [SessionDate, string])[] = [
  ['1994-04-27', 'National day of mourning'],
  ['2001-09-11', 'Emergency closure'],
  ['2001-09-12', 'Emergency closure'],
  ['2001-09-13', 'Emergency closure'],
  ['2001-09-14', 'Emergency closure'],
  ['2004-06-11', 'National day of mourning'],
  ['2007-01-02', 'National day of mourning'],
  ['2012-10-29', 'Closed for a storm'],
  ['2012-10-30', 'Closed for a storm'],
  ['2018-12-05', 'National day of mourning'],
  ['2025-01-09', 'National day of mourning'],
];

/**
 * Holidays of the US options exchanges in a year, by their published rules and a dated table of special closures.
 * @param year 1990 to 2100.
 * @see exchange rules on holidays and early closes (tests/reference/data/calendar.json names them).
 */
export function usHolidays(year: number): YearOfHolidays {
  const closures = new Map<SessionDate, string>();
  const close = (date: SessionDate | null, reason: string) => {
    if (date !== null) closures.set(date, reason);
  };
  close(observed(dateOf(year, 1, 1), 'sunday-only'), 'New Year’s Day');
  if (year >= 1998) close(nthWeekday(year, 1, MONDAY, 3), 'Martin Luther King Jr. Day');
  close(nthWeekday(year, 2, MONDAY, 3), 'Washington’s Birthday');
  close(addDays(easterSunday(year), -2), 'Good Friday');
  close(lastMonday(year, 5), 'Memorial Day');
  if (year >= 2022) close(observed(dateOf(year, 6, 19), 'both'), 'Juneteenth');
  close(observed(dateOf(year, 7, 4), 'both'), 'Independence Day');
  close(nthWeekday(year, 9, MONDAY, 1), 'Labor Day');
  const thanksgiving = nthWeekday(year, 11, THURSDAY, 4);
  close(thanksgiving, 'Thanksgiving Day');
  close(observed(dateOf(year, 12, 25), 'both'), 'Christmas Day');
  for (const [date, reason] of specialClosures) if (date.startsWith(`${year}-`)) close(date, reason);

  const earlyCloses = new Map<SessionDate, string>([[addDays(thanksgiving, 1), 'Day after Thanksgiving']]);
  if (isTuesdayToFriday(dateOf(year, 7, 4))) earlyCloses.set(dateOf(year, 7, 3), 'Day before Independence Day');
  if (isTuesdayToFriday(dateOf(year, 12, 25))) earlyCloses.set(dateOf(year, 12, 24), 'Christmas Eve');
  return { closures, earlyCloses };
}

function weekday(date: SessionDate): number {
  return weekdayOfDay(dayNumber(date));
}

function isTuesdayToFriday(date: SessionDate): boolean {
  return weekday(date) >= TUESDAY && weekday(date) <= FRIDAY;
}

/** The day a holiday is kept: Sunday's on Monday; Saturday's on Friday, or not at all where that closes the old year. */
function observed(date: SessionDate, rule: 'both' | 'sunday-only'): SessionDate | null {
  if (weekday(date) === SUNDAY) return addDays(date, 1);
  if (weekday(date) !== SATURDAY) return date;
  return rule === 'both' ? addDays(date, -1) : null;
}

function nthWeekday(year: number, month: number, wanted: number, nth: number): SessionDate {
  const first = weekday(dateOf(year, month, 1));
  return dateOf(year, month, 1 + ((wanted - first + 7) % 7) + 7 * (nth - 1));
}

function lastMonday(year: number, month: number): SessionDate {
  const last = addDays(dateOf(year, month + 1, 1), -1);
  return addDays(last, -((weekday(last) - MONDAY + 7) % 7));
}

/**
 * Easter Sunday of the Gregorian calendar.
 * @see the anonymous algorithm in Meeus (1991), Astronomical Algorithms, chapter 8.
 */
function easterSunday(year: number): SessionDate {
  const golden = year % 19;
  const century = Math.floor(year / 100);
  const inCentury = year % 100;
  const leapCenturies = Math.floor(century / 4);
  const correction = Math.floor((century - Math.floor((century + 8) / 25) + 1) / 3);
  const epact = (19 * golden + century - leapCenturies - correction + 15) % 30;
  const weekdayShift = (32 + 2 * (century % 4) + 2 * Math.floor(inCentury / 4) - epact - (inCentury % 4)) % 7;
  const late = Math.floor((golden + 11 * epact + 22 * weekdayShift) / 451);
  const days = epact + weekdayShift - 7 * late + 114;
  return dateOf(year, Math.floor(days / 31), (days % 31) + 1);
}
