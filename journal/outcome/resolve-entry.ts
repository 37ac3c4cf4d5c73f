import { isFlat } from '@/journal/fills/position';
import { matchLots } from '@/journal/fills/lots';
import { type Fill } from '@/journal/fills/fill';
import { type StatedOdds } from '@/journal/forecast/forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { lawAt, planModel, planLogDrift, type PlanModel } from '@/journal/forecast/plan-model';
import { planHorizon } from '@/journal/forecast/plan-horizon';
import { toModelNumber } from '@/journal/money/decimal';
import { type Answer, type AnswerContext } from '@/journal/outcome/answer';
import {
  CANNOT_TELL,
  type EntryOutcome,
  type MoveOutcome,
  type OutcomeQuestion,
  type ResolvedOdds,
} from '@/journal/outcome/entry-outcome';
import { entryProcess } from '@/journal/outcome/entry-process';
import { plannedEnd, reachedEnd } from '@/journal/outcome/hold-end';
import { type ObservedPrice, pricePath } from '@/journal/outcome/price-path';
import { profitPercentile } from '@/journal/outcome/profit-percentile';
import { profitSources } from '@/journal/outcome/profit-sources';
import { realisedMove } from '@/journal/outcome/realised-move';
import { realisedVolatility, volatilityRatioRange } from '@/journal/outcome/realised-volatility';
import { answerOdds } from '@/journal/outcome/resolve-odds';
import { brierScore } from '@/journal/scoring/brier-score';
import { clippedLogScore } from '@/journal/scoring/log-score';
import { type ExchangeCalendar, nextSession, sessionsInRange } from '@/journal/sessions/exchange-calendar';
import { instantMilliseconds } from '@/journal/sessions/instant';
import { sessionEndingAfter, sessionsBetween } from '@/journal/sessions/session-clock';
import { ewmaEffectiveReturns } from '@/journal/volatility/ewma-daily-volatility';

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
  const context: AnswerContext = {
    model,
    barsSince,
    watchedSessionDates: sessionsInRange(calendar, { from: first.date, through: forecast.exitSessionDate }).map(
      ({ date }) => date,
    ),
    profitByExit:
      profit !== null && isFinal && fills.every(({ tradedAt }) => tradedAt < afterExit.opensAt)
        ? toModelNumber(profit.realised)
        : null,
    end: plannedEnd(model, calendar),
    startsInsideSession: first.opensAt < input.spot.at,
  };
  const odds = forecast.odds.map((stated) => resolvedOdds(stated, answerOdds(stated, context)));
  const path = pricePath({ model, barsSince, end: reachedEnd(model, { fills, isFinal }, calendar) }, calendar);
  const latest = moveTo(model, path.observed.at(-1), calendar);
  return {
    move: path.waitsFor === null ? latest : null,
    moveWaitsFor: path.waitsFor,
    moveSoFar: path.waitsFor === null ? null : latest,
    realisedVolatility: volatilityOver(model, path.observed, calendar),
    odds,
    profit,
    sources: isFinal ? profitSources({ ...question, calendar }) : null,
    process: entryProcess({ ...question, calendar }),
    isComplete: odds.every(({ waitsFor }) => waitsFor === null) && (fills.length === 0 || isFinal),
  };
}

function resolvedOdds(odds: StatedOdds, answer: Answer): ResolvedOdds {
  if (answer.kind !== 'known') {
    return {
      odds,
      happened: null,
      brierScore: null,
      marketBrierScore: null,
      logScore: null,
      waitsFor: answer.kind === 'waiting' ? answer.waitsFor : null,
      cannotTell: answer.kind === 'cannot-tell' ? CANNOT_TELL : null,
      monitoredBy: null,
    };
  }
  const { happened, monitoredBy } = answer;
  return {
    odds,
    happened,
    brierScore: brierScore(odds.probability.base, happened),
    marketBrierScore: odds.marketImplied === null ? null : brierScore(odds.marketImplied, happened),
    logScore: clippedLogScore(odds.probability.base, happened).score,
    waitsFor: null,
    cannotTell: null,
    monitoredBy,
  };
}

function moveTo(model: PlanModel, seen: ObservedPrice | undefined, calendar: ExchangeCalendar): MoveOutcome | null {
  if (seen === undefined) return null;
  const { input, spotPrice, horizon } = model;
  const settings = { overnightShare: input.overnightShare };
  const sessions = sessionsBetween({ calendar, from: input.spot.at, to: seen.at, settings });
  // The drift of the hold, in proportion to the sessions that really passed.
  const drift = (planLogDrift(model, input.drift, input.volatility.base, 'exit') / horizon.sessions.holding) * sessions;
  if (!(sessions > 0)) return null;
  const { sessionDate, price: endPrice, pricedBy } = seen;
  const move = realisedMove({
    startPrice: spotPrice,
    endPrice,
    dailyVolatility: input.volatility.base,
    sessions,
    logDrift: drift,
    degreesOfFreedom: volatilityDegrees(input.volatility),
  });
  return { sessionDate, pricedBy, sessions, startPrice: spotPrice, endPrice, ...move };
}

function volatilityOver(
  model: PlanModel,
  observed: readonly ObservedPrice[],
  calendar: ExchangeCalendar,
): EntryOutcome['realisedVolatility'] {
  const { input, spotPrice } = model;
  const settings = { overnightShare: input.overnightShare };
  let from = input.spot.at;
  let lastPrice = spotPrice;
  const returns: { logReturn: number; sessions: number }[] = [];
  for (const { at, price } of observed) {
    const sessions = sessionsBetween({ calendar, from, to: at, settings });
    if (sessions > 0) returns.push({ logReturn: Math.log(price / lastPrice), sessions });
    from = at;
    lastPrice = price;
  }
  if (returns.length === 0) return null;
  const { dailyVolatility, low, high, sessions, degreesOfFreedom: returnsRealised } = realisedVolatility(returns);
  const degreesOfFreedom = volatilityDegrees(input.volatility);
  const range = degreesOfFreedom === null ? null : volatilityRatioRange({ returnsRealised, degreesOfFreedom });
  return {
    dailyVolatility,
    low,
    high,
    sessions,
    ratio: dailyVolatility / input.volatility.base,
    ratioLow: range?.low ?? null,
    ratioHigh: range?.high ?? null,
  };
}

/** Returns that the plan's volatility rests on, less one where their mean was taken off; null when it was typed. */
function volatilityDegrees({ window, lambda }: ForecastInput['volatility']): number | null {
  if (window !== null) return window - 1;
  return lambda === null ? null : ewmaEffectiveReturns(lambda);
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
