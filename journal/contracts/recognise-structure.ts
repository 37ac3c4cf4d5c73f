import { isStockLeg, type StructureLeg } from '@/journal/contracts/structure-leg';
import { type PatternLeg, type StructureRow } from '@/journal/contracts/structure-pattern';
import { type StructureName, structureTable } from '@/journal/contracts/structure-table';
import { DomainError } from '@/journal/errors/domain-error';

/** A structure that its legs were recognised as. */
export interface RecognisedStructure {
  readonly name: StructureName;
  /** How many times over. */
  readonly units: number;
  /** Lowest first, as typed but without trailing zeros. */
  readonly strikes: readonly string[];
  /** Nearest first. */
  readonly expirySessionDates: readonly string[];
  /** Contracts of its smaller and larger leg; null where the structure has no ratio. */
  readonly ratio: { readonly few: number; readonly many: number } | null;
}

interface PlacedLeg {
  readonly legIndex: number;
  readonly key: string;
  /** Contracts; of shares, as many as one contract delivers. */
  readonly quantity: number;
}
interface PlacedLegs {
  readonly legs: readonly PlacedLeg[];
  readonly strikes: readonly string[];
  readonly expirySessionDates: readonly string[];
}
type Fit =
  | { readonly kind: 'fits'; readonly units: number; readonly ratio: RecognisedStructure['ratio'] }
  | { readonly kind: 'other-shape' }
  | { readonly kind: 'uneven' }
  | {
      readonly kind: 'other-quantity';
      readonly legIndex: number;
      readonly quantity: number;
      readonly expected: number;
    };

const SAME_WIDTH = 1e-9;

/**
 * The trade's name for a set of legs, in any order.
 * @param legs legs of one series and side count as one.
 * @param sharesPerContract what one contract delivers, above 0; 100 by default.
 * @returns null where the trade has no name for it.
 * @see structureTable.
 */
export function recogniseStructure(legs: readonly StructureLeg[], sharesPerContract = 100): RecognisedStructure | null {
  const placed = placeLegs(legs, sharesPerContract);
  for (const row of structureTable) {
    const fit = fitOf(row, placed);
    if (fit.kind === 'fits') {
      const { strikes, expirySessionDates } = placed;
      return { name: row.name, units: fit.units, ratio: fit.ratio, strikes, expirySessionDates };
    }
  }
  return null;
}

/**
 * Holds legs against a named structure.
 * @throws {DomainError} `structure-leg-quantity` with the leg's index, its quantity in contracts and the one expected;
 *   `structure-wings-uneven`; `structure-legs-mismatch` where sides, types or the order of strikes are others.
 */
export function requireStructure(
  name: StructureName,
  legs: readonly StructureLeg[],
  sharesPerContract = 100,
): RecognisedStructure {
  const placed = placeLegs(legs, sharesPerContract);
  const fit = fitOf(structureRow(name), placed);
  switch (fit.kind) {
    case 'fits': {
      const { strikes, expirySessionDates } = placed;
      return { name, units: fit.units, ratio: fit.ratio, strikes, expirySessionDates };
    }
    case 'other-quantity': {
      const { legIndex, quantity, expected } = fit;
      throw new DomainError('structure-leg-quantity', { name, legIndex, quantity, expected });
    }
    case 'uneven':
      throw new DomainError('structure-wings-uneven', { name });
    case 'other-shape':
      throw new DomainError('structure-legs-mismatch', { name, legs: legs.length });
  }
}

/** @throws {DomainError} `structure-unknown`. */
export function structureRow(name: StructureName): (typeof structureTable)[number] {
  const row = structureTable.find((each) => each.name === name);
  if (row === undefined) throw new DomainError('structure-unknown', { name: String(name).slice(0, 40) });
  return row;
}

/** What tells a leg of a structure from the others. */
function keyOf({ side, type, strike, expiry }: Omit<PatternLeg, 'ratio'>): string {
  return type === 'shares' ? `${side} shares` : `${side} ${type} ${strike} ${expiry}`;
}

function placeLegs(legs: readonly StructureLeg[], sharesPerContract: number): PlacedLegs {
  const options = legs.filter((leg) => !isStockLeg(leg));
  const texts = new Map(options.map((leg) => [Number(leg.strikePrice), plainText(leg.strikePrice)]));
  const levels = [...texts.keys()].sort((left, right) => left - right);
  const expirySessionDates = [...new Set(options.map((leg) => leg.expirySessionDate))].sort();
  const placed = new Map<string, PlacedLeg>();
  for (const [legIndex, leg] of legs.entries()) {
    const key = isStockLeg(leg)
      ? keyOf({ side: leg.side, type: 'shares', strike: 0, expiry: 0 })
      : keyOf({
          side: leg.side,
          type: leg.type,
          strike: levels.indexOf(Number(leg.strikePrice)),
          expiry: expirySessionDates.indexOf(leg.expirySessionDate),
        });
    const quantity = isStockLeg(leg) ? leg.quantity / sharesPerContract : leg.quantity;
    const before = placed.get(key);
    placed.set(key, { legIndex: before?.legIndex ?? legIndex, key, quantity: quantity + (before?.quantity ?? 0) });
  }
  return { legs: [...placed.values()], strikes: levels.map((level) => texts.get(level) ?? ''), expirySessionDates };
}

function fitOf(row: StructureRow, { legs, strikes }: PlacedLegs): Fit {
  const pairs = pairLegs(row.legs, legs) ?? (row.otherLegs === null ? null : pairLegs(row.otherLegs, legs));
  if (pairs === null) return { kind: 'other-shape' };
  if (row.isEven && !hasEvenWings(strikes.map(Number))) return { kind: 'uneven' };
  const few = pairs.find(({ pattern }) => pattern.ratio === 'few')?.leg;
  const many = pairs.find(({ pattern }) => pattern.ratio === 'many')?.leg;
  if (few !== undefined && many !== undefined) {
    const units = greatestCommonDivisor(few.quantity, many.quantity);
    if (!(few.quantity < many.quantity)) {
      return { kind: 'other-quantity', legIndex: many.legIndex, quantity: many.quantity, expected: few.quantity + 1 };
    }
    return { kind: 'fits', units, ratio: { few: few.quantity / units, many: many.quantity / units } };
  }
  const [first] = pairs;
  if (first === undefined) return { kind: 'other-shape' };
  const units = first.leg.quantity / Number(first.pattern.ratio);
  const wrong = pairs.find(({ pattern, leg }) => leg.quantity !== units * Number(pattern.ratio));
  if (wrong !== undefined) {
    const { legIndex, quantity } = wrong.leg;
    return { kind: 'other-quantity', legIndex, quantity, expected: units * Number(wrong.pattern.ratio) };
  }
  return { kind: 'fits', units, ratio: null };
}

interface LegPair {
  readonly pattern: PatternLeg;
  readonly leg: PlacedLeg;
}

/** Each leg with its place in a pattern; null where one has none. */
function pairLegs(pattern: readonly PatternLeg[], legs: readonly PlacedLeg[]): LegPair[] | null {
  const byKey = new Map(legs.map((leg) => [leg.key, leg]));
  const pairs = pattern.flatMap((each) => {
    const leg = byKey.get(keyOf(each));
    return leg === undefined ? [] : [{ pattern: each, leg }];
  });
  return pairs.length === pattern.length && legs.length === pattern.length ? pairs : null;
}

/** Whether the lowest and the highest gap between strikes are of one width. */
function hasEvenWings(strikes: readonly number[]): boolean {
  const [lowest = 0, second = 0] = strikes;
  const [beforeLast = 0, last = 0] = strikes.slice(-2);
  return Math.abs(second - lowest - (last - beforeLast)) < SAME_WIDTH * Math.max(1, last);
}

function greatestCommonDivisor(left: number, right: number): number {
  return right === 0 ? left : greatestCommonDivisor(right, left % right);
}

function plainText(strikePrice: string): string {
  return strikePrice.includes('.') ? strikePrice.replace(/\.?0+$/, '') : strikePrice;
}
