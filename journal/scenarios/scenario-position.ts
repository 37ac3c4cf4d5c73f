import { DomainError } from '@/journal/errors/domain-error';
import { type RepricedLeg, valueAtMoment } from '@/journal/scenarios/reprice';
import { type Scenario, type SpotMove, type VolatilityShift } from '@/journal/scenarios/scenario';

/** A position made ready for repricing in any state of the market. */
export interface ScenarioPosition {
  readonly legs: readonly RepricedLeg[];
  /** Of the underlying, negative when short. */
  readonly shares: number;
  /** Currency, what opening cost; negative when received. */
  readonly costToOpen: number;
  readonly spotPrice: number;
  /** Standard deviation of the log price over the hold: what one sigma is. */
  readonly holdDeviation: number;
  /** To the first expiry. Calendar time is taken to pass evenly with the sessions. */
  readonly sessionsToExpiry: number;
  readonly yearsToExpiry: number;
  readonly ratePerYear: number;
  readonly dividendYield: number;
  /** Deviation of the log price on an event within the life of every leg, part of the legs' volatilities; null for none. */
  readonly eventDeviation: number | null;
}

/** Everything of a scenario but the move: one pricing function serves all prices. */
export type MarketState = Pick<Scenario, 'volatility' | 'sessionsElapsed' | 'isEventPast'>;

/**
 * Profit before closing costs as a function of the price of the underlying, in one state of the market.
 * @throws {DomainError} `scenario-sessions-invalid`; `volatility-shift-invalid` with the leg's index where nothing would be left,
 *   or where there is not one shift a leg; `event-variance-too-large` with the leg's index; `scenario-value-not-finite` for numbers
 *   of the position or a price that lead beyond the doubles.
 * @see valueAtMoment: repriced in full, never by Greeks; event variance: Patell and Wolfson (1979).
 */
export function profitInState(position: ScenarioPosition, state: MarketState): (spotPrice: number) => number {
  const { sessionsToExpiry, yearsToExpiry, costToOpen, ratePerYear, dividendYield } = position;
  const { sessionsElapsed } = state;
  if (!(sessionsElapsed >= 0 && sessionsElapsed <= sessionsToExpiry))
    throw new DomainError('scenario-sessions-invalid', { sessionsElapsed, sessionsToExpiry });
  const left = sessionsToExpiry - sessionsElapsed;
  const legs = position.legs.map((leg, index) => ({
    ...leg,
    dailyVolatility: shifted(volatilityLeft(position, leg, index, state), state.volatility, index),
  }));
  const valueAt = valueAtMoment(
    legs,
    {
      sessions: left,
      years: sessionsToExpiry > 0 ? (yearsToExpiry * left) / sessionsToExpiry : 0,
      ratePerYear,
      dividendYield,
    },
    position.shares,
  );
  return (spotPrice) => {
    const profit = valueAt(spotPrice) - costToOpen;
    if (!Number.isFinite(profit)) throw new DomainError('scenario-value-not-finite', { spotPrice, profit });
    return profit;
  };
}

/**
 * The price of the underlying after a move.
 * @throws {DomainError} `scenario-move-invalid` where it would not be above 0 and finite.
 */
export function priceAfter({ spotPrice, holdDeviation }: ScenarioPosition, move: SpotMove): number {
  const price =
    move.kind === 'sigmas' ? spotPrice * Math.exp(move.sigmas * holdDeviation) : spotPrice * (1 + move.percent / 100);
  if (!(price > 0 && price < Infinity)) throw new DomainError('scenario-move-invalid', { kind: move.kind, price });
  return price;
}

/** The leg's volatility over what is left of its life: with the event still to come, or with its variance gone. */
function volatilityLeft(
  { eventDeviation, sessionsToExpiry }: ScenarioPosition,
  { dailyVolatility, sessionsBeyond = 0 }: RepricedLeg,
  legIndex: number,
  { sessionsElapsed, isEventPast }: MarketState,
): number {
  if (eventDeviation === null) return dailyVolatility;
  const life = sessionsToExpiry + sessionsBeyond;
  const left = life - sessionsElapsed;
  const ordinary = dailyVolatility ** 2 * life - eventDeviation ** 2;
  if (!(ordinary >= 0)) throw new DomainError('event-variance-too-large', { legIndex, eventDeviation });
  if (!(left > 0)) return dailyVolatility;
  return Math.sqrt(ordinary / life + (isEventPast ? 0 : eventDeviation ** 2 / left));
}

function shifted(dailyVolatility: number, shift: VolatilityShift, legIndex: number): number {
  const made =
    shift.kind === 'relative'
      ? dailyVolatility * (1 + shift.percent / 100)
      : dailyVolatility + (shift.kind === 'parallel' ? shift.dailyShift : (shift.dailyShifts[legIndex] ?? NaN));
  if (!(made >= 0 && made < Infinity)) throw new DomainError('volatility-shift-invalid', { legIndex, made });
  return made;
}
