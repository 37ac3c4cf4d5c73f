import { payoffAt } from '@/journal/contracts/expiry-payoff';
import { type PlanModel, profitAtExit } from '@/journal/forecast/plan-model';
import { resampledProfit, type ResampledProfit } from '@/journal/forecast/resampled-profit';

/**
 * The profit of a plan at its planned exit over resampled returns.
 * @param totalLogReturns log price changes over the plan's hold, one a path; see resampledProfit.
 * @throws {DomainError} as resampledProfit.
 * @see resampledProfit.
 */
export function resampledForecast(model: PlanModel, totalLogReturns: ArrayLike<number>): ResampledProfit {
  const { horizon, payoff, spotPrice } = model;
  const profitAt = horizon.holdsToExpiry ? (price: number) => payoffAt(payoff, price) : profitAtExit(model);
  return resampledProfit({ profitAt, spotPrice, totalLogReturns });
}
