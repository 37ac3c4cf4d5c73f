import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { type Drift } from '@/journal/odds/log-drift';
import { type ExchangeCalendar } from '@/journal/sessions/exchange-calendar';
import { sessionsToExpiry } from '@/journal/sessions/session-clock';
import { type DraftPlan } from '@/shared/entries/draft-plan';
import { type PlanProblem, readNumber, type Report } from '@/shared/entries/plan-problem';
import { checkExpiries, readLeg } from '@/shared/entries/read-plan-legs';
import { type PlanBar, readVolatility } from '@/shared/entries/read-plan-volatility';
import { type Underlying } from '@/shared/underlyings/underlying';

export type PlanReading =
  | { readonly kind: 'complete'; readonly input: ForecastInput }
  | { readonly kind: 'incomplete'; readonly problems: readonly PlanProblem[] };

export interface PlanContext {
  readonly draft: DraftPlan;
  readonly underlying: Underlying;
  /** Oldest first; only those up to the session of the spot are used. */
  readonly bars: readonly PlanBar[];
  readonly calendar: ExchangeCalendar;
}

/**
 * Reads a draft as a complete forecast input, or lists every problem with its field. The browser calls it on each
 * keystroke and the server before sealing, so both hold the same rules.
 */
export function readPlan({ draft, underlying, bars, calendar }: PlanContext): PlanReading {
  const problems: PlanProblem[] = [];
  const report: Report = (field, message) => void problems.push({ field, message });

  const spot = readSpot(draft, bars, calendar, report);
  const legs = draft.legs.map((leg, index) => readLeg(leg, index, calendar, report)).filter((leg) => leg !== null);
  if (draft.legs.length === 0) report('legs', 'The plan has no leg yet. Add a call or a put.');
  checkExpiries(draft, spot, underlying, calendar, report);
  const holding = readHolding(draft, report);
  const volatility = readVolatility(draft, spot, bars, calendar, report);
  const overnightPercent = readNumber(report, 'overnightSharePercent', draft.overnightSharePercent, {
    name: 'The overnight share',
    least: 0,
    most: 100,
  });
  const ratePercent = readNumber(report, 'ratePercent', draft.ratePercent, { name: 'The rate', least: -10, most: 50 });
  readNumber(report, 'feePerContract', draft.feePerContract, { name: 'The fee', least: 0 });
  const targetPrice = readLevel('targetPrice', draft.targetPrice, 'The target', report);
  const stopPrice = readLevel('stopPrice', draft.stopPrice, 'The stop', report);
  for (const [field, level] of Object.entries({ targetPrice, stopPrice })) {
    if (level !== null && spot !== null && Number(level) === Number(spot.price))
      report(field, 'The price is at this level already. Choose another one, or leave it empty.');
  }
  const expectedReturn = readExpectedReturn(draft, report);

  if (
    problems.length > 0 ||
    spot === null ||
    volatility === null ||
    ratePercent === null ||
    overnightPercent === null
  ) {
    return { kind: 'incomplete', problems };
  }
  const { symbol, style, settlement, settlementTime, multiplier, dividendYield } = underlying;
  const input: ForecastInput = {
    underlying: { symbol, style, settlement, settlementTime, multiplier, dividendYield },
    spot,
    legs,
    holding,
    volatility,
    drift: { kind: 'zeroReturn' },
    ratePerYear: ratePercent / 100,
    overnightShare: overnightPercent / 100,
    feePerContract: draft.feePerContract.trim(),
    targetPrice,
    stopPrice,
  };
  return { kind: 'complete', input: { ...input, drift: readDrift(draft, expectedReturn, input, calendar) } };
}

function readSpot(
  draft: DraftPlan,
  bars: readonly PlanBar[],
  calendar: ExchangeCalendar,
  report: Report,
): ForecastInput['spot'] | null {
  if (draft.spotPrice.trim() !== '') {
    const price = readNumber(report, 'spotPrice', draft.spotPrice, { name: 'The price of the underlying', above: 0 });
    if (draft.spotAt === '') report('spotAt', 'Say when the price of the underlying was seen.');
    return price === null || draft.spotAt === ''
      ? null
      : { price: draft.spotPrice.trim(), at: draft.spotAt, source: 'typed' };
  }
  const last = bars.at(-1);
  const session = last === undefined ? null : calendar.sessionOn(last.sessionDate);
  if (last === undefined || session === null) {
    report('spotPrice', 'This underlying has no prices yet. Upload its bars, or type its price.');
    return null;
  }
  return { price: last.close, at: session.closesAt, source: 'bar' };
}

function readHolding(draft: DraftPlan, report: Report): ForecastInput['holding'] {
  if (draft.holding === 'toExpiry') return { kind: 'toExpiry' };
  const rule = { name: 'The holding period', above: 0, most: 260 };
  const sessions = readNumber(report, 'holdingSessions', draft.holdingSessions, rule);
  return sessions === null ? { kind: 'toExpiry' } : { kind: 'sessions', sessions };
}

function readLevel(field: string, text: string, name: string, report: Report): string | null {
  if (text.trim() === '') return null;
  return readNumber(report, field, text, { name, above: 0 }) === null ? null : text.trim();
}

/** The price change over the hold the trader expects, as a fraction; 0 where the plan states none. */
function readExpectedReturn(draft: DraftPlan, report: Report): number {
  if (draft.drift.kind !== 'ownView') return 0;
  if (draft.drift.reason.trim() === '') report('drift.reason', 'An own view needs its reason. Write one sentence.');
  const rule = { name: 'Your expected change', above: -100, most: 1000 };
  return (readNumber(report, 'drift.expectedReturnPercent', draft.drift.expectedReturnPercent, rule) ?? 0) / 100;
}

/** An own view is stated over the hold; the engine takes it per session. */
function readDrift(draft: DraftPlan, expectedReturn: number, input: ForecastInput, calendar: ExchangeCalendar): Drift {
  if (draft.drift.kind !== 'ownView') return { kind: draft.drift.kind };
  const [leg] = input.legs;
  const sessions =
    input.holding.kind === 'sessions' || leg === undefined
      ? Number(draft.holdingSessions)
      : sessionsToExpiry({
          calendar,
          from: input.spot.at,
          expirySessionDate: leg.expirySessionDate,
          settlement: input.underlying.settlementTime,
          settings: { overnightShare: input.overnightShare },
        });
  return { kind: 'ownView', expectedLogReturnPerSession: Math.log1p(expectedReturn) / sessions };
}
