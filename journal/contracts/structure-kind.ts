import { recogniseStructure } from '@/journal/contracts/recognise-structure';
import { type StructureLeg } from '@/journal/contracts/structure-leg';

/** What a structure without a common name is counted as. */
export const OTHER_STRUCTURE = 'other';

/**
 * What kind of structure legs make, without strikes and quantities: "bull put", "long call", or "other".
 * @param legs as planned. @param sharesPerContract what one contract delivers, above 0; 100 by default.
 * @see structureTable.
 */
export function structureKind(legs: readonly StructureLeg[], sharesPerContract = 100): string {
  return recogniseStructure(legs, sharesPerContract)?.name ?? OTHER_STRUCTURE;
}
