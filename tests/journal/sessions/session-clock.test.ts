import fc from 'fast-check';
import { exitInstant } from '@/journal/forecast/exit-instant';
import { latestCloseAt, sessionInProgress, sessionsBetween, sessionsToExpiry } from '@/journal/sessions/session-clock';
import { usOptionsCalendar as calendar } from '@/journal/sessions/us-options-calendar';

const settings = { overnightShare: 0.3 };
/** New York wall time as an instant; the offset stands with each case. */
const winter = (date: string, time: string) => new Date(`${date}T${time}:00-05:00`).toISOString();
const summer = (date: string, time: string) => new Date(`${date}T${time}:00-04:00`).toISOString();
const between = (from: string, to: string) => sessionsBetween({ calendar, from, to, settings });

// Worked values computed outside this project with Python.
describe('the session clock', () => {
  it('counts 2.3231 from Tuesday 13:00 to Thursday’s close', () => {
    expect(between(winter('2026-12-08', '13:00'), winter('2026-12-10', '16:00'))).toBeCloseTo(2.3231, 4);
  });

  it('counts 2.6231 to Friday’s openings, where only the night counts', () => {
    const from = winter('2026-12-08', '13:00');
    const toExpiry = sessionsToExpiry({ calendar, from, expirySessionDate: '2026-12-11', settlement: 'am', settings });
    expect(toExpiry).toBeCloseTo(2.6231, 4);
  });

  it('counts 0.6769 for an early close and 0.3769 from 12:30 to the close', () => {
    expect(between(winter('2026-11-25', '16:00'), winter('2026-11-27', '13:00'))).toBeCloseTo(0.6769, 4);
    expect(between(winter('2026-12-09', '12:30'), winter('2026-12-09', '16:00'))).toBeCloseTo(0.3769, 4);
  });

  it('counts 1.6769 and 6.6769 over Thanksgiving from Tuesday’s close', () => {
    const from = winter('2026-11-24', '16:00');
    expect(between(from, winter('2026-11-27', '13:00'))).toBeCloseTo(1.6769, 4);
    expect(between(from, winter('2026-12-04', '16:00'))).toBeCloseTo(6.6769, 4);
  });

  it.each([
    ['nothing before the open', winter('2026-12-09', '00:01'), winter('2026-12-09', '09:29'), 0],
    ['the night at the open', winter('2026-12-08', '23:59'), winter('2026-12-09', '09:30'), 0.3],
    ['a whole session from close to close', winter('2026-12-08', '16:00'), winter('2026-12-09', '16:00'), 1],
    ['one session over a weekend', winter('2026-12-04', '16:00'), winter('2026-12-07', '16:00'), 1],
    ['one session over the Sunday in March', winter('2026-03-06', '16:00'), summer('2026-03-09', '16:00'), 1],
    ['one session over the Sunday in November', summer('2026-10-30', '16:00'), winter('2026-11-02', '16:00'), 1],
    ['one session over the new year', winter('2026-12-31', '16:00'), winter('2027-01-04', '16:00'), 1],
    ['one session to 29 February', winter('2028-02-28', '16:00'), winter('2028-02-29', '16:00'), 1],
    ['nothing backwards', winter('2026-12-09', '16:00'), winter('2026-12-08', '16:00'), 0],
    ['nothing on a holiday', winter('2026-12-24', '13:00'), winter('2026-12-25', '23:59'), 0],
  ])('counts %s', (_, from, to, sessions) => {
    expect(between(from, to)).toBeCloseTo(sessions, 12);
  });

  it('opens at 9:30 New York time on both sides of the clock changes', () => {
    expect(calendar.sessionOn('2026-03-06')?.opensAt).toBe('2026-03-06T14:30:00.000Z');
    expect(calendar.sessionOn('2026-03-09')?.opensAt).toBe('2026-03-09T13:30:00.000Z');
    expect(calendar.sessionOn('2026-11-02')?.opensAt).toBe('2026-11-02T14:30:00.000Z');
    expect(calendar.sessionOn('2026-11-27')?.closesAt).toBe('2026-11-27T18:00:00.000Z');
  });

  it('is in progress from the open until just before the close', () => {
    expect(sessionInProgress({ calendar, at: winter('2026-12-09', '09:30') })?.date).toBe('2026-12-09');
    expect(sessionInProgress({ calendar, at: winter('2026-12-09', '16:00') })).toBeNull();
    expect(latestCloseAt({ calendar, at: winter('2026-12-09', '16:00') }).date).toBe('2026-12-09');
    expect(latestCloseAt({ calendar, at: winter('2026-12-09', '15:59') }).date).toBe('2026-12-08');
  });

  // Holidays of the exchange’s notice.
  it.each([
    '2026-01-01',
    '2026-01-19',
    '2026-02-16',
    '2026-04-03',
    '2026-05-25',
    '2026-06-19',
    '2026-07-03',
    '2026-09-07',
    '2026-11-26',
    '2026-12-25',
    '2027-01-01',
    '2027-01-18',
    '2027-02-15',
    '2027-03-26',
    '2027-05-31',
    '2027-06-18',
    '2027-07-05',
    '2027-09-06',
    '2027-11-25',
    '2027-12-24',
    '2028-01-17',
    '2028-02-21',
    '2028-04-14',
    '2028-05-29',
    '2028-06-19',
    '2028-07-04',
    '2028-09-04',
    '2028-11-23',
    '2028-12-25',
  ])('is closed on %s', (date) => {
    expect(calendar.sessionOn(date)).toBeNull();
    expect(calendar.closureReason(date)).not.toBeNull();
  });

  it.each(['2026-11-27', '2026-12-24', '2027-11-26', '2028-07-03', '2028-11-24'])('closes early on %s', (date) => {
    expect(calendar.sessionOn(date)?.minutes).toBe(210);
  });

  it.each(['1989-12-29', '2101-01-03'])('knows nothing of %s', (date) => {
    expect(() => calendar.sessionOn(date)).toThrow('outside-calendar');
  });

  const instant = fc
    .integer({ min: Date.parse('2026-01-02T00:00:00Z'), max: Date.parse('2028-12-20T00:00:00Z') })
    .map((time) => new Date(time).toISOString());

  it('adds up over any moment between, and never runs backwards', () => {
    fc.assert(
      fc.property(instant, instant, instant, (...moments) => {
        const [first = '', middle = '', last = ''] = [...moments].sort();
        expect(between(first, middle) + between(middle, last)).toBeCloseTo(between(first, last), 9);
        expect(between(first, last)).toBeGreaterThanOrEqual(between(first, middle) - 1e-12);
      }),
      { seed: 20261209, numRuns: 60 },
    );
  });

  it('is undone by the exit instant, but where a night ends at its open', () => {
    fc.assert(
      fc.property(instant, fc.double({ min: 0.05, max: 25, noNaN: true }), (from, sessions) => {
        const { at, session } = exitInstant({ calendar, from, sessions, settings });
        const counted = between(from, at);
        if (at === session.opensAt) expect(counted).toBeGreaterThanOrEqual(sessions - 1e-6);
        else expect(counted).toBeCloseTo(sessions, 5); // the instant is kept to the millisecond
      }),
      { seed: 20261209, numRuns: 100 },
    );
  });
});
