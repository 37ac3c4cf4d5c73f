import { recogniseStructure, structureRow } from '@/journal/contracts/recognise-structure';
import { type StructureLeg } from '@/journal/contracts/structure-leg';

/**
 * The trade's name for a structure: "long 102 call", "3 × bull put 97 / 95", "iron condor 3930 to 4070", "covered call 105".
 * @param legs as planned; what has no common name is called by its number of legs.
 * @param sharesPerContract what one contract delivers, above 0; 100 by default.
 * @returns words without the underlying; "no legs yet" for none.
 * @see structureTable.
 */
export function structureName(legs: readonly StructureLeg[], sharesPerContract = 100): string {
  if (legs.length === 0) return 'no legs yet';
  const found = recogniseStructure(legs, sharesPerContract);
  if (found === null) return `${legs.length} legs`;
  const { name, units, strikes, ratio } = found;
  const row = structureRow(name);
  const times = units === 1 ? '' : `${units} × `;
  const [only] = row.legs;
  if (row.legs.length === 1 && only !== undefined) {
    const way = only.side === 'buy' ? 'long' : 'short';
    if (only.type === 'shares') return `${way} ${units * sharesPerContract} shares`;
    return `${way} ${times}${strikes[0] ?? ''} ${only.type}`;
  }
  const said = row.saying === 'descending' ? [...strikes].reverse() : strikes;
  const places =
    row.saying === 'outer' ? `${strikes[0] ?? ''} to ${strikes[strikes.length - 1] ?? ''}` : said.join(' / ');
  if (ratio === null) return `${times}${name} ${places}`;
  const quantities = row.legs.map((leg) => (leg.ratio === 'few' ? ratio.few : ratio.many));
  return `${times}${name} ${places}, ${quantities.join(' × ')}`;
}
