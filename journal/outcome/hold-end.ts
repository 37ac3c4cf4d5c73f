import { type PlanModel } from '@/journal/forecast/plan-model';
import { type Fill } from '@/journal/fills/fill';
import { type ExchangeCalendar, type ExchangeSession } from '@/journal/sessions/exchange-calendar';
import { instantMilliseconds } from '@/journal/sessions/instant';
import { sessionEndingAfter } from '@/journal/sessions/session-clock';

/**
 * The end of a hold as daily bars see it: at a session's close, at its open, between the two, or with the value that settles
 * options from the openings of their last day.
 */
export interface HoldEnd {
  readonly kind: 'close' | 'open' | 'inside' | 'settled-from-openings';
  readonly session: ExchangeSession;
}

/**
 * Where the planned exit of a sealed plan falls.
 * @throws {RangeError} when the calendar does not know the plan's own exit session.
 */
export function plannedEnd({ horizon, input }: PlanModel, calendar: ExchangeCalendar): HoldEnd {
  const session = calendar.sessionOn(horizon.exitSessionDate);
  if (session === null) throw new RangeError('A plan exits in a session.');
  if (horizon.holdsToExpiry) {
    return { kind: input.underlying.settlementTime === 'am' ? 'settled-from-openings' : 'close', session };
  }
  if (horizon.exitAt >= session.closesAt) return { kind: 'close', session };
  return { kind: horizon.exitAt <= session.opensAt ? 'open' : 'inside', session };
}

/** The planned end, or, of a position that was flat in an earlier session, the close of the session of its last fill. */
export function reachedEnd(
  model: PlanModel,
  { fills, isFinal }: { readonly fills: readonly Fill[]; readonly isFinal: boolean },
  calendar: ExchangeCalendar,
): HoldEnd {
  const planned = plannedEnd(model, calendar);
  if (!isFinal) return planned;
  const last = fills.reduce((latest, fill) => (fill.tradedAt > latest ? fill.tradedAt : latest), model.input.spot.at);
  // A fill booked at the very close belongs to the session that closes then.
  const session = sessionEndingAfter(calendar, instantMilliseconds(last) - 1);
  return session.date < planned.session.date ? { kind: 'close', session } : planned;
}
