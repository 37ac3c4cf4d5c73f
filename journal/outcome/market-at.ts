import { type MarketState } from '@/journal/attribution/attributed-leg';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { type Fill, type Instrument } from '@/journal/fills/fill';
import { toModelNumber } from '@/journal/money/decimal';
import { type OutcomeBar } from '@/journal/outcome/entry-outcome';
import { settlementOf } from '@/journal/outcome/settlement-value';
import { calendarYears } from '@/journal/sessions/calendar-years';
import { type ExchangeCalendar } from '@/journal/sessions/exchange-calendar';
import { instantMilliseconds } from '@/journal/sessions/instant';
import { sessionEndingAfter, sessionsToExpiry } from '@/journal/sessions/session-clock';

/** Prices that were noted when a fill was typed; decimal text, null where they were not. */
export interface FillMarks {
  readonly underlyingPrice: string | null;
  readonly midPrice: string | null;
}

/** Where a price of the underlying comes from: noted with the fill, official at expiry, or the close of the fill's session. */
export type UnderlyingSource = 'noted' | 'settlement' | 'close';

export interface MarketQuestion {
  readonly input: ForecastInput;
  readonly barsSince: readonly OutcomeBar[];
  readonly calendar: ExchangeCalendar;
}

/**
 * The price of the underlying at the time of a fill, as well as it is known.
 * @param noted decimal text of the price noted with the fill, or null.
 * @returns null while the close of the fill's session is not there.
 */
export function underlyingAt(
  { input, barsSince, calendar }: MarketQuestion,
  at: string,
  noted: string | null,
): { readonly price: number; readonly source: UnderlyingSource } | null {
  if (noted !== null) return { price: toModelNumber(noted), source: 'noted' };
  if (at <= input.spot.at) return { price: toModelNumber(input.spot.price), source: 'close' };
  // A fill booked at the very close belongs to the session that closes then.
  const session = sessionEndingAfter(calendar, instantMilliseconds(at) - 1);
  const bar = barsSince.find(({ sessionDate }) => sessionDate === session.date);
  return bar === undefined ? null : { price: bar.close, source: 'close' };
}

/**
 * The price of the underlying at a fill: as underlyingAt, but an option that ends on its expiry day ends by the settlement value.
 * @param noted decimal text of the price noted with the fill, or null.
 * @returns null while that value, or the close of the fill's session, is not there.
 */
export function underlyingAtFill(
  question: MarketQuestion,
  { kind, instrument, tradedAt }: Fill,
  noted: string | null,
): { readonly price: number; readonly source: UnderlyingSource } | null {
  const isEnding = kind !== 'buy' && kind !== 'sell';
  const session = sessionEndingAfter(question.calendar, instantMilliseconds(tradedAt) - 1);
  const isSettled = isEnding && instrument.kind === 'option' && instrument.expirySessionDate === session.date;
  if (!isSettled || noted !== null) return underlyingAt(question, tradedAt, noted);
  const bar = question.barsSince.find(({ sessionDate }) => sessionDate === session.date);
  const price = bar === undefined ? null : settlementOf(question.input, bar);
  return price === null ? null : { price, source: 'settlement' };
}

/**
 * What the clocks say of an instrument at a moment, beside a price of the underlying.
 * @throws {DomainError} as sessionsToExpiry.
 */
export function marketState(
  { input, calendar }: MarketQuestion,
  { at, spotPrice, instrument }: { readonly at: string; readonly spotPrice: number; readonly instrument: Instrument },
): MarketState {
  const { ratePerYear, overnightShare, underlying } = input;
  const { dividendYield, settlementTime: settlement } = underlying;
  if (instrument.kind === 'stock') return { spotPrice, sessions: 0, years: 0, ratePerYear, dividendYield };
  const { expirySessionDate } = instrument;
  const expiry = calendar.sessionOn(expirySessionDate);
  const endsAt = settlement === 'am' ? expiry?.opensAt : expiry?.closesAt;
  return {
    spotPrice,
    sessions: sessionsToExpiry({ calendar, from: at, expirySessionDate, settlement, settings: { overnightShare } }),
    years: endsAt === undefined ? 0 : calendarYears(at, endsAt),
    ratePerYear,
    dividendYield,
  };
}
