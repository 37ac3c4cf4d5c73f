import { isFlat } from '@/journal/fills/position';
import { matchLots } from '@/journal/fills/lots';
import { type Fill } from '@/journal/fills/fill';
import { lawAt, planModel, planLogDrift, type PlanModel } from '@/journal/forecast/plan-model';
import { planHorizon } from '@/journal/forecast/plan-horizon';
import { toModelNumber } from '@/journal/money/decimal';
import {
  type EntryOutcome,
  type MoveOutcome,
  type OutcomeBar,
  type OutcomeQuestion,
  type ResolvedOdds,
} from '@/journal/outcome/entry-outcome';
import { profitPercentile } from '@/journal/outcome/profit-percentile';
import { realisedMove } from '@/journal/outcome/realised-move';
import { realisedVolatility, volatilityRatioRange } from '@/journal/outcome/realised-volatility';
import { answerOdds, settlementValue } from '@/journal/outcome/resolve-odds';
import { brierScore } from '@/journal/scoring/brier-score';
import { clippedLogScore } from '@/journal/scoring/log-score';
import { type ExchangeCalendar, nextSession, sessionsInRange } from '@/journal/sessions/exchange-calendar';
import { instantMilliseconds } from '@/journal/sessions/instant';
import { sessionEndingAfter, sessionsBetween } from '@/journal/sessions/session-clock';

/** A cent either way: a fill's profit and a forecast's point mass may differ by rounding. */
const HALF_A_CENT = 0.005;

/**
 * Expected against realised for one entry, from its seal, its fills and the bars since.
 * @returns what is known so far; nothing is guessed, and what is not known says what it waits for.
 * @throws {DomainError} as planHorizon, planModel and signFills.
 * @see the functions it composes.
 */
export function resolveEntry(question: OutcomeQuestion, calendar: ExchangeCalendar): EntryOutcome {
  const { input, forecast, fills, barsSince } = question;
  const model = planModel(input, planHorizon(input, calendar));
  const isFinal = fills.length > 0 && isFlat(fills);
  const profit = profitOutcome(model, fills, isFinal);
  const afterExit = nextSession(calendar, forecast.exitSessionDate);
  const first = sessionEndingAfter(calendar, instantMilliseconds(input.spot.at));
  const context = {
    model,
    barsSince,
    watchedSessionDates: sessionsInRange(calendar, { from: first.date, through: forecast.exitSessionDate }).map(
      ({ date }) => date,
    ),
    profitByExit:
      profit !== null && isFinal && fills.every(({ tradedAt }) => tradedAt < afterExit.opensAt)
        ? toModelNumber(profit.realised)
        : null,
    startsInsideSession: first.opensAt < input.spot.at,
  };
  const odds = forecast.odds.map((stated): ResolvedOdds => {
    const answer = answerOdds(stated, context);
    if (answer.kind === 'waiting') {
      return {
        odds: stated,
        happened: null,
        brierScore: null,
        marketBrierScore: null,
        logScore: null,
        waitsFor: answer.waitsFor,
        monitoredBy: null,
      };
    }
    const { happened, monitoredBy } = answer;
    return {
      odds: stated,
      happened,
      brierScore: brierScore(stated.probability.base, happened),
      marketBrierScore: stated.marketImplied === null ? null : brierScore(stated.marketImplied, happened),
      logScore: clippedLogScore(stated.probability.base, happened).score,
      waitsFor: null,
      monitoredBy,
    };
  });
  const endDate = moveEndDate(model, fills, isFinal, calendar);
  const endBar = barsSince.find((bar) => bar.sessionDate === endDate);
  const lastBar = barsSince.filter((bar) => bar.sessionDate <= endDate).at(-1);
  const move = endBar === undefined ? null : moveTo(model, endBar, calendar);
  return {
    move,
    moveSoFar: move === null && lastBar !== undefined ? moveTo(model, lastBar, calendar) : null,
    realisedVolatility: volatilityOver(
      model,
      barsSince.filter((bar) => bar.sessionDate <= endDate),
      calendar,
    ),
    odds,
    profit,
    isComplete: odds.every(({ happened }) => happened !== null) && (fills.length === 0 || isFinal),
  };
}

/** The planned exit's session, or that of the last fill when the position was flat before. */
function moveEndDate(model: PlanModel, fills: readonly Fill[], isFinal: boolean, calendar: ExchangeCalendar): string {
  const planned = model.horizon.exitSessionDate;
  if (!isFinal) return planned;
  const last = fills.reduce((latest, fill) => (fill.tradedAt > latest ? fill.tradedAt : latest), model.input.spot.at);
  // A fill booked at the very close belongs to the session that closes then.
  const session = sessionEndingAfter(calendar, instantMilliseconds(last) - 1).date;
  return session < planned ? session : planned;
}

function moveTo(model: PlanModel, bar: OutcomeBar, calendar: ExchangeCalendar): MoveOutcome | null {
  const { input, spotPrice, horizon } = model;
  const session = calendar.sessionOn(bar.sessionDate);
  if (session === null) return null;
  const settings = { overnightShare: input.overnightShare };
  const sessions = sessionsBetween({ calendar, from: input.spot.at, to: session.closesAt, settings });
  const isExpiry = bar.sessionDate === horizon.expirySessionDate;
  const endPrice = (isExpiry ? settlementValue({ model, barsSince: [bar] }) : null) ?? bar.close;
  const variance = input.volatility.base ** 2;
  // The drift of the hold, in proportion to the sessions that really passed.
  const drift = (planLogDrift(model, input.drift, input.volatility.base, 'exit') / horizon.sessions.holding) * sessions;
  if (!(sessions > 0 && variance > 0)) return null;
  const { logReturn, inSigmas, percentile } = realisedMove({
    startPrice: spotPrice,
    endPrice,
    dailyVolatility: input.volatility.base,
    sessions,
    logDrift: drift,
  });
  return { sessionDate: bar.sessionDate, sessions, startPrice: spotPrice, endPrice, logReturn, inSigmas, percentile };
}

function volatilityOver(
  model: PlanModel,
  bars: readonly OutcomeBar[],
  calendar: ExchangeCalendar,
): EntryOutcome['realisedVolatility'] {
  const { input, spotPrice } = model;
  const settings = { overnightShare: input.overnightShare };
  let from = input.spot.at;
  let price = spotPrice;
  const returns: { logReturn: number; sessions: number }[] = [];
  for (const bar of bars) {
    const session = calendar.sessionOn(bar.sessionDate);
    if (session === null) continue;
    const sessions = sessionsBetween({ calendar, from, to: session.closesAt, settings });
    if (sessions > 0) returns.push({ logReturn: Math.log(bar.close / price), sessions });
    from = session.closesAt;
    price = bar.close;
  }
  if (returns.length === 0) return null;
  const { dailyVolatility, sessions } = realisedVolatility(returns);
  const degreesOfFreedom = input.volatility.window === null ? null : input.volatility.window - 1;
  const range =
    degreesOfFreedom === null ? null : volatilityRatioRange({ returnsRealised: returns.length, degreesOfFreedom });
  return {
    dailyVolatility,
    sessions,
    ratio: dailyVolatility / input.volatility.base,
    ratioLow: range?.low ?? null,
    ratioHigh: range?.high ?? null,
  };
}

function profitOutcome(model: PlanModel, fills: readonly Fill[], isFinal: boolean): EntryOutcome['profit'] {
  if (fills.length === 0) return null;
  const { realisedProfit, fees } = matchLots(fills, { method: 'fifo' });
  const horizon = model.horizon.holdsToExpiry ? 'expiry' : 'exit';
  const law = lawAt(model, horizon, model.input.volatility.base, model.input.drift);
  const place = isFinal
    ? profitPercentile({
        profit: toModelNumber(realisedProfit),
        distribution: {
          below: (amount) => law.below(amount - HALF_A_CENT),
          atOrBelow: (amount) => law.atOrBelow(amount + HALF_A_CENT),
        },
      })
    : null;
  return {
    realised: realisedProfit,
    fees,
    isFinal,
    percentileLow: place?.low ?? null,
    percentileHigh: place?.high ?? null,
    horizon,
    expectedMean: law.mean,
  };
}
