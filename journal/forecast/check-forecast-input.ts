import { type PlannedLeg } from '@/journal/contracts/planned-leg';
import { DomainError } from '@/journal/errors/domain-error';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { type Decimal, toDecimal } from '@/journal/money/decimal';

const MOST_CONTRACTS = 1_000_000;

/**
 * Refuses a plan whose numbers make no sense together, before anything is computed from them.
 * @throws {DomainError} `leg-id-repeated`, `leg-quantity-invalid`, `leg-premium-negative` and `strike-not-positive` with the leg's
 *   index; `fee-negative`, `multiplier-not-positive`, `spot-not-positive`; `level-not-positive` and `level-at-spot` with the
 *   level's name; `target-and-stop-on-one-side`; `rate-not-finite`; `overnight-share-out-of-range`; `decimal-invalid`.
 */
export function checkForecastInput(input: ForecastInput): void {
  checkLegs(input.legs);
  if (toDecimal(input.feePerContract).isNegative())
    throw new DomainError('fee-negative', { feePerContract: input.feePerContract });
  const { multiplier, dividendYield } = input.underlying;
  if (!toDecimal(multiplier).greaterThan(0)) throw new DomainError('multiplier-not-positive', { multiplier });
  const spot = toDecimal(input.spot.price);
  if (!spot.greaterThan(0)) throw new DomainError('spot-not-positive', { spotPrice: input.spot.price });
  if (!Number.isFinite(input.ratePerYear) || !Number.isFinite(dividendYield))
    throw new DomainError('rate-not-finite', { ratePerYear: input.ratePerYear, dividendYield });
  const { overnightShare } = input;
  if (!(overnightShare >= 0 && overnightShare <= 1))
    throw new DomainError('overnight-share-out-of-range', { overnightShare });
  checkLevels(input, spot);
}

function checkLegs(legs: readonly PlannedLeg[]): void {
  const seen = new Set<string>();
  for (const [legIndex, { id, quantity, premium, strikePrice }] of legs.entries()) {
    if (seen.has(id)) throw new DomainError('leg-id-repeated', { legIndex, id });
    seen.add(id);
    if (!(Number.isInteger(quantity) && quantity >= 1 && quantity <= MOST_CONTRACTS))
      throw new DomainError('leg-quantity-invalid', { legIndex, quantity });
    if (toDecimal(premium).isNegative()) throw new DomainError('leg-premium-negative', { legIndex, premium });
    if (!toDecimal(strikePrice).greaterThan(0)) throw new DomainError('strike-not-positive', { legIndex, strikePrice });
  }
}

/** A target or stop is somewhere else than the price, and the two are not on one side of it: the nearer would always come first. */
function checkLevels({ targetPrice, stopPrice }: ForecastInput, spot: Decimal): void {
  const sides = Object.entries({ target: targetPrice, stop: stopPrice }).flatMap(([name, text]) => {
    if (text === null) return [];
    const level = toDecimal(text);
    if (!level.greaterThan(0)) throw new DomainError('level-not-positive', { name, level: text });
    if (level.equals(spot)) throw new DomainError('level-at-spot', { name, level: text });
    return [level.greaterThan(spot)];
  });
  const [target, stop] = sides;
  if (target !== undefined && target === stop) {
    throw new DomainError('target-and-stop-on-one-side', { targetPrice, stopPrice });
  }
}
