import { DomainError } from '@/journal/errors/domain-error';

/** Which edge belongs to a bin: 'left' [0, 0.1), [0.1, 0.2) ... with 1 in the last; 'right' (0, 0.1], (0.1, 0.2] ... with 0 in the first. */
export type ClosedEdge = 'left' | 'right';

const binCount = 10;

/**
 * Number of the bin of width 0.1, 0 to 9, that a probability falls in.
 * @param probability 0 to 1.
 * @throws {DomainError} `probability-invalid`.
 */
export function tenBinOf(probability: number, closed: ClosedEdge = 'left'): number {
  if (!(probability >= 0 && probability <= 1)) throw new DomainError('probability-invalid', { probability });
  // Edges are compared as k / 10, since probability * 10 may round across one.
  let bin = 0;
  while (bin < binCount - 1) {
    const upperEdge = (bin + 1) / binCount;
    if (closed === 'left' ? probability < upperEdge : probability <= upperEdge) break;
    bin += 1;
  }
  return bin;
}

/**
 * Sorts items into the ten bins by their probability.
 * @returns ten lists, some of them perhaps empty, items in the order they came.
 * @throws {DomainError} `probability-invalid`.
 */
export function inTenBins<Item>(
  items: readonly Item[],
  probabilityOf: (item: Item) => number,
  closed: ClosedEdge = 'left',
): Item[][] {
  const bins: Item[][] = Array.from({ length: binCount }, () => []);
  for (const item of items) bins[tenBinOf(probabilityOf(item), closed)]?.push(item);
  return bins;
}
