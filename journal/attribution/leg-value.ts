import { type AttributedLeg, type AttributionOptions, type MarketState } from '@/journal/attribution/attributed-leg';
import { DomainError } from '@/journal/errors/domain-error';
import { type Decimal, fromModelNumber, toDecimal } from '@/journal/money/decimal';
import { roundMoney } from '@/journal/money/rounding';
import { europeanOptionPrice } from '@/journal/pricing/european-option';

/**
 * Price of a leg per share in one state, rounded where the options say so.
 * @throws {DomainError} `spot-not-positive`, `price-not-finite`, and as the pricing function.
 */
export function legPrice(
  { instrument }: AttributedLeg,
  { state, dailyVolatility }: { readonly state: MarketState; readonly dailyVolatility: number },
  { priceOption = europeanOptionPrice, cornerPlaces }: AttributionOptions,
): number {
  if (!(state.spotPrice > 0 && state.spotPrice < Infinity)) {
    throw new DomainError('spot-not-positive', { spotPrice: state.spotPrice });
  }
  if (instrument.kind === 'stock') return state.spotPrice;
  const { type, strikePrice } = instrument;
  const price = priceOption({ ...state, type, strikePrice, dailyVolatility });
  if (!Number.isFinite(price)) throw new DomainError('price-not-finite', { price: String(price) });
  return cornerPlaces === undefined ? price : roundMoney(fromModelNumber(price), cornerPlaces).toNumber();
}

/**
 * Contracts times multiplier, positive when long.
 * @throws {DomainError} `decimal-invalid`, `quantity-zero`, `multiplier-invalid`.
 */
export function signedShares({ signedQuantity, multiplier, legId }: AttributedLeg): Decimal {
  const [quantity, factor] = [toDecimal(signedQuantity), toDecimal(multiplier)];
  if (quantity.isZero()) throw new DomainError('quantity-zero', { legId });
  if (!factor.greaterThan(0)) throw new DomainError('multiplier-invalid', { legId, multiplier });
  return quantity.times(factor);
}
