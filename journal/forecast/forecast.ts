/** A figure under low, base and high volatility, in that order of volatility (not of size). */
export interface LowBaseHigh {
  readonly low: number;
  readonly base: number;
  readonly high: number;
}

/** What is asked of an odds statement, and so how it is resolved later. */
export type OddsEvent =
  /** The leg's option finishes in the money, against the official settlement value. */
  | { readonly kind: 'in-the-money'; readonly legId: string }
  /** The whole structure, held to expiry and after fees, makes more than 0. */
  | { readonly kind: 'profit-at-expiry' }
  /** The whole structure, closed at the planned exit and after fees, makes more than 0. */
  | { readonly kind: 'profit-at-exit' }
  /** The underlying reaches the level at any time up to the planned exit. */
  | { readonly kind: 'touch-target'; readonly level: string }
  | { readonly kind: 'touch-stop'; readonly level: string };

export interface StatedOdds {
  /** Unique within the forecast: 'in-the-money:<legId>', 'profit-at-expiry', 'profit-at-exit', 'touch-target', 'touch-stop'. */
  readonly key: string;
  readonly event: OddsEvent;
  /** Under the plan's drift, 0 to 1. */
  readonly probability: LowBaseHigh;
  /** From the premiums' implied volatility and the risk-neutral drift; null where none is implied. */
  readonly marketImplied: number | null;
  /** The session at whose close (or settlement) the answer is known. */
  readonly dueSessionDate: string;
}

export interface LegForecast {
  readonly legId: string;
  /** Of the planned premium; null where no volatility reproduces it, with the reason. */
  readonly impliedDailyVolatility: number | null;
  readonly impliedNone: 'below-intrinsic' | 'no-time-value' | 'above-maximum' | 'no-time-left' | null;
  /** Model price per share under low, base, high volatility. */
  readonly modelPrice: LowBaseHigh;
  /** Per share at base volatility, unsigned by side. */
  readonly greeks: {
    readonly delta: number;
    readonly gamma: number;
    readonly vegaPerDailyPoint: number;
    readonly thetaPerSession: number;
    readonly rhoPerPercent: number;
  };
}

/** A point mass of profit: the same amount over a whole range of the underlying. */
export interface ProfitLump {
  readonly profit: number;
  readonly probability: number;
}
export interface ProfitClass {
  readonly from: number;
  readonly to: number;
  readonly probability: number;
}

/** The distribution of profit after fees at one horizon, in currency for the whole position, at base volatility. */
export interface ProfitDistribution {
  readonly horizon: 'expiry' | 'exit';
  readonly mean: LowBaseHigh;
  readonly oddsOfProfit: LowBaseHigh;
  /** Mean of the worst 5 %. */
  readonly expectedShortfall: number;
  /** Percentiles 5, 25, 50, 75, 95. */
  readonly percentiles: readonly { readonly percent: number; readonly profit: number }[];
  readonly lumps: readonly ProfitLump[];
  /** The continuous part, lowest first. */
  readonly classes: readonly ProfitClass[];
}

/** Ends of the pay-off at expiry after fees; null means without limit. */
export interface PayoffEnds {
  readonly greatestGain: number | null;
  readonly greatestLoss: number | null;
  readonly oddsOfGreatestGain: number;
  readonly oddsOfGreatestLoss: number;
  /** Prices of the underlying where the profit at expiry after fees crosses 0, lowest first. */
  readonly breakEvens: readonly number[];
}

export interface LatticeRow {
  /** Move of the underlying in total deviations of the hold. */
  readonly sigma: number;
  readonly price: number;
}
/** Profit of the position by move and sessions elapsed, before the fees of closing. */
export interface Lattice {
  readonly rows: readonly LatticeRow[];
  /** Sessions elapsed, first 0, last the sessions to expiry. */
  readonly sessionsElapsed: readonly number[];
  /** [row][column], currency. */
  readonly profit: readonly (readonly number[])[];
  /** [row][column], sums to 1 down each column; the first column puts all on the row of no move. */
  readonly likelihood: readonly (readonly number[])[];
}

/** The outputs of a plan: what is shown while typing and, recomputed by the server, what is sealed. */
export interface Forecast {
  readonly engineVersion: string;
  readonly expirySessionDate: string;
  /** The session in which the planned exit falls. */
  readonly exitSessionDate: string;
  readonly exitAt: string;
  readonly sessions: { readonly toExpiry: number; readonly holding: number };
  readonly years: { readonly toExpiry: number; readonly holding: number };
  /** Standard deviation of the log price over the hold and to expiry. */
  readonly totalDeviation: { readonly holding: LowBaseHigh; readonly toExpiry: LowBaseHigh };
  /** Mean of the log price change under the plan's drift at base volatility. */
  readonly logDrift: { readonly holding: number; readonly toExpiry: number };
  readonly forwardPrice: number;
  readonly structureName: string;
  readonly cost: {
    /** Per share of one structure unit times quantities: paid is positive, received negative; decimal text, currency. */
    readonly netPremium: string;
    readonly feesToOpen: string;
    readonly feesToClose: string;
    /** Model value of the position under low, base, high volatility, currency, same sign rule as netPremium. */
    readonly modelValue: LowBaseHigh;
  };
  readonly legs: readonly LegForecast[];
  /** Vega-weighted mean of the legs' implied volatilities; null when a leg has none. */
  readonly impliedDailyVolatility: number | null;
  readonly odds: readonly StatedOdds[];
  readonly atExpiry: ProfitDistribution;
  /** Null when the plan holds to expiry. */
  readonly atExit: ProfitDistribution | null;
  readonly ends: PayoffEnds;
  readonly lattice: Lattice;
}
