import { type PlannedLeg } from '@/journal/contracts/planned-leg';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { type ExchangeCalendar } from '@/journal/sessions/exchange-calendar';
import { isSessionDate } from '@/journal/sessions/session-date';
import { type DraftLeg, type DraftPlan } from '@/shared/entries/draft-plan';
import { knownSession } from '@/shared/entries/known-session';
import { readNumber, type Report } from '@/shared/entries/plan-problem';
import { type Underlying } from '@/shared/underlyings/underlying';

/** One leg as planned, or null after reporting each field that is missing or wrong. */
export function readLeg(leg: DraftLeg, index: number, calendar: ExchangeCalendar, report: Report): PlannedLeg | null {
  const at = (key: string) => `legs.${index}.${key}`;
  const name = (what: string) => `Leg ${index + 1}: the ${what}`;
  const strike = readNumber(report, at('strikePrice'), leg.strikePrice, { name: name('strike'), above: 0 });
  const quantity = readNumber(report, at('quantity'), leg.quantity, {
    name: name('quantity'),
    least: 1,
    most: 100_000,
    whole: true,
  });
  const premium = readNumber(report, at('premium'), leg.premium, { name: name('premium'), least: 0 });
  const expiry = readExpiry(leg.expirySessionDate, at('expirySessionDate'), name('expiry'), calendar, report);
  if (strike === null || quantity === null || premium === null || expiry === null) return null;
  return {
    id: leg.id,
    side: leg.side,
    type: leg.type,
    strikePrice: leg.strikePrice.trim(),
    expirySessionDate: expiry,
    quantity,
    premium: leg.premium.trim(),
  };
}

function readExpiry(
  text: string,
  field: string,
  name: string,
  calendar: ExchangeCalendar,
  report: Report,
): string | null {
  if (text === '') report(field, `${name} is missing. Choose a date.`);
  else if (!isSessionDate(text)) report(field, `${name} is not a date. Write it as YYYY-MM-DD.`);
  else if (knownSession(calendar, text) === undefined)
    report(field, `${name} ${text} lies beyond the calendar. Choose an earlier or later session.`);
  else if (knownSession(calendar, text) === null) {
    report(
      field,
      `${name} ${text} is no session (${calendar.closureReason(text) ?? 'closed'}). Choose the session before it.`,
    );
  } else return text;
  return null;
}

/** Reports expiries that differ between legs or lie before the price the plan starts from. */
export function checkExpiries(
  draft: DraftPlan,
  spot: ForecastInput['spot'] | null,
  underlying: Underlying,
  calendar: ExchangeCalendar,
  report: Report,
): void {
  const first = draft.legs[0]?.expirySessionDate;
  if (first === undefined || !isSessionDate(first)) return;
  for (const [index, leg] of draft.legs.entries()) {
    if (isSessionDate(leg.expirySessionDate) && leg.expirySessionDate !== first) {
      report(
        `legs.${index}.expirySessionDate`,
        `Leg ${index + 1}: all legs of a plan need one expiry. Choose ${first}, or plan the other expiry apart.`,
      );
    }
  }
  const session = knownSession(calendar, first) ?? null;
  if (spot === null || session === null) return;
  const endsAt = underlying.settlementTime === 'am' ? session.opensAt : session.closesAt;
  if (!(spot.at < endsAt)) {
    report(
      'legs.0.expirySessionDate',
      `Leg 1: the expiry ${first} is not after the price of the underlying. Choose a later expiry.`,
    );
  }
}
