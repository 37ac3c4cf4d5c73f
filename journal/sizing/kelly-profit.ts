import { DomainError } from '@/journal/errors/domain-error';
import { type PriceBend, weighedPrices } from '@/journal/forecast/normal-quadrature';
import { type LognormalPrice } from '@/journal/forecast/profit-law';
import { kellyOutcomes } from '@/journal/sizing/kelly-outcomes';

/**
 * Kelly's share for a profit that is any function of a lognormal price.
 * @param question.profitAt currency for one unit; `bends` where it bends (strikes, at expiry with width 0); `greatestLoss` of the
 *   profit over all prices, 0 or less, or null without limit, which is refused: no share is safe then.
 * @returns share of the account that the greatest loss met within nine deviations may be; negative: no bet.
 * @throws {DomainError} `kelly-loss-unlimited`, and as {@link kellyOutcomes}.
 * @see as {@link kellyOutcomes}; the mean by quadrature, to about 1e-9.
 */
export function kellyProfit(question: {
  readonly profitAt: (spotPrice: number) => number;
  readonly bends: readonly PriceBend[];
  readonly price: LognormalPrice;
  readonly greatestLoss: number | null;
}): number {
  const { profitAt, bends, price, greatestLoss } = question;
  if (greatestLoss === null || greatestLoss === -Infinity) throw new DomainError('kelly-loss-unlimited');
  const outcomes = weighedPrices(bends, price).map((each) => ({
    profit: profitAt(each.price),
    probability: each.weight,
  }));
  return kellyOutcomes(outcomes);
}
