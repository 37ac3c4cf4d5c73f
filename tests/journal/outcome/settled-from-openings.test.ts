import { makeForecast } from '@/journal/forecast/make-forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { type EntryOutcome, type OutcomeBar } from '@/journal/outcome/entry-outcome';
import { resolveEntry } from '@/journal/outcome/resolve-entry';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { longCall } from '@/tests/journal/forecast/plan-examples';
import { nothingNoted, outcomeBar } from '@/tests/journal/outcome/outcome-bars';

const input: ForecastInput = {
  ...longCall,
  underlying: { ...longCall.underlying, settlementTime: 'am' },
  targetPrice: '103',
  stopPrice: '97',
};
const dates = [
  '2026-12-10',
  '2026-12-11',
  '2026-12-14',
  '2026-12-15',
  '2026-12-16',
  '2026-12-17',
  '2026-12-18',
  '2026-12-21',
  '2026-12-22',
];
const before = dates.map((date, index) =>
  outcomeBar(date, 100 + index / 10, { high: 101 + index / 10, low: 99 + index / 10 }),
);
const lastDay = (rest: Partial<OutcomeBar> = {}) =>
  outcomeBar('2026-12-23', 106, { open: 101.5, high: 107, low: 96, ...rest });
const resolve = (bars: OutcomeBar[]) =>
  resolveEntry(
    { input, forecast: makeForecast(input, usOptionsCalendar), barsSince: bars, fills: [], ...nothingNoted(input) },
    usOptionsCalendar,
  );
const answers = ({ odds }: EntryOutcome) =>
  Object.fromEntries(
    odds.map(({ odds: { event }, happened, waitsFor }) => [event.kind, happened ?? waitsFor ?? 'no answer']),
  );

describe('options settled from the openings of their last day, held to expiry', () => {
  it('wait for the settlement value after the close of that day, whose close says nothing', () => {
    const outcome = resolve([...before, lastDay()]);
    const waitsFor = 'the settlement value of 2026-12-23';
    expect(outcome).toMatchObject({ move: null, moveWaitsFor: waitsFor, isComplete: false });
    expect(outcome.moveSoFar).toMatchObject({ sessionDate: '2026-12-22', endPrice: 100.8, sessions: 9 });
    expect(answers(outcome)).toEqual({
      'in-the-money': waitsFor,
      'profit-at-expiry': waitsFor,
      'touch-target': waitsFor,
      'touch-stop': waitsFor,
    });
  });

  it('resolve when the value arrives: a move over 9.3 sessions, the last one for its night only', () => {
    const outcome = resolve([...before, lastDay({ settlement: 102.5 })]);
    expect(outcome.move).toMatchObject({ endPrice: 102.5, pricedBy: 'settlement', sessionDate: '2026-12-23' });
    expect(outcome.move?.sessions).toBeCloseTo(9.3, 12);
    expect(outcome.move?.inSigmas).toBeCloseTo(Math.log(1.025) / (0.015 * Math.sqrt(9.3)), 12);
    expect(outcome).toMatchObject({ moveWaitsFor: null, isComplete: true });
  });

  it('count the last return of the realised volatility as the share of a night', () => {
    const { realisedVolatility } = resolve([...before, lastDay({ settlement: 102.5 })]);
    expect(realisedVolatility?.sessions).toBeCloseTo(9.3, 12);
    const prices = [100, ...before.map(({ close }) => close), 102.5];
    const squares = prices.slice(1).map((price, index) => Math.log(price / (prices[index] ?? price)) ** 2);
    const sum = squares.reduce((total, square) => total + square, 0);
    expect(realisedVolatility?.dailyVolatility).toBeCloseTo(Math.sqrt(sum / 9.3), 14);
  });

  it('count no touch after the settlement, however far the last day ran', () => {
    expect(answers(resolve([...before, lastDay({ settlement: 102.5 })]))).toMatchObject({
      'in-the-money': true,
      'touch-target': false,
      'touch-stop': false,
    });
  });

  it('count a settlement value beyond a level as its touch', () => {
    expect(answers(resolve([...before, lastDay({ settlement: 103 })]))).toMatchObject({ 'touch-target': true });
  });

  it('know a touch of an earlier session without waiting', () => {
    const touched = before.map((bar) => (bar.sessionDate === '2026-12-14' ? { ...bar, low: 96.9 } : bar));
    expect(answers(resolve([...touched, lastDay()]))).toMatchObject({ 'touch-stop': true });
  });
});
