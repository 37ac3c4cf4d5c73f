import { makeForecast } from '@/journal/forecast/make-forecast';
import { type EntryOutcome, type OutcomeBar } from '@/journal/outcome/entry-outcome';
import { outcomeChanges } from '@/journal/outcome/outcome-changes';
import { resolveEntry } from '@/journal/outcome/resolve-entry';
import { addSessions } from '@/journal/sessions/exchange-calendar';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { longCall } from '@/tests/journal/forecast/plan-examples';
import { nothingNoted, outcomeBar } from '@/tests/journal/outcome/outcome-bars';

const forecast = makeForecast(longCall, usOptionsCalendar);
const outcomeOf = (barsSince: OutcomeBar[]): EntryOutcome =>
  resolveEntry({ input: longCall, forecast, barsSince, fills: [], ...nothingNoted(longCall) }, usOptionsCalendar);

const start = longCall.spot.at.slice(0, 10);
const dates: string[] = [];
for (let date = start; date < forecast.expirySessionDate;) {
  date = addSessions(usOptionsCalendar, date, 1).date;
  dates.push(date);
}
const bars = (close: number, count = dates.length) => dates.slice(0, count).map((date) => outcomeBar(date, close));

describe('what an outcome says otherwise', () => {
  const running = outcomeOf(bars(100, 2));
  const done = outcomeOf(bars(100));

  it('is nothing when it says the same', () => {
    expect(outcomeChanges(running, outcomeOf(bars(100, 2)))).toEqual([]);
    expect(outcomeChanges(done, outcomeOf(bars(100)))).toEqual([]);
    expect(outcomeChanges(null, outcomeOf([]))).toEqual([]);
  });

  it('is nothing when a running move only goes on to the next session', () => {
    expect(outcomeChanges(running, outcomeOf(bars(100, 3)))).toEqual([]);
    expect(outcomeChanges(outcomeOf([]), running)).toEqual([]);
  });

  it('is a running move whose last close was corrected', () => {
    const corrected = outcomeOf([...bars(100, 1), outcomeBar(dates[1] ?? '', 99.5)]);
    expect(outcomeChanges(running, corrected)).toEqual([
      {
        kind: 'move',
        before: { sessionDate: dates[1], endPrice: 100, inSigmas: running.moveSoFar?.inSigmas, isFinal: false },
        after: { sessionDate: dates[1], endPrice: 99.5, inSigmas: corrected.moveSoFar?.inSigmas, isFinal: false },
      },
    ]);
  });

  it('is every first answer, each with nothing before it', () => {
    const changes = outcomeChanges(running, done);
    expect(changes.filter(({ kind }) => kind === 'odds')).toHaveLength(forecast.odds.length);
    expect(changes.every(({ before }) => before === null || before === false)).toBe(true);
    expect(changes.at(-1)).toEqual({ kind: 'completeness', before: false, after: true });
  });

  it('is the answers that a corrected close turns round, and no others', () => {
    const up = Number(longCall.legs[0]?.strikePrice) + 20;
    const turned = outcomeOf([...bars(100).slice(0, -1), outcomeBar(dates.at(-1) ?? '', up)]);
    const changes = outcomeChanges(done, turned);
    const flipped = done.odds.filter(
      ({ happened, odds }) => turned.odds.find((other) => other.odds.key === odds.key)?.happened !== happened,
    );
    expect(flipped.length).toBeGreaterThan(0);
    expect(changes.filter(({ kind }) => kind === 'odds')).toEqual(
      flipped.map(({ odds, happened }) => ({ kind: 'odds', oddsKey: odds.key, before: happened, after: !happened })),
    );
  });

  it('is the profit of a position that was flat, gone when it is open again and back when it is flat', () => {
    const profit = (realised: string, isFinal: boolean): EntryOutcome => ({
      ...running,
      profit: {
        realised,
        isFinal,
        fees: '0',
        percentileLow: null,
        percentileHigh: null,
        horizon: 'expiry',
        expectedMean: 0,
      },
    });
    expect(outcomeChanges(profit('10', false), profit('38', true))).toEqual([
      { kind: 'profit', before: null, after: '38' },
    ]);
    expect(outcomeChanges(profit('38', true), profit('0', false))).toEqual([
      { kind: 'profit', before: '38', after: null },
    ]);
    expect(outcomeChanges(profit('38', true), profit('33', true))).toEqual([
      { kind: 'profit', before: '38', after: '33' },
    ]);
    expect(outcomeChanges(profit('1', false), profit('2', false))).toEqual([]);
  });
});
