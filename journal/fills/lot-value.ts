import { type Decimal } from '@/journal/money/decimal';
import { roundMoney } from '@/journal/money/rounding';

/** Averages need not end (a third of a cent); they are kept to this many decimals, and the last part closed takes the rest. */
export const AVERAGE_PLACES = 12;

/** Price per share of what was opened for a value, half-even to 12 decimals. */
export function averagePrice({
  value,
  quantity,
  multiplier,
}: {
  readonly value: Decimal;
  readonly quantity: Decimal;
  readonly multiplier: Decimal;
}): Decimal {
  return roundMoney(value.dividedBy(quantity).dividedBy(multiplier), AVERAGE_PLACES);
}
