import { type PlanModel, lawAt } from '@/journal/forecast/plan-model';
import { type PriceRange } from '@/journal/forecast/profit-law';

/** One end of a range of profit; null where the range has no end on this side. */
export interface BreakEvenMove {
  readonly price: number;
  /** From the price now, in total deviations to the moment at base volatility. */
  readonly sigmas: number;
  /** From the price now, in percent of it. */
  readonly percent: number;
}

/** A range of prices in which the plan makes more than 0 after costs. */
export interface ProfitRange {
  readonly from: BreakEvenMove | null;
  readonly to: BreakEvenMove | null;
  /** Of ending in it, under the plan's drift at base volatility. */
  readonly probability: number;
}

/** What must be true of the underlying, and by when, for a plan to make money after its costs. */
export interface BreakEvenMoves {
  readonly horizon: 'expiry' | 'exit';
  readonly bySessionDate: string;
  readonly sessions: number;
  /** Lowest price first; empty where no price makes a profit. */
  readonly profitable: readonly ProfitRange[];
}

/**
 * The moves that a plan needs, at its planned exit and at expiry.
 * @returns the exit first where the plan leaves before expiry.
 * @see lawAt; common practice.
 */
export function breakEvenMoves(model: PlanModel): BreakEvenMoves[] {
  const { horizon } = model;
  const atExpiry = movesAt(model, 'expiry', {
    bySessionDate: horizon.expirySessionDate,
    sessions: horizon.sessions.toExpiry,
  });
  if (horizon.holdsToExpiry) return [atExpiry];
  const atExit = movesAt(model, 'exit', {
    bySessionDate: horizon.exitSessionDate,
    sessions: horizon.sessions.holding,
  });
  return [atExit, atExpiry];
}

function movesAt(
  model: PlanModel,
  horizon: 'expiry' | 'exit',
  when: { readonly bySessionDate: string; readonly sessions: number },
): BreakEvenMoves {
  const { input, spotPrice } = model;
  const deviation = input.volatility.base * Math.sqrt(when.sessions);
  const moveTo = (price: number): BreakEvenMove => ({
    price,
    sigmas: Math.log(price / spotPrice) / deviation,
    percent: 100 * (price / spotPrice - 1),
  });
  const ranges = lawAt(model, horizon, input.volatility.base, input.drift).rangesAbove(0);
  return {
    horizon,
    ...when,
    profitable: ranges.map(({ from, to, probability }: PriceRange) => ({
      from: from > 0 ? moveTo(from) : null,
      to: to < Infinity ? moveTo(to) : null,
      probability,
    })),
  };
}
