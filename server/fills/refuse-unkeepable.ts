import { cashFlows } from '@/journal/fills/cash-flow';
import { type Fill } from '@/journal/fills/fill';
import { toDecimal } from '@/journal/money/decimal';
import { ApiFailure } from '@/server/errors/api-failure';
import { decimalTextSchema } from '@/shared/contract/fields';

/** Below this, the sums of a thousand fills still fit the columns and the answers. */
const MOST_CASH = '1e15';

/** Refuses amounts whose products are larger, or finer, than can be stored and shown exactly. @throws {ApiFailure} `fill-impossible`. */
export function refuseUnkeepable(fills: readonly Fill[]): void {
  const amounts = [...fills.map(({ fees }) => fees), ...cashFlows(fills).values()];
  const isKept = (amount: string) =>
    decimalTextSchema.safeParse(amount).success && toDecimal(amount).abs().lessThan(MOST_CASH);
  if (amounts.every(isKept)) return;
  const message = 'Quantity times price comes to more than is kept, or to more than twelve decimal places.';
  throw new ApiFailure('fill-impossible', message, [{ field: 'quantity', message }]);
}
