import { eventFromTwoExpiries, holdVariance } from '@/journal/events/event-variance';
import { eventsInHold, placeEvent } from '@/journal/events/events-in-hold';
import { pastEventMoves } from '@/journal/events/past-event-moves';
import { usOptionsCalendar as calendar } from '@/journal/sessions/us-options-calendar';

const near = { totalVariance: 42.75e-4, sessions: 3 };
const far = { totalVariance: 65.25e-4, sessions: 13 };

describe('the variance of events', () => {
  it('has 1.50 % a session and 6.00 % for the event from the two worked expiries', () => {
    const { dailyVolatility, eventDeviation } = eventFromTwoExpiries({ near, far });
    expect(dailyVolatility).toBeCloseTo(0.015, 12);
    expect(eventDeviation).toBeCloseTo(0.06, 12);
  });

  it('has the hold of 6.538 % and the session of 6.185 % of the earnings straddle', () => {
    const ask = (sessions: number) =>
      Math.sqrt(holdVariance({ dailyVolatility: 0.015, sessions, eventDeviations: [0.06] }));
    expect(ask(3)).toBeCloseTo(0.06538, 5);
    expect(ask(1)).toBeCloseTo(0.06185, 5);
  });

  it.each([
    [{ near, far: { totalVariance: 0.004, sessions: 13 } }, 'base-variance-negative'],
    [{ near: { totalVariance: 0.0001, sessions: 3 }, far }, 'event-variance-negative'],
    [{ near: far, far: near }, 'expiries-out-of-order'],
    [{ near: { totalVariance: NaN, sessions: 3 }, far }, 'expiry-variance-invalid'],
  ])('refuses %j as %s', (question, code) => {
    expect(() => eventFromTwoExpiries(question)).toThrow(expect.objectContaining({ code }));
  });

  it('has median, range and count of past moves without their signs', () => {
    const moves = pastEventMoves([0.03, -0.06, 0.05]);
    expect(moves).toMatchObject({ median: 0.05, least: 0.03, greatest: 0.06, n: 3 });
    expect(moves.rootMeanSquare).toBeCloseTo(Math.sqrt(0.007 / 3), 15);
    expect(() => pastEventMoves([])).toThrow(expect.objectContaining({ code: 'too-few-moves' }));
  });

  it.each([
    ['2026-12-09T13:30:00.000Z', 'before-open', '2026-12-09', '2026-12-09T14:30:00.000Z'],
    ['2026-12-09T19:00:00.000Z', 'in-session', '2026-12-09', '2026-12-09T19:00:00.000Z'],
    ['2026-12-09T21:05:00.000Z', 'after-close', '2026-12-10', '2026-12-10T14:30:00.000Z'],
    ['2026-12-05T15:00:00.000Z', 'before-open', '2026-12-07', '2026-12-07T14:30:00.000Z'],
  ])('places %s %s of %s', (at, timing, sessionDate, feltAt) => {
    expect(placeEvent(calendar, at)).toEqual({ timing, sessionDate, feltAt });
  });

  it('takes into a hold what is felt after its start and by its end', () => {
    const events = [
      { at: '2026-12-08T21:30:00.000Z' },
      { at: '2026-12-09T19:00:00.000Z' },
      { at: '2026-12-10T21:05:00.000Z' },
    ];
    const hold = { calendar, from: '2026-12-08T21:00:00.000Z', to: '2026-12-10T21:00:00.000Z' };
    expect(eventsInHold(events, hold).map(({ at }) => at)).toEqual(events.slice(0, 2).map(({ at }) => at));
  });
});
