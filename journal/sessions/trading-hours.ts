import { Temporal } from 'temporal-polyfill';
import { type ExchangeCalendar, type ExchangeSession } from '@/journal/sessions/exchange-calendar';
import { exchangeDateAt } from '@/journal/sessions/exchange-date';
import { instantMilliseconds } from '@/journal/sessions/instant';
import { addDays, type SessionDate } from '@/journal/sessions/session-date';

/** A stretch of trading of one session, in the exchange's time, 'HH:MM'; its open belongs to it, its close does not. */
export interface TradingSegment {
  readonly kind: 'overnight' | 'early' | 'regular' | 'late';
  readonly opens: string;
  readonly closes: string;
  /** Opens on the calendar day before the session. */
  readonly opensDayBefore?: boolean;
}

/** Hours of a class of products over a stretch of dates. */
export interface TradingHours {
  readonly productClass: string;
  readonly name: string;
  /** First session date; null while approved but not begun: never in force. */
  readonly from: SessionDate | null;
  /** Last session date, if there is one. */
  readonly to?: SessionDate;
  readonly segments: readonly TradingSegment[];
  /** On early closes; none when empty. */
  readonly earlyCloseSegments: readonly TradingSegment[];
  readonly source: string;
  /** Not checked against the source's text. */
  readonly fromMemory: boolean;
}

export interface SegmentInProgress {
  readonly hours: TradingHours;
  readonly segment: TradingSegment;
  readonly sessionDate: SessionDate;
}

/**
 * The trading segment of a class of products an instant falls in, or null.
 * @param question.table dated rows; a desk may pass its own. @param question.at instant.
 * @throws {DomainError} `instant-invalid`, `outside-calendar`.
 */
export function tradingSegmentAt({
  table,
  calendar,
  productClass,
  at,
}: {
  readonly table: readonly TradingHours[];
  readonly calendar: ExchangeCalendar;
  readonly productClass: string;
  readonly at: string;
}): SegmentInProgress | null {
  const time = instantMilliseconds(at);
  const today = exchangeDateAt(calendar.timeZone, time);
  for (const sessionDate of [today, addDays(today, 1)]) {
    const session = calendar.sessionOn(sessionDate);
    if (session === null) continue;
    for (const hours of table) {
      if (hours.productClass !== productClass || !isInForce(hours, sessionDate)) continue;
      const segment = segmentsOn(hours, session).find((one) => isWithin(one, { sessionDate, time, calendar }));
      if (segment !== undefined) return { hours, segment, sessionDate };
    }
  }
  return null;
}

function isInForce({ from, to }: TradingHours, date: SessionDate): boolean {
  return from !== null && from <= date && (to === undefined || date <= to);
}

function segmentsOn({ segments, earlyCloseSegments }: TradingHours, { kind }: ExchangeSession) {
  return kind === 'early' ? earlyCloseSegments : segments;
}

function isWithin(
  { opens, closes, opensDayBefore = false }: TradingSegment,
  { sessionDate, time, calendar }: { sessionDate: SessionDate; time: number; calendar: ExchangeCalendar },
): boolean {
  const at = (date: SessionDate, local: string) =>
    Temporal.PlainDateTime.from(`${date}T${local}`).toZonedDateTime(calendar.timeZone).epochMilliseconds;
  return at(opensDayBefore ? addDays(sessionDate, -1) : sessionDate, opens) <= time && time < at(sessionDate, closes);
}
