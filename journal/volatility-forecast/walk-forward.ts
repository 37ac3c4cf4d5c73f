import { DomainError } from '@/journal/errors/domain-error';
import { exactSum } from '@/journal/returns/exact-sum';
import {
  type ForecastMethod,
  defaultForecastMethod,
  forecastMethods,
} from '@/journal/volatility-forecast/forecast-method';
import { forecastFromHistory } from '@/journal/volatility-forecast/forecast-volatility';
import { type ForecastDensity } from '@/journal/volatility-forecast/forecast-density';
import { forecastHistory } from '@/journal/volatility-forecast/forecast-history';

/** Sessions ahead that are scored. */
export const skillHorizons = [1, 5, 21] as const;
/** Returns known at the first origin, and sessions from an origin to the next. */
export const firstOrigin = 504;
export const originStep = 5;
/** Returns that a walk needs to score one forecast: those before the first origin and the longest horizon. */
const LONGEST = 21;
export const leastWalkReturns = firstOrigin + LONGEST;

/** How a method did over the origins of a series at one horizon. */
export interface SkillRow {
  readonly horizon: number;
  readonly method: ForecastMethod;
  readonly isDefault: boolean;
  /** Mean log density of the summed log return that came, nats; more is better. */
  readonly logScore: number;
  /** Mean CRPS in log return; less is better. */
  readonly crps: number;
  /** Share of outcomes within the central bands. */
  readonly coverage68: number;
  readonly coverage95: number;
  readonly forecasts: number;
}

/**
 * Skill of forecast methods walked forward over a series: at every fifth session from the 504th return on, each method forecasts the
 * summed log return of the next 1, 5 and 21 sessions from the returns so far. All horizons share the origins, so the last one lies 21
 * returns before the end.
 * @param logReturns oldest first, at least 525, of a magnitude up to 100.
 * @param methods all of them unless stated.
 * @returns a row per horizon and method, in their order.
 * @throws {DomainError} `too-few-returns`, or as forecastVolatility (`returns-constant` where nothing moved before an origin).
 * @see log score and CRPS: Gneiting and Raftery (2007), J. American Statistical Association 102, 359-378.
 */
export function walkForward(
  logReturns: readonly number[],
  methods: readonly ForecastMethod[] = forecastMethods,
): SkillRow[] {
  if (!(logReturns.length >= leastWalkReturns))
    throw new DomainError('too-few-returns', { required: leastWalkReturns, received: logReturns.length });
  const tallies = skillHorizons.flatMap((horizon) => methods.map((method) => emptyTally(horizon, method)));
  for (let origin = firstOrigin; origin + LONGEST <= logReturns.length; origin += originStep) {
    const history = forecastHistory(logReturns.slice(0, origin));
    for (const tally of tallies) {
      const { density } = forecastFromHistory(history, { horizonSessions: tally.horizon, method: tally.method });
      addOutcome(tally, density, exactSum(logReturns.slice(origin, origin + tally.horizon)));
    }
  }
  return tallies.map(skillOf);
}

interface Tally {
  readonly horizon: number;
  readonly method: ForecastMethod;
  readonly logScores: number[];
  readonly rankedScores: number[];
  within68: number;
  within95: number;
}

function emptyTally(horizon: number, method: ForecastMethod): Tally {
  return { horizon, method, logScores: [], rankedScores: [], within68: 0, within95: 0 };
}

function addOutcome(tally: Tally, density: ForecastDensity, outcome: number): void {
  tally.logScores.push(density.logDensity(outcome));
  tally.rankedScores.push(density.crps(outcome));
  // Twice the distance of the outcome's rank from the middle is the smallest central band that holds it.
  const band = Math.abs(2 * density.cdf(outcome) - 1);
  if (band <= 0.68) tally.within68 += 1;
  if (band <= 0.95) tally.within95 += 1;
}

function skillOf({ horizon, method, logScores, rankedScores, within68, within95 }: Tally): SkillRow {
  const forecasts = logScores.length;
  return {
    horizon,
    method,
    isDefault: method === defaultForecastMethod,
    logScore: exactSum(logScores) / forecasts,
    crps: exactSum(rankedScores) / forecasts,
    coverage68: within68 / forecasts,
    coverage95: within95 / forecasts,
    forecasts,
  };
}
