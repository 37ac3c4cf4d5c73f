import { type Fill } from '@/journal/fills/fill';
import { type Forecast, type StatedOdds } from '@/journal/forecast/forecast';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { type EntryProcess } from '@/journal/outcome/entry-process';
import { type FillMarks } from '@/journal/outcome/market-at';
import { type ProfitSources } from '@/journal/outcome/profit-sources';

/** One session's prices as far as the outcome needs them; open, high and low only where the bar has them. */
export interface OutcomeBar {
  readonly sessionDate: string;
  readonly open: number | null;
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
  /** Prices noted with fills, by the fill's id. */
  readonly marks: ReadonlyMap<string, FillMarks>;
  /** Instant of the seal. */
  readonly sealedAt: string;
}

export interface ResolvedOdds {
  readonly odds: StatedOdds;
  /** Null while the answer is not known. */
  readonly happened: boolean | null;
  readonly brierScore: number | null;
  readonly marketBrierScore: number | null;
  readonly logScore: number | null;
  /** Why there is no answer yet: what is waited for. */
  readonly waitsFor: string | null;
  /** Why there will be no answer; null while there is one or one may still come. */
  readonly cannotTell: typeof CANNOT_TELL | null;
  /** Of a touched level: judged by highs and lows, or by closes where a bar has no range. */
  readonly monitoredBy: 'range' | 'closes' | null;
}

/** Said of a question that the prices of whole sessions do not settle. */
export const CANNOT_TELL = 'cannot tell from daily bars';

/**
 * Which price ended a move. 'close-after-exit' is the close of a session that held both the start and the planned exit: daily bars
 * know no earlier price, so the move is taken to that close, over the sessions to that close.
 */
export type PricedBy = 'close' | 'open' | 'settlement' | 'close-after-exit';

export interface MoveOutcome {
  readonly sessionDate: string;
  readonly pricedBy: PricedBy;
  /** From the moment of the spot price to that of the end price, on the session clock. */
  readonly sessions: number;
  readonly startPrice: number;
  readonly endPrice: number;
  readonly logReturn: number;
  readonly inSigmas: number;
  /** Place in the forecast distribution, 0 to 1. */
  readonly percentile: number;
  /** The same in Student's t distribution, for a volatility estimated from few returns; null when it was typed. */
  readonly studentPercentile: number | null;
}

export interface EntryOutcome {
  /**
   * The move to the planned exit (or, traded out in an earlier session, to the close of that one); null until its price is there.
   * An exit between open and close is judged by the last price that daily bars have by then.
   */
  readonly move: MoveOutcome | null;
  /** What the move waits for; null once it is there. */
  readonly moveWaitsFor: string | null;
  /** The latest known move while it is still running. */
  readonly moveSoFar: MoveOutcome | null;
  readonly realisedVolatility: {
    readonly dailyVolatility: number;
    /** 95 % interval of the volatility that stood behind it. */
    readonly low: number;
    readonly high: number;
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
  /** Where the realised profit came from; null while the position is open, or a price of the underlying is not there. */
  readonly sources: ProfitSources | null;
  /** How the plan was carried out; null without fills. */
  readonly process: EntryProcess | null;
  /** True once the options' expiry is settled and no answer is waited for. */
  readonly isComplete: boolean;
}
