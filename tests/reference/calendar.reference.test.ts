import { addDays } from '@/journal/sessions/session-date';
import { addSessions, countSessions, monthlyExpiration, sessionsInRange } from '@/journal/sessions/exchange-calendar';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import reference from '@/tests/reference/data/calendar.json';
import { casesOf, numberOf, type ReferenceCase } from '@/tests/reference/reference-file';

const calendar = usOptionsCalendar;
const textOf = (one: ReferenceCase, field: string) => String(one[field]);

function datesOf(one: ReferenceCase, field: string): string[] {
  const value = one[field];
  if (!Array.isArray(value)) throw new Error(`${one.id} has no list ${field}`);
  return value
    .map((item: unknown) =>
      typeof item === 'object' && item !== null && 'date' in item ? String(item.date) : String(item),
    )
    .sort();
}

describe('the US options calendar against published holidays', () => {
  it.each(casesOf(reference, 'years'))('has every closure, early close and session of $year', (one) => {
    const year = numberOf(one, 'year');
    const range = { from: `${year}-01-01`, through: `${year}-12-31` };
    const sessions = sessionsInRange(calendar, range);
    expect(sessions).toHaveLength(numberOf(one, 'sessions'));
    expect(sessions.filter(({ kind }) => kind === 'early').map(({ date }) => date)).toEqual(
      datesOf(one, 'early_closes'),
    );
    const closures: string[] = [];
    for (let date = range.from; date <= range.through; date = addDays(date, 1)) {
      const reason = calendar.closureReason(date);
      if (reason !== null && reason !== 'weekend') closures.push(date);
    }
    expect(closures).toEqual(datesOf(one, 'full_closures'));
  });

  it.each(casesOf(reference, 'day-status'))('knows that $date is $status', (one) => {
    expect(calendar.sessionOn(textOf(one, 'date'))?.kind ?? 'closed').toBe(one.status);
  });

  it.each(casesOf(reference, 'sessions-between'))('counts the sessions after $after through $through', (one) => {
    const [after, through] = [textOf(one, 'after'), textOf(one, 'through')];
    expect(countSessions(calendar, { after, through })).toBe(one.sessions);
    const early = sessionsInRange(calendar, { from: addDays(after, 1), through }).filter(
      ({ kind }) => kind === 'early',
    );
    expect(early).toHaveLength(numberOf(one, 'early_closes'));
  });

  it.each(casesOf(reference, 'add-sessions'))('is $result $add_sessions sessions after $date', (one) => {
    expect(addSessions(calendar, textOf(one, 'date'), numberOf(one, 'add_sessions')).date).toBe(one.result);
  });

  it.each(casesOf(reference, 'monthly-expiration'))('expires on $expiration in $year-$month', (one) => {
    expect(monthlyExpiration(calendar, { year: numberOf(one, 'year'), month: numberOf(one, 'month') })).toBe(
      one.expiration,
    );
  });
});
