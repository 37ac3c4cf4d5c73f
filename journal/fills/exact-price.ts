import { type Decimal } from '@/journal/money/decimal';
import { roundMoney } from '@/journal/money/rounding';

/** Decimals a price per share is kept to where it comes from an amount. */
const PRICE_PLACES = 12;

/**
 * An amount for a quantity as a price and, where that price does not end, the amount that rounding it left over.
 * @param quantity above 0.
 * @returns price half-even to 12 decimals; price x quantity + rest is the amount.
 */
export function exactPrice({ amount, quantity }: { readonly amount: Decimal; readonly quantity: Decimal }): {
  price: Decimal;
  rest: Decimal;
} {
  const price = roundMoney(amount.dividedBy(quantity), PRICE_PLACES);
  return { price, rest: amount.minus(price.times(quantity)) };
}
