import { sessionWeek } from '@/shared/reviews/session-week';

describe('a week', () => {
  it('runs from Monday to Sunday in New York, named by its first and last session', () => {
    const week = {
      startSessionDate: '2026-12-07',
      endSessionDate: '2026-12-11',
      from: '2026-12-07T05:00:00.000Z',
      before: '2026-12-14T05:00:00.000Z',
    };
    expect(sessionWeek('2026-12-07')).toEqual(week);
    expect(sessionWeek('2026-12-09')).toEqual(week);
    expect(sessionWeek('2026-12-13')).toEqual(week);
  });

  it('begins at midnight of a Monday that is a holiday', () => {
    expect(sessionWeek('2026-09-08')).toEqual({
      startSessionDate: '2026-09-08', // the day after Labor Day
      endSessionDate: '2026-09-11',
      from: '2026-09-07T04:00:00.000Z',
      before: '2026-09-14T04:00:00.000Z',
    });
  });

  it('has an hour less or more where the clocks change', () => {
    const hours = (date: string) => {
      const { from, before } = sessionWeek(date);
      return (Date.parse(before) - Date.parse(from)) / 3_600_000;
    };
    expect(hours('2026-03-04')).toBe(167); // until Sunday 8 March
    expect(hours('2026-10-28')).toBe(169); // until Sunday 1 November
    expect(hours('2026-06-10')).toBe(168);
  });

  it('follows on the one before without a gap, over years', () => {
    let { before } = sessionWeek('2024-01-03');
    for (
      let day = Date.parse('2024-01-10T00:00:00Z');
      day < Date.parse('2027-01-01T00:00:00Z');
      day += 7 * 86_400_000
    ) {
      const week = sessionWeek(new Date(day).toISOString().slice(0, 10));
      expect(week.from).toBe(before);
      ({ before } = week);
    }
  });
});
