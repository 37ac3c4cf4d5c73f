import { DomainError } from '@/journal/errors/domain-error';
import { studentLogConstant } from '@/journal/volatility-forecast/forecast-density';
import { nelderMead } from '@/journal/volatility-forecast/nelder-mead';

// By their own names: the loops below call them a million times, and a look-up on the global object costs more than they do
// wherever that object is not the plain one.
const { log, log1p } = Math;

/** GARCH(1,1): next variance = longRunVariance·(1 − persistence) + reaction·square + (persistence − reaction)·variance. */
export interface Garch {
  /** Variance of one session that the forecast returns to, above 0. */
  readonly longRunVariance: number;
  /** α: share of the last square in the next variance, 0 to persistence. */
  readonly reaction: number;
  /** α + β: share of the distance from the long run that is left after a session, 0 to 0.999. */
  readonly persistence: number;
  /** Of Student innovations, above 2; null for normal ones. */
  readonly degreesOfFreedom: number | null;
}

const MOST_PERSISTENCE = 0.999;
const LEAST_DEGREES = 2.1;
const MOST_DEGREES = 200;
const LOG_TWO_PI = 1.8378770664093453;
/** Reaction and persistence of the places from which the search may start. */
const STARTS = [
  [0.04, 0.99],
  [0.08, 0.97],
  [0.12, 0.9],
  [0.25, 0.9],
  [0.03, 0.6],
] as const;

/**
 * Variances of the single sessions under the model.
 * @param squares squared returns, oldest first, each 0 or more.
 * @returns one number more than squares: at index t the variance of the session after the first t; index 0 is the long run.
 * @see Bollerslev (1986), J. of Econometrics 31, 307-327.
 */
export function garchVariances(model: Garch, squares: ArrayLike<number>): Float64Array {
  const { longRunVariance, reaction, persistence } = model;
  const variances = new Float64Array(squares.length + 1);
  let variance = longRunVariance;
  variances[0] = variance;
  for (let index = 0; index < squares.length; index += 1) {
    variance =
      longRunVariance * (1 - persistence) + reaction * (squares[index] ?? 0) + (persistence - reaction) * variance;
    variances[index + 1] = variance;
  }
  return variances;
}

/**
 * Variance of the summed return of the coming sessions: each session's distance from the long run is the persistence times the one
 * before.
 * @param nextVariance of the next session, 0 or more. @param sessions above 0, fractions allowed.
 * @see e.g. Tsay (2010), Analysis of Financial Time Series, 3rd ed., 3.5.1, summed.
 */
export function garchTotalVariance(
  { longRunVariance, persistence }: Pick<Garch, 'longRunVariance' | 'persistence'>,
  { nextVariance, sessions }: { nextVariance: number; sessions: number },
): number {
  const distances = (1 - persistence ** sessions) / (1 - persistence);
  return sessions * longRunVariance + (nextVariance - longRunVariance) * distances;
}

/**
 * Logarithm of the likelihood of the returns under the model, zero mean.
 * @param returns log returns, oldest first. @param squares what feeds the variance, the returns' squares or bounded ones.
 * @see Bollerslev (1987), Review of Economics and Statistics 69, 542-547, eq. 1, for Student innovations.
 */
export function garchLogLikelihood(model: Garch, returns: readonly number[], squares: ArrayLike<number>): number {
  const { longRunVariance, reaction, persistence, degreesOfFreedom: degrees } = model;
  const ground = longRunVariance * (1 - persistence);
  let variance = longRunVariance;
  let sum = 0;
  for (let index = 0; index < returns.length; index += 1) {
    const value = returns[index] ?? 0;
    const ratio = (value * value) / variance;
    sum += degrees === null ? log(variance) + ratio : log(variance) + (degrees + 1) * log1p(ratio / (degrees - 2));
    variance = ground + reaction * (squares[index] ?? 0) + (persistence - reaction) * variance;
  }
  const constant = degrees === null ? -LOG_TWO_PI / 2 : studentLogConstant(degrees) + log(degrees / (degrees - 2)) / 2;
  return returns.length * constant - sum / 2;
}

/**
 * Fits GARCH(1,1) by maximum likelihood with the long run fixed at the mean square (variance targeting).
 * @param returns log returns, oldest first, finite, at least 21, not all 0. @param squares as of garchLogLikelihood.
 * @throws {DomainError} `too-few-returns`, `returns-constant`.
 * @see Engle and Mezrich (1996), Risk 9(8), for the targeting; Nelder and Mead (1965) for the search, from the best of five places.
 */
export function fitGarch(
  returns: readonly number[],
  squares: ArrayLike<number>,
  innovations: 'normal' | 'student',
): Garch {
  if (!(returns.length >= 21)) throw new DomainError('too-few-returns', { required: 21, received: returns.length });
  let total = 0;
  for (let index = 0; index < squares.length; index += 1) total += squares[index] ?? 0;
  const longRunVariance = total / squares.length;
  if (!(longRunVariance > 0)) throw new DomainError('returns-constant', { returns: returns.length });
  const modelAt = ([spread = 0, share = 0, tail = 0]: readonly number[]): Garch => {
    const persistence = MOST_PERSISTENCE * logistic(spread);
    return {
      longRunVariance,
      persistence,
      reaction: persistence * logistic(share),
      degreesOfFreedom:
        innovations === 'normal' ? null : LEAST_DEGREES + (MOST_DEGREES - LEAST_DEGREES) * logistic(tail),
    };
  };
  const valueOf = (point: readonly number[]) => {
    const value = -garchLogLikelihood(modelAt(point), returns, squares);
    return Number.isNaN(value) ? Infinity : value;
  };
  const tails = innovations === 'normal' ? [] : [logit((8 - LEAST_DEGREES) / (MOST_DEGREES - LEAST_DEGREES))];
  const places = STARTS.map(([reaction, persistence]) => {
    const point = [logit(persistence / MOST_PERSISTENCE), logit(reaction / persistence), ...tails];
    return { point, value: valueOf(point) };
  });
  const start = places.reduce((least, place) => (place.value < least.value ? place : least)).point;
  return modelAt(nelderMead({ valueOf, start, steps: [0.5, 0.4, 0.5], tolerance: 1e-4, mostSteps: 150 }).point);
}

function logistic(value: number): number {
  return 1 / (1 + Math.exp(-value));
}

function logit(share: number): number {
  return log(share / (1 - share));
}
