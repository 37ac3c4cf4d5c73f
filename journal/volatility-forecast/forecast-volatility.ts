import { DomainError } from '@/journal/errors/domain-error';
import { calibrateForecast } from '@/journal/volatility-forecast/calibrate-forecast';
import { filteredHistory } from '@/journal/volatility-forecast/filtered-history';
import { rhythmOver } from '@/journal/volatility-forecast/five-session-rhythm';
import { type ForecastDensity, normalForecast, studentForecast } from '@/journal/volatility-forecast/forecast-density';
import { type ForecastHistory, forecastHistory, leastDeviation } from '@/journal/volatility-forecast/forecast-history';
import { defaultForecastMethod, type ForecastMethod } from '@/journal/volatility-forecast/forecast-method';
import { type Garch, garchTotalVariance } from '@/journal/volatility-forecast/garch';
import { closeDailyVolatility } from '@/journal/volatility/close-daily-volatility';
import { ewmaDailyVolatility, ewmaEffectiveReturns } from '@/journal/volatility/ewma-daily-volatility';
import { volatilityInterval } from '@/journal/volatility/volatility-interval';

/** Four years of sessions without a trend: as if the yearly mean were 0 ± half of the yearly volatility. */
const CENTRE_DOUBT_SESSIONS = 1008;

export interface VolatilityForecast {
  readonly method: ForecastMethod;
  /** Per session over the horizon: totalDeviation / √horizonSessions. */
  readonly dailyVolatility: number;
  /** Standard deviation of the summed log return of the horizon. */
  readonly totalDeviation: number;
  /** Law of the summed log return of the horizon. */
  readonly density: ForecastDensity;
  /** Interval of the daily volatility that the horizon may show. */
  readonly lowDailyVolatility: number;
  readonly highDailyVolatility: number;
  /** Probability of that interval. */
  readonly confidence: number;
  /** Last returns that the forecast rests on. */
  readonly returnsUsed: number;
  readonly horizonSessions: number;
  /** What the method settled on; null where it settles no such thing. */
  readonly used: ForecastSettings;
}

export interface ForecastSettings {
  /** Mean log return of a session that the density is centred on. */
  readonly centrePerSession: number;
  /** Share of the averages over many lengths in the blend; the rest is GARCH. */
  readonly averagesShare: number | null;
  /** What the variance of the blend was multiplied by. */
  readonly varianceStretch: number | null;
  readonly pastForecasts: number | null;
  readonly garch: Garch | null;
}

/** A law with what it was made of, before it is put in the units of the answer. */
interface MethodForecast {
  readonly density: ForecastDensity;
  readonly used: ForecastSettings;
  /** As many independent normal returns would tell as much about the volatility of the horizon. */
  readonly degreesOfFreedom: number;
}

/**
 * Forecast of the volatility of the coming sessions and of the law of their summed log return, from past log returns alone.
 * @param question.logReturns of one session each, oldest first, at least 63, of a magnitude up to 100, not all 0; the last 2,520 are
 *   used.
 * @param question.horizonSessions above 0 up to 504; fractions allowed (past forecasts are then weighed at the nearest whole number).
 * @param question.method `pooled` unless stated; {@link forecastMethodExplanations} says what each is.
 * @param question.confidence of the interval of the volatility, strictly between 0 and 1; 0.95 by default. A Student law is a normal
 *   law whose variance is not known: the interval is of that volatility, so it holds both the error of the estimate and the days on
 *   which volatility is not what it is on average.
 * @returns the same for the same input, always: nothing is drawn.
 * @throws {DomainError} `too-few-returns`, `return-invalid` with the index, `returns-constant`, `horizon-invalid`,
 *   `confidence-out-of-range`.
 * @see the files of the parts; drift drawn toward 0: the posterior mean of a normal mean, e.g. Gelman et al. (2013), Bayesian Data
 *   Analysis, 3rd ed., 2.5.
 */
export function forecastVolatility(question: {
  readonly logReturns: readonly number[];
  readonly horizonSessions: number;
  readonly method?: ForecastMethod;
  readonly confidence?: number;
}): VolatilityForecast {
  const { logReturns, ...rest } = question;
  return forecastFromHistory(forecastHistory(logReturns), rest);
}

/**
 * The same from a prepared history, for several methods or horizons of one series.
 * @throws {DomainError} `returns-constant`, `horizon-invalid`, `confidence-out-of-range`; `too-few-returns` for `filtered-history`
 *   with fewer than 21 past stretches of the horizon.
 * @see forecastVolatility.
 */
export function forecastFromHistory(
  history: ForecastHistory,
  question: { readonly horizonSessions: number; readonly method?: ForecastMethod; readonly confidence?: number },
): VolatilityForecast {
  const { horizonSessions, method = defaultForecastMethod, confidence = 0.95 } = question;
  if (!(horizonSessions > 0 && horizonSessions <= 504)) throw new DomainError('horizon-invalid', { horizonSessions });
  const { density, used, degreesOfFreedom } = forecastBy(method, history, horizonSessions);
  const perSession = 1 / Math.sqrt(horizonSessions);
  const { low, high } = volatilityInterval({
    dailyVolatility: density.scale * perSession,
    degreesOfFreedom,
    confidence,
  });
  return {
    method,
    dailyVolatility: density.deviation * perSession,
    totalDeviation: density.deviation,
    density,
    lowDailyVolatility: low,
    highDailyVolatility: high,
    confidence,
    returnsUsed: history.returns.length,
    horizonSessions,
    used,
  };
}

const nothingSettled: ForecastSettings = {
  centrePerSession: 0,
  averagesShare: null,
  varianceStretch: null,
  pastForecasts: null,
  garch: null,
};

function forecastBy(method: ForecastMethod, history: ForecastHistory, sessions: number): MethodForecast {
  const { returns } = history;
  switch (method) {
    case 'pooled':
      return calibrated(history, sessions, { shares: [1, 0.5, 0], isCentred: false });
    case 'pooled-zero-centre':
      return calibrated(history, sessions, { shares: [1, 0.5, 0], isCentred: true });
    case 'averages':
      return calibrated(history, sessions, { shares: [1], isCentred: false });
    case 'garch-calibrated':
      return calibrated(history, sessions, { shares: [0], isCentred: false });
    case 'garch-student':
      return fromGarch(history, sessions, 'student');
    case 'garch-normal':
      return fromGarch(history, sessions, 'normal');
    case 'filtered-history':
      return fromFilteredHistory(history, sessions);
    case 'ewma-94':
      return scaled(ewmaDailyVolatility(returns, { lambda: 0.94 }), sessions, ewmaEffectiveReturns(0.94));
    case 'window-63':
      return scaled(closeDailyVolatility(returns.slice(-63), { mean: 'sample' }), sessions, 62);
  }
}

/** A normal law about 0 whose variance grows with the sessions. */
function scaled(dailyVolatility: number, sessions: number, degreesOfFreedom: number): MethodForecast {
  if (!(dailyVolatility > leastDeviation)) throw new DomainError('returns-constant', { dailyVolatility });
  const density = normalForecast({ location: 0, deviation: dailyVolatility * Math.sqrt(sessions) });
  return { density, used: nothingSettled, degreesOfFreedom };
}

function fromGarch(history: ForecastHistory, sessions: number, innovations: 'normal' | 'student'): MethodForecast {
  const { garch, variances } = history.plainGarch(innovations);
  const nextVariance = variances.at(-1) ?? garch.longRunVariance;
  const deviation = Math.sqrt(garchTotalVariance(garch, { nextVariance, sessions }));
  const { degreesOfFreedom } = garch;
  const density =
    degreesOfFreedom !== null && sessions <= 1
      ? studentForecast({ location: 0, deviation, degreesOfFreedom })
      : normalForecast({ location: 0, deviation });
  return { density, used: { ...nothingSettled, garch }, degreesOfFreedom: history.returns.length };
}

function fromFilteredHistory(history: ForecastHistory, sessions: number): MethodForecast {
  const variances = history.averages();
  const density = filteredHistory({
    sums: history.sums,
    totalVariance: (known) => sessions * (variances[known] ?? 0),
    sessions: Math.max(1, Math.round(sessions)),
    from: history.firstPastForecast,
  });
  return { density, used: nothingSettled, degreesOfFreedom: history.returns.length };
}

function calibrated(
  history: ForecastHistory,
  sessions: number,
  { shares, isCentred }: { shares: readonly number[]; isCentred: boolean },
): MethodForecast {
  const { sums, returns } = history;
  const averages = history.averages();
  const rhythm = history.rhythm();
  const path = shares.some((share) => share < 1) ? history.boundedGarch() : null;
  const centrePerSession = isCentred ? 0 : (sums.at(-1) ?? 0) / (returns.length + CENTRE_DOUBT_SESSIONS);
  const totals = (known: number, over: number) => {
    const factor = rhythmOver(rhythm, known, over);
    const first = factor * over * (averages[known] ?? 0);
    if (path === null) return { first, second: first };
    const nextVariance = path.variances[known] ?? path.garch.longRunVariance;
    return { first, second: factor * garchTotalVariance(path.garch, { nextVariance, sessions: over }) };
  };
  const whole = Math.max(1, Math.round(sessions));
  const { degreesOfFreedom, firstShare, stretch, pastForecasts, totalVariance } = calibrateForecast({
    sums,
    centre: centrePerSession,
    totals: (known) => totals(known, whole),
    sessions: whole,
    from: history.firstPastForecast,
    shares,
  });
  const blendOver = (over: number) => {
    const { first, second } = totals(returns.length, over);
    return firstShare * first + (1 - firstShare) * second;
  };
  // Between whole numbers the blend carries on from the nearest one.
  const variance = sessions === whole ? totalVariance : (totalVariance * blendOver(sessions)) / blendOver(whole);
  return {
    density: studentForecast({
      location: centrePerSession * sessions,
      deviation: Math.sqrt(variance),
      degreesOfFreedom,
    }),
    used: {
      centrePerSession,
      averagesShare: firstShare,
      varianceStretch: stretch,
      pastForecasts,
      garch: path?.garch ?? null,
    },
    degreesOfFreedom,
  };
}
