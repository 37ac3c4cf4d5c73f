import { type Fill } from '@/journal/fills/fill';
import { type Forecast, type StatedOdds } from '@/journal/forecast/forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';

/** One session's prices as far as the outcome needs them; high and low only where the bar has them. */
export interface OutcomeBar {
  readonly sessionDate: string;
  readonly close: number;
  readonly high: number | null;
  readonly low: number | null;
  /** Official value that settles options expiring that day, where it differs from the close. */
  readonly settlement: number | null;
}

export interface OutcomeQuestion {
  readonly input: ForecastInput;
  readonly forecast: Forecast;
  /** Effective fills of the entry, oldest first. */
  readonly fills: readonly Fill[];
  /** Bars of sessions that close after the moment of the spot price, oldest first. */
  readonly barsSince: readonly OutcomeBar[];
}

export interface ResolvedOdds {
  readonly odds: StatedOdds;
  /** Null while the answer is not known. */
  readonly happened: boolean | null;
  readonly brierScore: number | null;
  readonly marketBrierScore: number | null;
  readonly logScore: number | null;
  /** Why there is no answer: what is waited for. */
  readonly waitsFor: string | null;
  /** Of a touched level: judged by highs and lows, or by closes where a bar has no range. */
  readonly monitoredBy: 'range' | 'closes' | null;
}

export interface MoveOutcome {
  readonly sessionDate: string;
  readonly sessions: number;
  readonly startPrice: number;
  readonly endPrice: number;
  readonly logReturn: number;
  readonly inSigmas: number;
  /** Place in the forecast distribution, 0 to 1. */
  readonly percentile: number;
}

export interface EntryOutcome {
  /** The move to the planned exit (or, traded out earlier, to the session of the last closing fill); null until its bar is there. */
  readonly move: MoveOutcome | null;
  /** The latest known move while it is still running. */
  readonly moveSoFar: MoveOutcome | null;
  readonly realisedVolatility: {
    readonly dailyVolatility: number;
    readonly sessions: number;
    readonly ratio: number;
    /** Range within which the ratio falls 95 % of the time by chance alone; null when the volatility was typed. */
    readonly ratioLow: number | null;
    readonly ratioHigh: number | null;
  } | null;
  readonly odds: readonly ResolvedOdds[];
  readonly profit: {
    readonly realised: string;
    readonly fees: string;
    readonly isFinal: boolean;
    /** Interval of its place in the forecast distribution of the horizon it is compared with, 0 to 1. */
    readonly percentileLow: number | null;
    readonly percentileHigh: number | null;
    readonly horizon: 'expiry' | 'exit';
    readonly expectedMean: number;
  } | null;
  /** True once the options' expiry is settled and nothing is waited for. */
  readonly isComplete: boolean;
}
