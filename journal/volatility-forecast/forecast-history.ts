import { DomainError } from '@/journal/errors/domain-error';
import { boundedSquares } from '@/journal/volatility-forecast/bounded-squares';
import { fiveSessionRhythm } from '@/journal/volatility-forecast/five-session-rhythm';
import { fitGarch, type Garch, garchVariances } from '@/journal/volatility-forecast/garch';
import { layeredVariances } from '@/journal/volatility-forecast/layered-averages';
import { closeDailyVolatility } from '@/journal/volatility/close-daily-volatility';

/** Returns that every method needs. */
export const leastForecastReturns = 63;
/** Least deviation of returns that count as moves at all. */
export const leastDeviation = 1e-100;
/** Most returns that are looked at, the last ten years. */
const MOST_RETURNS = 2520;
/** Returns that a past forecast needs behind it to be weighed: a year, or half of what there is. */
const FIRST_PAST_FORECAST = 250;
const LARGEST_RETURN = 100;

/** A GARCH model and the variances of the sessions under it: at index t of the session after the first t. */
interface GarchPath {
  readonly garch: Garch;
  readonly variances: Float64Array;
}

/** Past returns and what the methods make of them; each part is worked out once, when it is first asked for. */
export interface ForecastHistory {
  readonly returns: readonly number[];
  /** Running sums: at index t of the first t returns. */
  readonly sums: readonly number[];
  /** Variances by averages of many lengths, at index t as known from the first t returns. */
  readonly averages: () => Float64Array;
  readonly rhythm: () => readonly number[];
  /** Fitted with Student moves and bounded squares. */
  readonly boundedGarch: () => GarchPath;
  /** Fitted as published. */
  readonly plainGarch: (innovations: 'normal' | 'student') => GarchPath;
  /** Index of the first past forecast that is weighed. */
  readonly firstPastForecast: number;
}

/**
 * Prepares log returns for forecasts, so that several methods and horizons share the work.
 * @param logReturns oldest first, at least 63, of a magnitude up to 100, not all 0; the last 2,520 are used.
 * @throws {DomainError} `too-few-returns`, `return-invalid` with the index, `returns-constant`.
 * @see the files of the parts.
 */
export function forecastHistory(logReturns: readonly number[]): ForecastHistory {
  const returns = usableReturns(logReturns);
  const firstPastForecast = Math.min(FIRST_PAST_FORECAST, Math.floor(returns.length / 2));
  const squares = once(() => boundedSquares(returns));
  const averages = once(() => flooredVariances(squares()));
  const garchPath = (from: ArrayLike<number>, innovations: 'normal' | 'student'): GarchPath => {
    const garch = fitGarch(returns, from, innovations);
    return { garch, variances: garchVariances(garch, from) };
  };
  const plainSquares = once(() => returns.map((value) => value * value));
  const plain = {
    normal: once(() => garchPath(plainSquares(), 'normal')),
    student: once(() => garchPath(plainSquares(), 'student')),
  };
  return {
    returns,
    sums: runningSums(returns),
    averages,
    rhythm: once(() => fiveSessionRhythm(returns, averages(), firstPastForecast)),
    boundedGarch: once(() => garchPath(squares(), 'student')),
    plainGarch: (innovations) => plain[innovations](),
    firstPastForecast,
  };
}

function usableReturns(logReturns: readonly number[]): readonly number[] {
  if (!(logReturns.length >= leastForecastReturns))
    throw new DomainError('too-few-returns', { required: leastForecastReturns, received: logReturns.length });
  const invalid = logReturns.findIndex((value) => !(Math.abs(value) <= LARGEST_RETURN));
  if (invalid >= 0) throw new DomainError('return-invalid', { index: invalid, value: logReturns[invalid] ?? null });
  const returns = logReturns.slice(-MOST_RETURNS);
  if (!(closeDailyVolatility(returns, { mean: 'zero' }) > leastDeviation))
    throw new DomainError('returns-constant', { returns: returns.length });
  return returns;
}

/** After a stretch without moves the averages still hold a thousandth of the deviation of the whole history. */
function flooredVariances(squares: Float64Array): Float64Array {
  const floor = (1e-6 * squares.reduce((sum, square) => sum + square, 0)) / squares.length;
  return layeredVariances(squares).map((variance) => Math.max(variance, floor));
}

function runningSums(returns: readonly number[]): number[] {
  let sum = 0;
  return [0, ...returns.map((value) => (sum += value))];
}

function once<Value>(work: () => Value): () => Value {
  let done: { readonly value: Value } | null = null;
  return () => (done ??= { value: work() }).value;
}
