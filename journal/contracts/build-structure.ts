import { structureRow } from '@/journal/contracts/recognise-structure';
import { type StructureLeg } from '@/journal/contracts/structure-leg';
import { type StructureRow } from '@/journal/contracts/structure-pattern';
import { type StructureName } from '@/journal/contracts/structure-table';
import { DomainError } from '@/journal/errors/domain-error';
import { Decimal, fromModelNumber, toDecimal, toDecimalText } from '@/journal/money/decimal';

/** Where the strikes of a structure are to be, lowest first. */
export type StrikePlaces =
  | { readonly kind: 'strikes'; readonly strikePrices: readonly string[] }
  /** From the lowest strike by gaps; one gap serves for all. */
  | { readonly kind: 'widths'; readonly lowestStrikePrice: string; readonly widths: readonly string[] }
  /** By distance from the price in total deviations, each put on the nearest strike of the series. */
  | {
      readonly kind: 'sigmas';
      readonly spotPrice: number;
      readonly totalDeviation: number;
      readonly distances: readonly number[];
      /** Decimal text: strikes are whole multiples of it. */
      readonly strikeStep: string;
    };

export interface StructureRequest {
  readonly places: StrikePlaces;
  /** Nearest first: one, or two for calendars and diagonals. */
  readonly expirySessionDates: readonly string[];
  /** Units, a whole number from 1. */
  readonly quantity: number;
  /** Contracts of the smaller and larger leg of a ratio; 1 and 2 by default. */
  readonly ratio?: { readonly few: number; readonly many: number };
  /** What one contract delivers, a whole number from 1; 100 by default. */
  readonly sharesPerContract?: number;
  /** Decimal text, what shares cost; '0' where the structure has none or it is not known yet. */
  readonly sharePrice?: string;
  readonly nextId: () => string;
}

/**
 * The legs of a named structure, premiums still at 0.
 * @param request see {@link StructureRequest}.
 * @returns legs in the order of the table; recogniseStructure gives the name back.
 * @throws {DomainError} `structure-unknown`; `structure-strike-count` and `structure-expiry-count` with how many it takes;
 *   `structure-strikes-order` with the index of a strike that is not above the one before; `structure-expiries-order`;
 *   `structure-wings-uneven`; `structure-quantity-invalid`; `structure-ratio-invalid`; `structure-distance-invalid`;
 *   `decimal-invalid`.
 * @see structureTable.
 */
export function buildStructure(name: StructureName, request: StructureRequest): StructureLeg[] {
  const row: StructureRow = structureRow(name);
  const { quantity, expirySessionDates, ratio = { few: 1, many: 2 }, sharesPerContract = 100 } = request;
  const isWhole = [quantity, ratio.few, ratio.many, sharesPerContract].every(
    (count) => Number.isInteger(count) && count >= 1,
  );
  if (!isWhole) throw new DomainError('structure-quantity-invalid', { quantity, ...ratio, sharesPerContract });
  if (!(ratio.few < ratio.many)) throw new DomainError('structure-ratio-invalid', ratio);
  const strikes = strikesOf(row, request.places);
  checkExpiries(row, expirySessionDates);
  return row.legs.map((leg): StructureLeg => {
    const contracts = quantity * (typeof leg.ratio === 'number' ? leg.ratio : ratio[leg.ratio]);
    const id = request.nextId();
    if (leg.type === 'shares') {
      const { side, type } = leg;
      return { id, side, type, quantity: contracts * sharesPerContract, price: request.sharePrice ?? '0' };
    }
    return {
      id,
      side: leg.side,
      type: leg.type,
      strikePrice: strikes[leg.strike] ?? '',
      expirySessionDate: expirySessionDates[leg.expiry] ?? '',
      quantity: contracts,
      premium: '0',
    };
  });
}

function strikesOf(row: StructureRow, places: StrikePlaces): string[] {
  const required = new Set(row.legs.flatMap((leg) => (leg.type === 'shares' ? [] : [leg.strike]))).size;
  const placed = placedStrikes(places, required);
  if (placed.length !== required) {
    throw new DomainError('structure-strike-count', { name: row.name, required, received: placed.length });
  }
  for (const [index, strike] of placed.entries()) {
    const before = placed[index - 1] ?? new Decimal(0);
    if (!strike.greaterThan(before))
      throw new DomainError('structure-strikes-order', { index, strikePrice: toDecimalText(strike) });
  }
  const [lowest, second] = placed;
  const [beforeLast, last] = placed.slice(-2);
  const isEven = !row.isEven || (last?.minus(beforeLast ?? 0).equals(second?.minus(lowest ?? 0) ?? 0) ?? true);
  if (!isEven) throw new DomainError('structure-wings-uneven', { name: row.name });
  return placed.map(toDecimalText);
}

function placedStrikes(places: StrikePlaces, required: number): Decimal[] {
  if (places.kind === 'strikes') return places.strikePrices.map(toDecimal);
  if (places.kind === 'sigmas') return places.distances.map((distance) => strikeAtDistance(places, distance));
  const { lowestStrikePrice, widths } = places;
  const strikes = [toDecimal(lowestStrikePrice)];
  const gaps = widths.length === 1 ? Array.from({ length: required - 1 }, () => widths[0] ?? '') : widths;
  for (const gap of gaps) strikes.push((strikes[strikes.length - 1] ?? new Decimal(0)).plus(toDecimal(gap)));
  return required === 0 ? [] : strikes;
}

function strikeAtDistance(
  { spotPrice, totalDeviation, strikeStep }: Extract<StrikePlaces, { kind: 'sigmas' }>,
  distance: number,
): Decimal {
  const step = toDecimal(strikeStep);
  const level = spotPrice * Math.exp(distance * totalDeviation);
  const isValid = spotPrice > 0 && totalDeviation > 0 && level > 0 && level < Infinity && step.greaterThan(0);
  if (!isValid)
    throw new DomainError('structure-distance-invalid', { spotPrice, totalDeviation, distance, strikeStep });
  return fromModelNumber(level).dividedBy(step).toDecimalPlaces(0).times(step);
}

function checkExpiries(row: StructureRow, dates: readonly string[]): void {
  const required = new Set(row.legs.flatMap((leg) => (leg.type === 'shares' ? [] : [leg.expiry]))).size;
  if (dates.length < required || dates.length > Math.max(1, required))
    throw new DomainError('structure-expiry-count', { name: row.name, required, received: dates.length });
  const [nearest = '', later] = dates;
  if (later !== undefined && !(nearest < later)) throw new DomainError('structure-expiries-order', { nearest, later });
}
