import { structureName } from '@/journal/contracts/structure-name';
import { checkForecastInput } from '@/journal/forecast/check-forecast-input';
import { describeDistribution } from '@/journal/forecast/describe-distribution';
import { engineVersion } from '@/journal/forecast/engine-version';
import { type Forecast, type LegForecast, type PayoffEnds, type ProfitDistribution } from '@/journal/forecast/forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { overVolatilities } from '@/journal/forecast/low-base-high';
import { planHorizon } from '@/journal/forecast/plan-horizon';
import { lawAt, optionOf, planLogDrift, planModel, type PlanModel } from '@/journal/forecast/plan-model';
import { stateOdds } from '@/journal/forecast/state-odds';
import { toDecimalText } from '@/journal/money/decimal';
import { europeanOptionPrice, europeanOptionValue } from '@/journal/pricing/european-option';
import { latticeGrid } from '@/journal/scenarios/lattice';
import { valueAtMoment } from '@/journal/scenarios/reprice';
import { type ExchangeCalendar } from '@/journal/sessions/exchange-calendar';

/** Rows of the lattice, in total deviations of the hold, highest first. */
const latticeSigmas = [2, 1.5, 1, 0.5, 0, -0.5, -1, -1.5, -2] as const;
const LATTICE_COLUMNS = 5;

/**
 * The forecast of a plan: prices, odds, distributions of profit and a lattice, all at low, base and high volatility.
 * Options of American style are valued without early exercise; `input.underlying.style` says which they are.
 * @param input complete plan; see {@link ForecastInput}.
 * @param calendar of the exchange the options trade on.
 * @returns plain data; the same input and engine version give the same numbers.
 * @throws {DomainError} naming what is wrong: `legs-missing`, `legs-of-several-expiries`, `expiry-not-a-session`,
 *   `expiry-in-the-past`, `holding-not-positive`, `holding-beyond-expiry`,
 *   `volatility-order`, `drift-invalid`, and as {@link checkForecastInput}.
 * @see the functions it composes, each with its own source.
 */
export function makeForecast(input: ForecastInput, calendar: ExchangeCalendar): Forecast {
  checkForecastInput(input);
  const horizon = planHorizon(input, calendar);
  const model = planModel(input, horizon);
  const { volatility, drift } = input;
  const rootOf = (sessions: number) => overVolatilities(volatility, (daily) => daily * Math.sqrt(sessions));
  const distribution = (which: 'expiry' | 'exit'): ProfitDistribution =>
    describeDistribution(which, {
      low: lawAt(model, which, volatility.low, drift),
      base: lawAt(model, which, volatility.base, drift),
      high: lawAt(model, which, volatility.high, drift),
    });
  return {
    engineVersion,
    expirySessionDate: horizon.expirySessionDate,
    exitSessionDate: horizon.exitSessionDate,
    exitAt: horizon.exitAt,
    sessions: horizon.sessions,
    years: horizon.years,
    totalDeviation: { holding: rootOf(horizon.sessions.holding), toExpiry: rootOf(horizon.sessions.toExpiry) },
    logDrift: {
      holding: planLogDrift(model, drift, volatility.base, 'exit'),
      toExpiry: planLogDrift(model, drift, volatility.base, 'expiry'),
    },
    forwardPrice:
      model.spotPrice * Math.exp((input.ratePerYear - input.underlying.dividendYield) * horizon.years.toExpiry),
    structureName: structureName(input.legs),
    cost: {
      netPremium: toDecimalText(model.cost.netPremium),
      feesToOpen: toDecimalText(model.cost.feesToOpen),
      feesToClose: toDecimalText(model.cost.feesToClose),
      modelValue: overVolatilities(volatility, (daily) => positionValue(model, daily)),
    },
    legs: legForecasts(model),
    impliedDailyVolatility: model.impliedDailyVolatility,
    odds: stateOdds(model),
    atExpiry: distribution('expiry'),
    atExit: horizon.holdsToExpiry ? null : distribution('exit'),
    ends: payoffEnds(model),
    lattice: planLattice(model),
  };
}

function positionValue(model: PlanModel, dailyVolatility: number): number {
  const { input, horizon, position } = model;
  const legs = position.legs.map((leg) => ({ ...leg, dailyVolatility }));
  return valueAtMoment(legs, {
    sessions: horizon.sessions.toExpiry,
    years: horizon.years.toExpiry,
    ratePerYear: input.ratePerYear,
    dividendYield: input.underlying.dividendYield,
  })(model.spotPrice);
}

function legForecasts({ input, horizon, spotPrice, position, implied }: PlanModel): LegForecast[] {
  return position.legs.map((leg, index) => {
    const option = optionOf(input, horizon, spotPrice, leg);
    const found = implied[index];
    const { delta, gamma, vegaPerDailyPoint, thetaPerSession, rhoPerPercent } = europeanOptionValue(
      { ...option, dailyVolatility: input.volatility.base },
      horizon.yearsPerNextSession,
    );
    return {
      legId: leg.legId,
      impliedDailyVolatility: found?.kind === 'found' ? found.dailyVolatility : null,
      impliedNone: found?.kind === 'none' ? found.bound : null,
      modelPrice: overVolatilities(input.volatility, (dailyVolatility) =>
        europeanOptionPrice({ ...option, dailyVolatility }),
      ),
      greeks: { delta, gamma, vegaPerDailyPoint, thetaPerSession, rhoPerPercent },
    };
  });
}

/** Ends of the pay-off and the odds of reaching exactly them; an end that is only approached has odds 0. */
function payoffEnds(model: PlanModel): PayoffEnds {
  const { greatestGain, greatestLoss, breakEvens } = model.payoff;
  const { lumps } = lawAt(model, 'expiry', model.input.volatility.base, model.input.drift);
  const oddsOf = (amount: number | null) =>
    amount === null
      ? 0
      : lumps.filter((lump) => Math.abs(lump.profit - amount) < 1e-6).reduce((sum, lump) => sum + lump.probability, 0);
  return {
    greatestGain,
    greatestLoss,
    oddsOfGreatestGain: oddsOf(greatestGain),
    oddsOfGreatestLoss: oddsOf(greatestLoss),
    breakEvens,
  };
}

function planLattice(model: PlanModel): Forecast['lattice'] {
  const { input, horizon, position, repricedLegs, spotPrice } = model;
  const sessionsElapsed = latticeColumns(horizon.sessions.toExpiry);
  const { prices, profit, likelihood } = latticeGrid({
    legs: repricedLegs,
    costToOpen: position.costToOpen,
    spotPrice,
    sigmas: latticeSigmas,
    holdDeviation: input.volatility.base * Math.sqrt(horizon.sessions.holding),
    dailyVolatility: input.volatility.base,
    sessionsElapsed,
    sessionsToExpiry: horizon.sessions.toExpiry,
    yearsToExpiry: horizon.years.toExpiry,
    ratePerYear: input.ratePerYear,
    dividendYield: input.underlying.dividendYield,
  });
  return {
    rows: latticeSigmas.map((sigma, row) => ({ sigma, price: prices[row] ?? spotPrice })),
    sessionsElapsed,
    profit,
    likelihood,
  };
}

/** Now, whole sessions between where there is room for them, and expiry. */
function latticeColumns(toExpiry: number): number[] {
  const columns = Array.from({ length: LATTICE_COLUMNS }, (_, index) => {
    const sessions = (toExpiry * index) / LATTICE_COLUMNS;
    return toExpiry >= LATTICE_COLUMNS ? Math.round(sessions) : sessions;
  });
  return [...columns, toExpiry];
}
