import { DomainError } from '@/journal/errors/domain-error';
import { type ExchangeCalendar } from '@/journal/sessions/exchange-calendar';
import { instantMilliseconds } from '@/journal/sessions/instant';
import { sessionEndingAfter } from '@/journal/sessions/session-clock';
import { exchangeDateAt } from '@/journal/sessions/exchange-date';

/** When an event falls, as the session that takes its move sees it. */
export type EventTiming = 'before-open' | 'in-session' | 'after-close';

export interface PlacedEvent {
  readonly timing: EventTiming;
  /** The session that takes the move. */
  readonly sessionDate: string;
  /** When the price can show it: the event itself in session, else the next open. */
  readonly feltAt: string;
}

/**
 * Places an event on the calendar. From a close on it is `after-close` until the exchange's midnight, `before-open` from then on
 * (all day on a closed day).
 * @param at instant of the event.
 * @throws {DomainError} `instant-invalid`, `outside-calendar`.
 */
export function placeEvent(calendar: ExchangeCalendar, at: string): PlacedEvent {
  const time = instantMilliseconds(at);
  const session = sessionEndingAfter(calendar, time);
  if (Date.parse(session.opensAt) <= time) return { timing: 'in-session', sessionDate: session.date, feltAt: at };
  const today = calendar.sessionOn(exchangeDateAt(calendar.timeZone, time));
  const timing = today !== null && Date.parse(today.closesAt) <= time ? 'after-close' : 'before-open';
  return { timing, sessionDate: session.date, feltAt: session.opensAt };
}

/**
 * The events whose move falls into a hold: felt after its start and by its end. One announced after the close before the hold counts,
 * as the price the hold starts from does not know it yet.
 * @param hold.from instant. @param hold.to instant, later.
 * @throws {DomainError} `hold-out-of-order`, and as placeEvent.
 */
export function eventsInHold<Event extends { readonly at: string }>(
  events: readonly Event[],
  { calendar, from, to }: { readonly calendar: ExchangeCalendar; readonly from: string; readonly to: string },
): (Event & PlacedEvent)[] {
  const [start, end] = [instantMilliseconds(from), instantMilliseconds(to)];
  if (!(end > start)) throw new DomainError('hold-out-of-order', { from, to });
  return events
    .map((event) => ({ ...event, ...placeEvent(calendar, event.at) }))
    .filter(({ feltAt }) => {
      const felt = instantMilliseconds(feltAt);
      return felt > start && felt <= end;
    });
}
