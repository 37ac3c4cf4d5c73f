import { makeForecast } from '@/journal/forecast/make-forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { CANNOT_TELL, type EntryOutcome, type OutcomeBar } from '@/journal/outcome/entry-outcome';
import { resolveEntry } from '@/journal/outcome/resolve-entry';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { longCall } from '@/tests/journal/forecast/plan-examples';
import { nothingNoted, outcomeBar } from '@/tests/journal/outcome/outcome-bars';

// From the close of Wed 9 Dec: two sessions, the night, and 0.35 of the third session's 0.70: Mon 14 Dec at 12:45 in New York.
const input: ForecastInput = {
  ...longCall,
  holding: { kind: 'sessions', sessions: 2.65 },
  targetPrice: '103',
  stopPrice: '97',
};
const earlier = [
  outcomeBar('2026-12-10', 100.5, { open: 100.1, high: 101, low: 99.5 }),
  outcomeBar('2026-12-11', 101, { open: 100.6, high: 101.4, low: 100.2 }),
];
const exitDay = (rest: Partial<OutcomeBar> = {}) =>
  outcomeBar('2026-12-14', 101.2, { open: 101.1, high: 101.9, low: 100.4, ...rest });
const resolve = (bars: OutcomeBar[], plan: ForecastInput = input) =>
  resolveEntry(
    { input: plan, forecast: makeForecast(plan, usOptionsCalendar), barsSince: bars, fills: [], ...nothingNoted(plan) },
    usOptionsCalendar,
  );
const answerTo = ({ odds }: EntryOutcome, kind: string) => {
  const found = odds.find(({ odds: { event } }) => event.kind === kind);
  return found?.happened ?? found?.waitsFor ?? found?.cannotTell;
};

describe('a planned exit between open and close', () => {
  it('falls at 12:45 of the third session', () => {
    expect(makeForecast(input, usOptionsCalendar).exitAt).toBe('2026-12-14T17:45:00.000Z');
  });

  it('takes the move to the open of that session, the last price known by then, over 2.3 sessions', () => {
    const { move, realisedVolatility } = resolve([...earlier, exitDay()]);
    expect(move).toMatchObject({ endPrice: 101.1, pricedBy: 'open', sessionDate: '2026-12-14' });
    expect(move?.sessions).toBeCloseTo(2.3, 12);
    expect(realisedVolatility?.sessions).toBeCloseTo(2.3, 12);
  });

  it('takes it to the close before where the bar has no open, and waits for that close', () => {
    const noOpen = exitDay({ open: null });
    expect(resolve([...earlier, noOpen]).move).toMatchObject({ endPrice: 101, pricedBy: 'close', sessions: 2 });
    expect(resolve([...earlier.slice(0, 1), noOpen])).toMatchObject({
      move: null,
      moveWaitsFor: 'the close of 2026-12-11',
    });
  });

  it('waits for the bar of the exit session', () => {
    expect(resolve(earlier)).toMatchObject({ move: null, moveWaitsFor: 'the close of 2026-12-14' });
    expect(answerTo(resolve(earlier), 'touch-target')).toBe('the close of 2026-12-14');
  });

  it('says that a level was not touched when even the whole session stayed short of it', () => {
    expect(answerTo(resolve([...earlier, exitDay()]), 'touch-target')).toBe(false);
    expect(answerTo(resolve([...earlier, exitDay()]), 'touch-stop')).toBe(false);
  });

  it('cannot tell when the high of that session decides, and does not wait for more', () => {
    const outcome = resolve([...earlier, exitDay({ high: 103.4 })]);
    expect(answerTo(outcome, 'touch-target')).toBe(CANNOT_TELL);
    expect(answerTo(outcome, 'touch-stop')).toBe(false);
    expect(outcome.odds.find(({ odds }) => odds.key === 'touch-target')).toMatchObject({
      happened: null,
      brierScore: null,
      waitsFor: null,
    });
  });

  it('does not take a close beyond the level for a touch in time where the bar has no range', () => {
    const bare = exitDay({ open: null, high: null, low: null, close: 103.2 });
    expect(answerTo(resolve([...earlier, bare]), 'touch-target')).toBe(CANNOT_TELL);
  });

  it('knows a touch by the open of that session, or by an earlier one', () => {
    expect(answerTo(resolve([...earlier, exitDay({ open: 103.1, high: 103.4 })]), 'touch-target')).toBe(true);
    const touched = [earlier[0] ?? exitDay(), outcomeBar('2026-12-11', 101, { high: 103, low: 100 })];
    expect(answerTo(resolve([...touched, exitDay({ high: 104 })]), 'touch-target')).toBe(true);
  });

  it('knows the profit of an untraded plan when every price of the session gives it one sign', () => {
    const low = exitDay({ open: 100.3, high: 100.6, low: 99.8, close: 100.2 });
    expect(answerTo(resolve([...earlier, low]), 'profit-at-exit')).toBe(false);
    const high = exitDay({ open: 108, high: 110, low: 107, close: 109 });
    expect(answerTo(resolve([...earlier, high]), 'profit-at-exit')).toBe(true);
    const across = exitDay({ high: 109 });
    expect(answerTo(resolve([...earlier, across]), 'profit-at-exit')).toBe(CANNOT_TELL);
    expect(answerTo(resolve([...earlier, exitDay({ high: null })]), 'profit-at-exit')).toBe(CANNOT_TELL);
  });

  it('is complete at expiry although one question stays without an answer', () => {
    const bars = [...earlier, exitDay({ high: 103.4 }), outcomeBar('2026-12-23', 101)];
    expect(resolve(bars).isComplete).toBe(true);
  });
});

describe('a planned exit at an open', () => {
  // 2.1 sessions end in the night before Monday, which is spent at its open.
  const plan: ForecastInput = { ...input, holding: { kind: 'sessions', sessions: 2.1 } };

  it('is judged by that open, whatever the session did afterwards', () => {
    const outcome = resolve([...earlier, exitDay({ open: 100.3, high: 110, low: 90, close: 109 })], plan);
    expect(outcome.move).toMatchObject({ endPrice: 100.3, pricedBy: 'open' });
    expect(answerTo(outcome, 'touch-target')).toBe(false);
    expect(answerTo(outcome, 'touch-stop')).toBe(false);
    expect(answerTo(outcome, 'profit-at-exit')).toBe(false);
  });

  it('counts an open beyond the level as its touch', () => {
    expect(answerTo(resolve([...earlier, exitDay({ open: 96.5, low: 96 })], plan), 'touch-stop')).toBe(true);
  });

  it('cannot tell without the open when the session reached the level', () => {
    expect(answerTo(resolve([...earlier, exitDay({ open: null, low: 96 })], plan), 'touch-stop')).toBe(CANNOT_TELL);
    expect(answerTo(resolve([...earlier, exitDay({ open: null })], plan), 'touch-stop')).toBe(false);
  });
});

describe('a plan entered and left within one session', () => {
  const plan: ForecastInput = {
    ...input,
    spot: { price: '100', at: '2026-12-10T17:30:00.000Z', source: 'typed' },
    holding: { kind: 'sessions', sessions: 0.2 },
  };

  it('takes the move to the close, over the sessions to that close, and says so', () => {
    const { move } = resolve(
      [exitDay({ open: 99 })].map((bar) => ({ ...bar, sessionDate: '2026-12-10' })),
      plan,
    );
    expect(move).toMatchObject({ endPrice: 101.2, pricedBy: 'close-after-exit' });
    expect(move?.sessions).toBeCloseTo((0.7 * 210) / 390, 12);
  });

  it('cannot tell whether a level that the session reached was touched in time, not even by its close', () => {
    const bar = outcomeBar('2026-12-10', 103.5, { open: 104, high: 104, low: 99 });
    expect(answerTo(resolve([bar], plan), 'touch-target')).toBe(CANNOT_TELL);
    expect(answerTo(resolve([bar], plan), 'touch-stop')).toBe(false);
  });
});

describe('a plan entered inside a session and held on', () => {
  const plan: ForecastInput = {
    ...input,
    spot: { price: '100', at: '2026-12-10T17:30:00.000Z', source: 'typed' },
    holding: { kind: 'sessions', sessions: (0.7 * 210) / 390 + 1 },
  };
  const next = outcomeBar('2026-12-11', 100.5, { open: 100.2, high: 101, low: 100 });

  it('cannot tell whether the range of the first session was reached after the entry', () => {
    const first = outcomeBar('2026-12-10', 101, { open: 99, high: 103.2, low: 98 });
    expect(answerTo(resolve([first, next], plan), 'touch-target')).toBe(CANNOT_TELL);
    expect(answerTo(resolve([first, next], plan), 'touch-stop')).toBe(false);
  });

  it('knows a touch by the close of the first session', () => {
    const first = outcomeBar('2026-12-10', 103.1, { open: 99, high: 103.2, low: 98 });
    expect(answerTo(resolve([first, next], plan), 'touch-target')).toBe(true);
  });
});
