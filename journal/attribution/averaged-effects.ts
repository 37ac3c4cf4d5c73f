import { DomainError } from '@/journal/errors/domain-error';

const MOST_FACTORS = 6;

/**
 * Parts the change of a value among the factors that changed: the effect of each is averaged over all orders in which they can be
 * changed one by one, with the value worked out in full at every corner. The effects add up to the whole change, and no order is
 * preferred.
 * @param valueAt the value when the factors marked true have their new state and the others their old; asked once a corner.
 * @param factorCount a whole number from 1 to 6: 8 corners and 6 orders for 3 factors.
 * @returns one effect a factor, in the value's unit.
 * @throws {DomainError} `factor-count-invalid`, `corner-not-finite`.
 * @see Shapley (1953), A value for n-person games, in Contributions to the Theory of Games II; as a decomposition Shorrocks (2013),
 *   J. Economic Inequality 11(1), 99-126.
 */
export function averagedEffects(valueAt: (isNew: readonly boolean[]) => number, factorCount: number): number[] {
  const isCountValid = Number.isInteger(factorCount) && factorCount >= 1 && factorCount <= MOST_FACTORS;
  if (!isCountValid) throw new DomainError('factor-count-invalid', { factorCount });
  const corners = Array.from({ length: 2 ** factorCount }, (_, corner) => {
    const value = valueAt(Array.from({ length: factorCount }, (_unused, factor) => isSet(corner, factor)));
    if (!Number.isFinite(value)) throw new DomainError('corner-not-finite', { corner, value: String(value) });
    return value;
  });
  return Array.from({ length: factorCount }, (_, factor) =>
    corners.reduce((effect, value, corner) => {
      if (isSet(corner, factor)) return effect;
      const changed = corners[corner | (1 << factor)] ?? value;
      return effect + shareOfOrders(bitsIn(corner), factorCount) * (changed - value);
    }, 0),
  );
}

/** Share of all orders in which exactly so many given factors come before one, and the rest after it. */
function shareOfOrders(before: number, factorCount: number): number {
  return (factorial(before) * factorial(factorCount - before - 1)) / factorial(factorCount);
}

function isSet(corner: number, factor: number): boolean {
  return ((corner >> factor) & 1) === 1;
}

function bitsIn(corner: number): number {
  return corner === 0 ? 0 : (corner & 1) + bitsIn(corner >> 1);
}

function factorial(count: number): number {
  return count <= 1 ? 1 : count * factorial(count - 1);
}
