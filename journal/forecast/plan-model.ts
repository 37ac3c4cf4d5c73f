import { expiryPayoff, type ExpiryPayoff } from '@/journal/contracts/expiry-payoff';
import { modelPosition, type ModelPosition, openingCost, type OpeningCost } from '@/journal/contracts/position';
import { DomainError } from '@/journal/errors/domain-error';
import { curvedProfitLaw, type ProfitCurve } from '@/journal/forecast/curved-profit-law';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { type PlanHorizon } from '@/journal/forecast/plan-horizon';
import { profitLaw, type ProfitLaw } from '@/journal/forecast/profit-law';
import { repricedCurve } from '@/journal/forecast/repriced-curve';
import { type Drift, logDrift } from '@/journal/odds/log-drift';
import { europeanOptionValue, type EuropeanOption } from '@/journal/pricing/european-option';
import { impliedDailyVolatility, type ImpliedVolatility } from '@/journal/pricing/implied-daily-volatility';
import { toModelNumber } from '@/journal/money/decimal';
import { type RepricedLeg, type RepriceMoment, valueAtMoment } from '@/journal/scenarios/reprice';

/** A plan made ready for computing: exact costs, model numbers, implied volatilities. */
export interface PlanModel {
  readonly input: ForecastInput;
  readonly horizon: PlanHorizon;
  readonly spotPrice: number;
  readonly cost: OpeningCost;
  readonly position: ModelPosition;
  readonly payoff: ExpiryPayoff;
  readonly implied: readonly ImpliedVolatility[];
  /** Each leg at its implied volatility, at the plan's base where it has none. */
  readonly repricedLegs: readonly RepricedLeg[];
  /** Vega-weighted mean of the implied volatilities; null when a leg has none. */
  readonly impliedDailyVolatility: number | null;
}

/** @throws {DomainError} `spot-not-positive`, `strike-not-positive`, `volatility-order`, `decimal-invalid`, and as planHorizon. */
export function planModel(input: ForecastInput, horizon: PlanHorizon): PlanModel {
  const spotPrice = toModelNumber(input.spot.price);
  if (!(spotPrice > 0)) throw new DomainError('spot-not-positive', { spotPrice });
  const { low, base, high } = input.volatility;
  if (!(0 < low && low <= base && base <= high && high < Infinity))
    throw new DomainError('volatility-order', { low, base, high });
  const cost = openingCost(input.legs, {
    multiplier: input.underlying.multiplier,
    feePerContract: input.feePerContract,
  });
  const position = modelPosition(input.legs, input.underlying.multiplier, cost);
  const bad = position.legs.findIndex((leg) => !(leg.strikePrice > 0));
  if (bad >= 0) throw new DomainError('strike-not-positive', { legIndex: bad });

  const implied = position.legs.map((leg) =>
    impliedDailyVolatility({ ...optionOf(input, horizon, spotPrice, leg), price: leg.premium }),
  );
  return {
    input,
    horizon,
    spotPrice,
    cost,
    position,
    payoff: expiryPayoff({ legs: position.legs, cost: position.costToOpen }),
    implied,
    repricedLegs: position.legs.map((leg, index) => {
      const found = implied[index];
      return { ...leg, dailyVolatility: found?.kind === 'found' ? found.dailyVolatility : base };
    }),
    impliedDailyVolatility: meanImplied(input, horizon, spotPrice, position, implied),
  };
}

/** What the pricing formula needs of a leg, but its volatility. */
export function optionOf(
  input: ForecastInput,
  horizon: PlanHorizon,
  spotPrice: number,
  leg: { readonly type: 'call' | 'put'; readonly strikePrice: number },
): Omit<EuropeanOption, 'dailyVolatility'> {
  return {
    type: leg.type,
    spotPrice,
    strikePrice: leg.strikePrice,
    sessions: horizon.sessions.toExpiry,
    years: horizon.years.toExpiry,
    ratePerYear: input.ratePerYear,
    dividendYield: input.underlying.dividendYield,
  };
}

/** Common practice: weighting by vega gives each leg the say its price has over volatility. */
function meanImplied(
  input: ForecastInput,
  horizon: PlanHorizon,
  spotPrice: number,
  position: ModelPosition,
  implied: readonly ImpliedVolatility[],
): number | null {
  let weights = 0;
  let sum = 0;
  for (const [index, leg] of position.legs.entries()) {
    const found = implied[index];
    if (found?.kind !== 'found') return null;
    const option = { ...optionOf(input, horizon, spotPrice, leg), dailyVolatility: found.dailyVolatility };
    const weight = europeanOptionValue(option).vegaPerDailyPoint * Math.abs(leg.signedShares);
    weights += weight;
    sum += weight * found.dailyVolatility;
  }
  return weights > 0 ? sum / weights : null;
}

/** Mean of the log price under a drift, over the hold or to expiry. */
export function planLogDrift(
  model: PlanModel,
  drift: Drift,
  dailyVolatility: number,
  horizon: 'expiry' | 'exit',
): number {
  const { sessions, years } = clockOf(model, horizon);
  const { ratePerYear, underlying } = model.input;
  return logDrift({
    drift,
    totalVariance: dailyVolatility ** 2 * sessions,
    sessions,
    years,
    ratePerYear,
    dividendYield: underlying.dividendYield,
  });
}

/** Sessions and years to a horizon of the plan. */
export function clockOf({ horizon }: PlanModel, which: 'expiry' | 'exit'): { sessions: number; years: number } {
  return which === 'expiry'
    ? { sessions: horizon.sessions.toExpiry, years: horizon.years.toExpiry }
    : { sessions: horizon.sessions.holding, years: horizon.years.holding };
}

const lawsByModel = new WeakMap<PlanModel, Map<string, ProfitLaw>>();

/** Distribution of the position's profit at a horizon when the underlying moves with this volatility and drift. */
export function lawAt(model: PlanModel, which: 'expiry' | 'exit', dailyVolatility: number, drift: Drift): ProfitLaw {
  // One forecast asks for the same law several times: for its mean, its odds and its ends.
  const laws = lawsByModel.get(model) ?? new Map<string, ProfitLaw>();
  lawsByModel.set(model, laws);
  const key = [which, dailyVolatility, drift.kind].join(' ');
  const known = laws.get(key);
  if (known !== undefined) return known;
  const { sessions } = clockOf(model, which);
  const price = {
    spotPrice: model.spotPrice,
    logDrift: planLogDrift(model, drift, dailyVolatility, which),
    totalDeviation: dailyVolatility * Math.sqrt(sessions),
  };
  const made =
    which === 'expiry'
      ? profitLaw(model.payoff.segments, price)
      : curvedProfitLaw(exitCurve(model, meanAtExit(model, dailyVolatility, drift)), price);
  laws.set(key, made);
  return made;
}

/**
 * Mean profit at the planned exit, exactly: averaging a price over the moves until then is the same formula with the
 * variance of both spans added.
 */
function meanAtExit(model: PlanModel, dailyVolatility: number, drift: Drift): number {
  const { horizon, position, spotPrice } = model;
  const heldVariance = dailyVolatility ** 2 * horizon.sessions.holding;
  const expectedSpot = spotPrice * Math.exp(planLogDrift(model, drift, dailyVolatility, 'exit') + heldVariance / 2);
  const left = horizon.sessions.toExpiry - horizon.sessions.holding;
  const legs = model.repricedLegs.map((leg) => ({
    ...leg,
    dailyVolatility: Math.sqrt((heldVariance + leg.dailyVolatility ** 2 * left) / left),
  }));
  const valueAt = valueAtMoment(legs, exitMoment(model));
  return valueAt(expectedSpot) - position.costToOpen - position.feesToClose;
}

/**
 * Profit at the planned exit as a function of the underlying: each leg repriced at its implied volatility with what is left of
 * its life, closing fees paid.
 */
export function profitAtExit(model: PlanModel): (spotPrice: number) => number {
  const { position } = model;
  const valueAt = valueAtMoment(model.repricedLegs, exitMoment(model));
  return (price) => valueAt(price) - position.costToOpen - position.feesToClose;
}

function exitMoment({ horizon, input }: PlanModel): RepriceMoment {
  return {
    sessions: horizon.sessions.toExpiry - horizon.sessions.holding,
    years: Math.max(0, horizon.years.toExpiry - horizon.years.holding),
    ratePerYear: input.ratePerYear,
    dividendYield: input.underlying.dividendYield,
  };
}

function exitCurve(model: PlanModel, mean: number): ProfitCurve {
  const { position, repricedLegs } = model;
  const profit = repricedCurve({
    legs: repricedLegs,
    moment: exitMoment(model),
    costs: position.costToOpen + position.feesToClose,
  });
  return { ...profit, mean };
}
