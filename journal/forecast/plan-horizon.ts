import { DomainError } from '@/journal/errors/domain-error';
import { exitInstant } from '@/journal/forecast/exit-instant';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { calendarYears } from '@/journal/sessions/calendar-years';
import { type ExchangeCalendar } from '@/journal/sessions/exchange-calendar';
import { sessionsToExpiry } from '@/journal/sessions/session-clock';

/** Both clocks of a plan: to expiry and to the planned exit. */
export interface PlanHorizon {
  readonly expirySessionDate: string;
  readonly exitSessionDate: string;
  readonly exitAt: string;
  readonly sessions: { readonly toExpiry: number; readonly holding: number };
  readonly years: { readonly toExpiry: number; readonly holding: number };
  /** Calendar years over the next session, for theta. */
  readonly yearsPerNextSession: number;
  readonly holdsToExpiry: boolean;
}

const SAME_SESSIONS = 1e-9;

/**
 * Works out sessions and years of a plan.
 * @throws {DomainError} `legs-missing`, `legs-of-several-expiries` with the leg's index, `expiry-not-a-session`,
 *   `expiry-in-the-past`, `holding-not-positive`, `holding-beyond-expiry`.
 */
export function planHorizon(input: ForecastInput, calendar: ExchangeCalendar): PlanHorizon {
  const { legs, spot, underlying, holding } = input;
  const [first] = legs;
  if (first === undefined) throw new DomainError('legs-missing');
  const { expirySessionDate } = first;
  const other = legs.findIndex((leg) => leg.expirySessionDate !== expirySessionDate);
  if (other >= 0) throw new DomainError('legs-of-several-expiries', { legIndex: other });
  const expirySession = calendar.sessionOn(expirySessionDate);
  if (expirySession === null) throw new DomainError('expiry-not-a-session', { expirySessionDate });

  const settings = { overnightShare: input.overnightShare };
  const settlement = underlying.settlementTime;
  const toExpiry = sessionsToExpiry({ calendar, from: spot.at, expirySessionDate, settlement, settings });
  if (!(toExpiry > 0)) throw new DomainError('expiry-in-the-past', { expirySessionDate, spotAt: spot.at });
  const held = holding.kind === 'toExpiry' ? toExpiry : holding.sessions;
  if (!(held > 0)) throw new DomainError('holding-not-positive', { sessions: held });
  if (held > toExpiry + SAME_SESSIONS) throw new DomainError('holding-beyond-expiry', { sessions: held, toExpiry });
  const holdsToExpiry = held > toExpiry - SAME_SESSIONS;

  const expiresAt = settlement === 'am' ? expirySession.opensAt : expirySession.closesAt;
  const exit = holdsToExpiry
    ? { at: expiresAt, session: expirySession }
    : exitInstant({ calendar, from: spot.at, sessions: held, settings });
  const next = toExpiry > 1 ? exitInstant({ calendar, from: spot.at, sessions: 1, settings }).at : expiresAt;
  return {
    expirySessionDate,
    exitSessionDate: exit.session.date,
    exitAt: exit.at,
    sessions: { toExpiry, holding: holdsToExpiry ? toExpiry : held },
    years: { toExpiry: calendarYears(spot.at, expiresAt), holding: calendarYears(spot.at, exit.at) },
    yearsPerNextSession: calendarYears(spot.at, next),
    holdsToExpiry,
  };
}
