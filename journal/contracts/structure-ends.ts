import { structureRow } from '@/journal/contracts/recognise-structure';
import { type StructureEnds, type StructureTerms } from '@/journal/contracts/structure-pattern';
import { type StructureName } from '@/journal/contracts/structure-table';
import { DomainError } from '@/journal/errors/domain-error';

/**
 * Greatest gain, greatest loss and break-evens of a named structure by the trade's formulas: a check on the exact pay-off, and
 * what a trader would work out by hand.
 * @param terms per share of one unit; the cost within the usual range (a debit below the width, and so on).
 * @returns null where the structure has legs of two expiries: that needs a model.
 * @throws {DomainError} `structure-unknown`; `structure-terms-invalid`.
 * @see structureTable.
 */
export function structureEnds(name: StructureName, terms: StructureTerms): StructureEnds | null {
  const { ends, legs } = structureRow(name);
  const required = new Set(legs.flatMap((leg) => (leg.type === 'shares' ? [] : [leg.strike]))).size;
  const isValid =
    Number.isFinite(terms.cost) &&
    terms.strikes.length === required &&
    terms.strikes.every((strike, index) => strike > (terms.strikes[index - 1] ?? 0) && strike < Infinity) &&
    0 < terms.few &&
    terms.few < terms.many &&
    terms.many < Infinity;
  if (!isValid)
    throw new DomainError('structure-terms-invalid', { name, cost: terms.cost, strikes: terms.strikes.length });
  return ends === null ? null : ends(terms);
}
