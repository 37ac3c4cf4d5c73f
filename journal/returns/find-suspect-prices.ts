import { DomainError } from '@/journal/errors/domain-error';
import { exactSum } from '@/journal/returns/exact-sum';
import { logReturns } from '@/journal/returns/log-returns';
import { quantile } from '@/journal/returns/quantile';
import { type ExchangeCalendar, sessionsInRange } from '@/journal/sessions/exchange-calendar';
import { addDays, type SessionDate } from '@/journal/sessions/session-date';

/** One session's prices as they came; what is not known is null or left out. */
export interface CheckedPrice {
  readonly sessionDate: SessionDate;
  readonly close: number;
  readonly open?: number | null;
  readonly high?: number | null;
  readonly low?: number | null;
  readonly volume?: number | null;
}

export interface SuspectPrice {
  readonly sessionDate: SessionDate;
  readonly what: 'far-move' | 'repeated-close' | 'missing-sessions' | 'outside-range' | 'no-range' | 'stale';
  /** A phrase that says why and what to check, ending with a full stop. */
  readonly why: string;
}

/** Beyond so many usual deviations a return is pointed out. */
export const suspectDeviations = 6;
/** So many equal closes one after the other are pointed out. */
const repeatedCloses = 4;
/** With fewer returns nothing is usual. */
const fewestReturns = 20;
/** Of a normal sample, the deviation in units of its median absolute deviation. */
const deviationPerMedianDeviation = 1.4826;

/**
 * Prices that a person should look at before they are used; nothing is changed or left out.
 * - far-move: a log return more than 6 usual deviations from the median return. The usual deviation is 1.4826 times the median absolute
 *   deviation, so that a slip does not hide itself; where more than half the returns are the same, the sample deviation of the others.
 *   With fewer than 20 returns none is pointed out.
 * - repeated-close: 4 or more closes in a row that are the same, named at the last.
 * - outside-range: a high below the low, or an open or close outside them.
 * - no-range: open, high, low and close all the same, and no volume known to explain it.
 * - missing-sessions: sessions of the calendar without a price between two that have one, named at the later.
 * - stale: more than one session of the calendar has closed since the last price.
 * @param prices by rising session, closes above 0 and finite, adjusted for splits and dividends (or the days of those are pointed out).
 * @param options.calendar for missing-sessions and stale; `latestSessionDate`, the last session that has closed, for stale.
 * @returns in the order of sessions, those of one session in the order above.
 * @throws {DomainError} `session-dates-not-rising`, `close-invalid`, each with the index.
 * @see 6 deviations, 4 closes: common practice; median absolute deviation: Hampel (1974), J. American Statistical Association 69.
 */
export function findSuspectPrices(
  prices: readonly CheckedPrice[],
  {
    calendar,
    latestSessionDate,
  }: { readonly calendar?: ExchangeCalendar; readonly latestSessionDate?: SessionDate } = {},
): SuspectPrice[] {
  requireRisingCloses(prices);
  const suspects = [
    ...farMoves(prices),
    ...runsOfCloses(prices),
    ...prices.flatMap(rangeSuspects),
    ...(calendar === undefined ? [] : gaps(prices, calendar)),
    ...(calendar === undefined || latestSessionDate === undefined
      ? []
      : staleness(prices, calendar, latestSessionDate)),
  ];
  return suspects.sort((left, right) =>
    left.sessionDate < right.sessionDate ? -1 : Number(left.sessionDate > right.sessionDate),
  );
}

function requireRisingCloses(prices: readonly CheckedPrice[]): void {
  for (const [index, { sessionDate, close }] of prices.entries()) {
    const before = prices[index - 1];
    if (before !== undefined && !(sessionDate > before.sessionDate))
      throw new DomainError('session-dates-not-rising', { index });
    if (!(close > 0 && close < Infinity)) throw new DomainError('close-invalid', { index, close });
  }
}

function farMoves(prices: readonly CheckedPrice[]): SuspectPrice[] {
  if (prices.length <= fewestReturns) return [];
  const returns = logReturns(prices.map(({ close }) => close));
  const middle = quantile(returns, 0.5);
  const distances = returns.map((value) => Math.abs(value - middle));
  const usual = deviationPerMedianDeviation * quantile(distances, 0.5);
  const squares = exactSum(distances.map((distance) => distance ** 2));
  return distances.flatMap((distance, at) => {
    const others = Math.sqrt(Math.max(0, squares - distance ** 2) / (distances.length - 2));
    const deviation = usual > 0 ? usual : others;
    const price = prices[at + 1];
    if (price === undefined || !(distance > suspectDeviations * deviation)) return [];
    const percent = (100 * Math.expm1(returns[at] ?? 0)).toFixed(1);
    const times = deviation > 0 ? `${(distance / deviation).toFixed(1)} times the usual` : 'where no other moves';
    const why = `a move of ${percent} % on the session before, ${times}. Check the close.`;
    return [{ sessionDate: price.sessionDate, what: 'far-move' as const, why }];
  });
}

function runsOfCloses(prices: readonly CheckedPrice[]): SuspectPrice[] {
  let run = 0;
  return prices.flatMap(({ sessionDate, close }, at) => {
    run = close === prices[at - 1]?.close ? run + 1 : 1;
    if (run < repeatedCloses || close === prices[at + 1]?.close) return [];
    const why = `the same close for ${run} sessions. Check whether it was carried on.`;
    return [{ sessionDate, what: 'repeated-close' as const, why }];
  });
}

function rangeSuspects({ sessionDate, open, high, low, close, volume }: CheckedPrice): SuspectPrice[] {
  const top = high ?? Infinity;
  const bottom = low ?? -Infinity;
  const within = (price: number) => price >= bottom && price <= top;
  if (!(top >= bottom && within(close) && within(open ?? close))) {
    const why = 'the open, high, low and close do not fit each other. Check all four.';
    return [{ sessionDate, what: 'outside-range', why }];
  }
  const isFlat = open === close && high === close && low === close;
  if (!isFlat || (volume ?? 0) > 0) return [];
  return [
    { sessionDate, what: 'no-range', why: 'open, high, low and close are the same. Check whether it was traded.' },
  ];
}

function gaps(prices: readonly CheckedPrice[], calendar: ExchangeCalendar): SuspectPrice[] {
  return prices.slice(1).flatMap(({ sessionDate }, at) => {
    const before = prices[at]?.sessionDate ?? sessionDate;
    const missing = sessionsInRange(calendar, { from: addDays(before, 1), through: addDays(sessionDate, -1) });
    const [first] = missing;
    if (first === undefined) return [];
    const named =
      missing.length === 1
        ? `the session of ${first.date} has`
        : `${missing.length} sessions from ${first.date} on have`;
    return [
      {
        sessionDate,
        what: 'missing-sessions' as const,
        why: `${named} no price before this one. Add what is missing.`,
      },
    ];
  });
}

function staleness(
  prices: readonly CheckedPrice[],
  calendar: ExchangeCalendar,
  latestSessionDate: SessionDate,
): SuspectPrice[] {
  const last = prices.at(-1)?.sessionDate;
  if (last === undefined || last >= latestSessionDate) return [];
  const closed = sessionsInRange(calendar, { from: addDays(last, 1), through: latestSessionDate }).length;
  if (closed <= 1) return [];
  return [{ sessionDate: last, what: 'stale', why: `${closed} sessions have closed since. Add their prices.` }];
}
