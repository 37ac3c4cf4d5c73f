import fc from 'fast-check';
import { calendarWithClosures } from '@/journal/sessions/calendar-with-closures';
import { sessionsInYear } from '@/journal/sessions/exchange-calendar';
import { instantMilliseconds, instantOfMilliseconds } from '@/journal/sessions/instant';
import { elapsedShareAt, uShapedProfile, varianceShareAt } from '@/journal/sessions/intraday-profile';
import { instantWithRemaining, sessionsBetween } from '@/journal/sessions/session-clock';
import { addDays, dateOfDay } from '@/journal/sessions/session-date';
import { tradingSegmentAt } from '@/journal/sessions/trading-hours';
import { usOptionsCalendar as calendar } from '@/journal/sessions/us-options-calendar';
import { usTradingHours } from '@/journal/sessions/us-trading-hours';

const settings = { overnightShare: 0.3, weekendNightWeight: 1.5, intradayProfile: uShapedProfile };
const between = (from: string, to: string, own = {}) =>
  sessionsBetween({ calendar, from, to, settings: { ...settings, ...own } });
const coded = (code: string) => expect.objectContaining({ code }) as Error;

describe('the session clock with a weekend weight and a profile', () => {
  it('counts a weekend’s night for more, and a holiday’s, and no other', () => {
    expect(between('2026-12-04T21:00:00.000Z', '2026-12-07T21:00:00.000Z')).toBeCloseTo(1.15, 12);
    expect(between('2026-11-25T21:00:00.000Z', '2026-11-27T18:00:00.000Z')).toBeCloseTo(0.45 + (0.7 * 210) / 390, 12);
    expect(between('2026-12-08T21:00:00.000Z', '2026-12-09T21:00:00.000Z')).toBeCloseTo(1, 12);
  });

  it('spends the first half hour of the profile in half an hour', () => {
    const share = 20 / 103;
    expect(between('2026-12-09T14:30:00.000Z', '2026-12-09T15:00:00.000Z')).toBeCloseTo(0.7 * share, 12);
  });

  const instant = fc
    .integer({ min: Date.parse('2026-01-03T00:00:00Z'), max: Date.parse('2027-12-20T00:00:00Z') })
    .map((time) => new Date(time).toISOString());

  it('adds up over any moment between', () => {
    fc.assert(
      fc.property(instant, instant, instant, (...moments) => {
        const [first = '', middle = '', last = ''] = [...moments].sort();
        expect(between(first, middle) + between(middle, last)).toBeCloseTo(between(first, last), 9);
      }),
      { seed: 20261209, numRuns: 40 },
    );
  });

  it('finds the instant with some variance still to come', () => {
    const session = calendar.sessionOn('2026-12-09');
    if (session === null) throw new Error('9 December is a session');
    for (const remaining of [0.01, 0.2, 0.5, 0.69]) {
      const at = instantWithRemaining(session, remaining, settings);
      expect(between(at, session.closesAt)).toBeCloseTo(remaining, 6);
    }
    for (const share of [0, 0.1, 0.5, 1])
      expect(varianceShareAt(uShapedProfile, elapsedShareAt(uShapedProfile, share))).toBeCloseTo(share, 12);
  });

  it.each([
    [{ weekendNightWeight: 0.5 }, 'weekend-night-weight-out-of-range'],
    [{ weekendNightWeight: NaN }, 'weekend-night-weight-out-of-range'],
    [{ intradayProfile: { weights: [] } }, 'intraday-profile-invalid'],
    [{ intradayProfile: { weights: [0, 0] } }, 'intraday-profile-invalid'],
    [{ intradayProfile: { weights: [1, NaN] } }, 'intraday-profile-invalid'],
  ])('refuses %j as %s', (own, code) => {
    expect(() => between('2026-12-04T21:00:00.000Z', '2026-12-07T21:00:00.000Z', own)).toThrow(coded(code));
  });
});

describe('the edges of the calendar', () => {
  it.each([2026, 2027, 2028])('has 251 sessions in %d', (year) => {
    expect(sessionsInYear(calendar, year)).toBe(251);
  });

  it('counts to the last close there is', () => {
    expect(between('2100-12-30T21:00:00.000Z', '2100-12-31T21:00:00.000Z')).toBeCloseTo(1, 12);
    expect(() => between('2100-12-30T21:00:00.000Z', '2101-01-03T21:00:00.000Z')).toThrow(coded('outside-calendar'));
  });

  it('refuses instants and dates that do not exist, by name', () => {
    expect(() => instantMilliseconds('2026-02-30T00:00:00Z')).toThrow(coded('instant-invalid'));
    expect(() => instantMilliseconds('2026-02-03T24:00:00Z')).toThrow(coded('instant-invalid'));
    expect(() => instantOfMilliseconds(NaN)).toThrow(coded('instant-out-of-range'));
    expect(() => dateOfDay(NaN)).toThrow(coded('session-date-invalid'));
    expect(() => addDays('9999-12-31', 1)).toThrow(coded('session-date-invalid'));
    expect(() => between('0000-01-01T00:00:00Z', '2026-01-05T00:00:00Z')).toThrow(coded('session-date-invalid'));
    expect(() => between('1200-01-01T00:00:00Z', '2026-01-05T00:00:00Z')).toThrow(coded('outside-calendar'));
  });

  it('takes a desk’s own closures', () => {
    const own = calendarWithClosures(calendar, {
      closedDates: [{ date: '2026-12-09', reason: 'storm' }],
      earlyCloses: [{ date: '2026-12-10', closesAt: '12:30' }],
    });
    expect(own.sessionOn('2026-12-09')).toBeNull();
    expect(own.closureReason('2026-12-09')).toBe('storm');
    expect(own.sessionOn('2026-12-10')).toMatchObject({
      kind: 'early',
      minutes: 180,
      closesAt: '2026-12-10T17:30:00.000Z',
    });
    expect(() =>
      calendarWithClosures(calendar, { closedDates: [], earlyCloses: [{ date: '2026-12-12', closesAt: '12:30' }] }),
    ).toThrow(coded('early-close-invalid'));
  });
});

describe('trading hours', () => {
  const ask = (productClass: string, at: string) => {
    const found = tradingSegmentAt({ table: usTradingHours, calendar, productClass, at });
    return found === null ? null : `${found.segment.kind} ${found.sessionDate}`;
  };

  it.each([
    ['equity-options', '2026-12-09T14:30:00.000Z', 'regular 2026-12-09'],
    ['equity-options', '2026-12-09T21:00:00.000Z', null],
    ['equity-options', '2026-11-27T18:00:00.000Z', null],
    ['broad-fund-and-index-options', '2026-12-09T21:14:59.999Z', 'regular 2026-12-09'],
    ['broad-fund-and-index-options', '2026-11-27T18:10:00.000Z', 'regular 2026-11-27'],
    ['overnight-index-options', '2026-12-07T02:00:00.000Z', 'overnight 2026-12-07'],
    ['overnight-index-options', '2026-12-05T02:00:00.000Z', null],
    ['overnight-index-options', '2026-12-09T21:30:00.000Z', 'late 2026-12-09'],
    ['eligible-large-equity-options', '2026-12-09T13:00:00.000Z', null],
    ['unheard-of', '2026-12-09T15:00:00.000Z', null],
  ])('of %s at %s: %s', (productClass, at, expected) => {
    expect(ask(productClass, at)).toBe(expected);
  });

  it('begin where a desk gives the date the approval left open', () => {
    const table = usTradingHours.map((hours) => (hours.from === null ? { ...hours, from: '2026-12-01' } : hours));
    const at = '2026-12-09T13:00:00.000Z';
    const found = tradingSegmentAt({ table, calendar, productClass: 'eligible-large-equity-options', at });
    expect(found?.segment.kind).toBe('early');
  });
});
