import { DomainError } from '@/journal/errors/domain-error';
import { Decimal, withoutNegativeZero } from '@/journal/money/decimal';

/**
 * Rounds half to even, the mode of every amount shown or settled.
 * @param amount finite.
 * @param places decimal places kept, a whole number from 0; 2 for cents.
 * @throws {DomainError} `places-invalid`, `amount-not-finite`.
 */
export function roundMoney(amount: Decimal, places = 2): Decimal {
  requirePlaces(places);
  if (!amount.isFinite()) throw new DomainError('amount-not-finite', { amount: amount.toString() });
  return withoutNegativeZero(amount.toDecimalPlaces(places, Decimal.ROUND_HALF_EVEN));
}

/**
 * Rounds parts so that they add up to a rounded total: each part is cut down, and the units left over go to the parts that
 * lost most; between equals, to the earlier one. (Hamilton's apportionment; common practice for split amounts.)
 * @param parts finite, any sign; at least one.
 * @param places decimal places of every rounded part, a whole number from 0.
 * @param total what the rounded parts must add up to, a multiple of one unit; by default the parts' sum, rounded half-even.
 * @returns the rounded parts in the same order, each less than one unit from its part.
 * @throws {DomainError} `parts-missing`, `places-invalid`, `amount-not-finite`, and `total-out-of-reach` when no such rounding adds
 *   up to the total.
 */
export function largestRemainder(parts: readonly Decimal[], places = 2, total?: Decimal): Decimal[] {
  if (parts.length === 0) throw new DomainError('parts-missing');
  requirePlaces(places);
  const sum = parts.reduce((soFar, part) => soFar.plus(part), new Decimal(0));
  if (!sum.isFinite()) throw new DomainError('amount-not-finite', { amount: sum.toString() });
  const goal = total ?? roundMoney(sum, places);
  const unit = new Decimal(10).pow(-places);
  const cut = parts.map((part, index) => {
    const floor = part.toDecimalPlaces(places, Decimal.ROUND_FLOOR);
    return { index, floor, lost: part.minus(floor) };
  });
  const unitsLeft = goal.minus(cut.reduce((soFar, { floor }) => soFar.plus(floor), new Decimal(0))).dividedBy(unit);
  const gaining = cut.filter(({ lost }) => lost.greaterThan(0)).length;
  if (!unitsLeft.isInteger() || unitsLeft.isNegative() || unitsLeft.greaterThan(gaining)) {
    throw new DomainError('total-out-of-reach', { total: goal.toString(), sum: sum.toString(), places });
  }
  const order = [...cut].sort((one, other) => other.lost.comparedTo(one.lost) || one.index - other.index);
  const raised = new Set(order.slice(0, unitsLeft.toNumber()).map(({ index }) => index));
  return cut.map(({ index, floor }) => (raised.has(index) ? floor.plus(unit) : floor).plus(0));
}

function requirePlaces(places: number): void {
  if (!(Number.isInteger(places) && places >= 0 && places <= 20)) throw new DomainError('places-invalid', { places });
}
