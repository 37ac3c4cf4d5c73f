/** A move of the underlying: in total deviations of the hold, or in percent of its price. */
export type SpotMove =
  { readonly kind: 'sigmas'; readonly sigmas: number } | { readonly kind: 'percent'; readonly percent: number };

/** A change of the volatility the legs are priced at, fractions per session. */
export type VolatilityShift =
  | { readonly kind: 'parallel'; readonly dailyShift: number }
  /** One for each leg, in their order. */
  | { readonly kind: 'byLeg'; readonly dailyShifts: readonly number[] }
  /** 10 raises every leg's volatility by a tenth of itself. */
  | { readonly kind: 'relative'; readonly percent: number };

/** One state of the market a position is repriced in. */
export interface Scenario {
  readonly move: SpotMove;
  readonly volatility: VolatilityShift;
  /** 0 to the sessions to the first expiry, fractions allowed. */
  readonly sessionsElapsed: number;
  /** Whether the event that the position was bought over is past; without an event it changes nothing. */
  readonly isEventPast: boolean;
}

export interface NamedScenario extends Scenario {
  readonly name: string;
}

export const unchanged: Scenario = {
  move: { kind: 'percent', percent: 0 },
  volatility: { kind: 'parallel', dailyShift: 0 },
  sessionsElapsed: 0,
  isEventPast: false,
};
