import { DomainError } from '@/journal/errors/domain-error';
import { type SeededRandom } from '@/journal/random/seeded-random';

/** `moving`: blocks of one length; `stationary`: blocks of random lengths about a mean, the source closed to a ring. */
export type BlockMethod = 'moving' | 'stationary';

/**
 * Positions drawn in blocks of neighbours, so that what follows what in the source is kept.
 * @param size positions in the source, from 1. @param random source of draws.
 * @param options.blockLength whole, 1 to `size`: the length of a moving block (1: independent draws), the mean of a stationary one.
 * @returns `start` begins a new block; `next` gives the next position, 0 to size − 1.
 * @throws {DomainError} `block-length-out-of-range`.
 * @see moving: Künsch (1989), Annals of Statistics 17; stationary: Politis and Romano (1994), J. American Statistical Association 89.
 */
export function blockDraws(
  size: number,
  random: SeededRandom,
  { method, blockLength }: { readonly method: BlockMethod; readonly blockLength: number },
): { readonly start: () => void; readonly next: () => number } {
  if (!(Number.isInteger(blockLength) && blockLength >= 1 && blockLength <= size))
    throw new DomainError('block-length-out-of-range', { blockLength, returns: size });
  const starts = method === 'moving' ? size - blockLength + 1 : size;
  const logOfGoingOn = Math.log1p(-1 / blockLength);
  const lengthOfBlock =
    method === 'moving' || blockLength === 1
      ? () => blockLength
      : () => Math.max(1, Math.ceil(Math.log(random.uniform()) / logOfGoingOn));
  let position = 0;
  let left = 0;
  return {
    start: () => {
      left = 0;
    },
    next: () => {
      if (left === 0) {
        position = random.index(starts);
        left = lengthOfBlock();
      } else {
        position = position + 1 === size ? 0 : position + 1;
      }
      left -= 1;
      return position;
    },
  };
}

/**
 * Length of block where none is given: the cube root of the number of returns.
 * @param size number of returns, from 1.
 * @see rate: Hall, Horowitz and Jing (1995), Biometrika 82, for a variance; the factor 1 is common practice.
 */
export function defaultBlockLength(size: number): number {
  return Math.max(1, Math.round(Math.cbrt(size)));
}
