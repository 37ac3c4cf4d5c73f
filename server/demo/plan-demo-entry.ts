import { europeanOptionPrice } from '@/journal/pricing/european-option';
import { calendarYears } from '@/journal/sessions/calendar-years';
import { addSessions } from '@/journal/sessions/exchange-calendar';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { demoIdeas, demoTags, type DemoUnderlying } from '@/server/demo/demo-scenario';
import { type Random } from '@/server/demo/seeded-random';
import { type DraftLeg, type DraftPlan } from '@/shared/entries/draft-plan';
import { newDraftPlan } from '@/shared/entries/new-draft-plan';
import { type DeskSettings } from '@/shared/desk/desk-settings';

/** Where and when a demo plan is written. */
export interface DemoMoment {
  readonly underlying: DemoUnderlying;
  readonly underlyingId: string;
  readonly sessionDate: string;
  readonly closesAt: string;
  readonly close: number;
  /** What the market prices in, per session. */
  readonly impliedVolatility: number;
}

type Shape = readonly (readonly [side: DraftLeg['side'], type: DraftLeg['type'], steps: number])[];

/** Strikes as steps from the money. */
const shapes: readonly Shape[] = [
  [['buy', 'call', 2]],
  [['buy', 'put', -2]],
  [
    ['sell', 'put', -3],
    ['buy', 'put', -5],
  ],
  [
    ['sell', 'call', 3],
    ['buy', 'call', 5],
  ],
  [
    ['buy', 'call', 0],
    ['sell', 'call', 3],
  ],
  [
    ['buy', 'call', 0],
    ['buy', 'put', 0],
  ],
  [
    ['buy', 'put', -6],
    ['sell', 'put', -3],
    ['sell', 'call', 3],
    ['buy', 'call', 6],
  ],
];

export interface DemoPlan {
  readonly plan: DraftPlan;
  readonly expirySessionDate: string;
  readonly holdingSessions: number;
}

/** A plan as a trader of the demo desk would write it at a close. */
export function planDemoEntry(
  moment: DemoMoment,
  settings: DeskSettings,
  random: Random,
  nextId: () => string,
): DemoPlan {
  const { underlying, close, closesAt, sessionDate } = moment;
  const toExpiry = random.whole(4, 22);
  const expirySessionDate = addSessions(usOptionsCalendar, sessionDate, toExpiry).date;
  const holdsToExpiry = random.next() < 0.5;
  const holdingSessions = holdsToExpiry ? toExpiry : random.whole(2, Math.max(2, Math.floor(toExpiry / 2)));
  const quantity = random.whole(1, underlying.strikeStep > 5 ? 2 : 5);
  const legs = random.pick(shapes).map(([side, type, steps]): DraftLeg => {
    const strike = (Math.round(close / underlying.strikeStep) + steps) * underlying.strikeStep;
    return {
      id: nextId(),
      side,
      type,
      strikePrice: String(strike),
      expirySessionDate,
      quantity: String(quantity),
      premium: premiumOf({ ...moment, type, strike, expirySessionDate, sessions: toExpiry }, settings).toFixed(2),
    };
  });
  const sigma = moment.impliedVolatility * Math.sqrt(holdingSessions) * close;
  const hasLevels = random.next() < 0.5;
  const plan: DraftPlan = {
    ...newDraftPlan(moment.underlyingId, settings),
    spotPrice: close.toFixed(2),
    spotAt: closesAt,
    legs,
    holding: holdsToExpiry ? 'toExpiry' : 'sessions',
    holdingSessions: holdsToExpiry ? '' : String(holdingSessions),
    targetPrice: hasLevels ? (close + 0.9 * sigma).toFixed(2) : '',
    stopPrice: hasLevels ? (close - 0.8 * sigma).toFixed(2) : '',
    idea: random.pick(demoIdeas),
    exitRule: hasLevels
      ? 'If target or stop is passed at a close, close at the next open. If neither, close on the planned day.'
      : 'Close on the planned day, whatever it shows.',
    tags: [random.pick(demoTags)],
  };
  return {
    plan: { ...plan, volatility: { ...plan.volatility, window: random.pick([21, 63, 126] as const) } },
    expirySessionDate,
    holdingSessions,
  };
}

/** What the market asks for a leg: the model at the implied volatility, at least a cent. */
export function premiumOf(
  leg: Pick<DemoMoment, 'close' | 'closesAt' | 'impliedVolatility' | 'underlying'> & {
    type: 'call' | 'put';
    strike: number;
    expirySessionDate: string;
    sessions: number;
  },
  { ratePerYear }: DeskSettings,
): number {
  const expiry = usOptionsCalendar.sessionOn(leg.expirySessionDate);
  const price = europeanOptionPrice({
    type: leg.type,
    spotPrice: leg.close,
    strikePrice: leg.strike,
    dailyVolatility: leg.impliedVolatility,
    sessions: leg.sessions,
    years: expiry === null ? 0 : calendarYears(leg.closesAt, expiry.closesAt),
    ratePerYear,
    dividendYield: leg.underlying.fields.dividendYield,
  });
  return Math.max(0.01, Math.round(price * 100) / 100);
}
