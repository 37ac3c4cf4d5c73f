import { type PlanModel } from '@/journal/forecast/plan-model';
import { type OutcomeBar, type PricedBy } from '@/journal/outcome/entry-outcome';
import { type HoldEnd } from '@/journal/outcome/hold-end';
import { settlementOf } from '@/journal/outcome/settlement-value';
import { type ExchangeCalendar, previousSession } from '@/journal/sessions/exchange-calendar';

export interface ObservedPrice {
  readonly at: string;
  readonly sessionDate: string;
  readonly price: number;
  readonly pricedBy: PricedBy;
}

export interface PricePath {
  /** After the moment of the spot price, oldest first, none later than the end of the hold where that can be helped. */
  readonly observed: readonly ObservedPrice[];
  /** What the last price of the hold waits for; null when it is there. */
  readonly waitsFor: string | null;
}

/**
 * The prices that daily bars give for a hold: the closes before its last session, and of that session what was seen by the end.
 * @param barsSince bars of sessions that close after the moment of the spot price, oldest first.
 */
export function pricePath(
  { model, barsSince, end }: { model: PlanModel; barsSince: readonly OutcomeBar[]; end: HoldEnd },
  calendar: ExchangeCalendar,
): PricePath {
  const { at: startsAt } = model.input.spot;
  const { session, kind } = end;
  const observed = barsSince.flatMap((bar): ObservedPrice[] => {
    const itsSession = bar.sessionDate < session.date ? calendar.sessionOn(bar.sessionDate) : null;
    if (itsSession === null) return [];
    return [{ at: itsSession.closesAt, sessionDate: bar.sessionDate, price: bar.close, pricedBy: 'close' }];
  });
  const last = barsSince.find(({ sessionDate }) => sessionDate === session.date);
  const endedBy = (at: string, price: number, pricedBy: PricedBy): PricePath => ({
    observed: [...observed, { at, sessionDate: session.date, price, pricedBy }],
    waitsFor: null,
  });
  const waiting = (waitsFor: string): PricePath => ({ observed, waitsFor });

  if (kind === 'settled-from-openings') {
    // The close of that day comes after the settlement and says nothing of it.
    return last?.settlement == null
      ? waiting(`the settlement value of ${session.date}`)
      : endedBy(session.opensAt, last.settlement, 'settlement');
  }
  if (last === undefined) return waiting(`the close of ${session.date}`);
  if (kind === 'close') {
    const settlement = session.date === model.horizon.expirySessionDate ? settlementOf(model.input, last) : null;
    return endedBy(session.closesAt, settlement ?? last.close, 'close');
  }
  if (last.open !== null && session.opensAt > startsAt) return endedBy(session.opensAt, last.open, 'open');
  const before = previousSession(calendar, session.date);
  if (!(before.closesAt > startsAt)) return endedBy(session.closesAt, last.close, 'close-after-exit');
  return observed.at(-1)?.sessionDate === before.date
    ? { observed, waitsFor: null }
    : waiting(`the close of ${before.date}`);
}
