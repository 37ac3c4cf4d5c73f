import { DomainError } from '@/journal/errors/domain-error';
import { quantile } from '@/journal/returns/quantile';

/**
 * What past events of one kind moved.
 * @param logMoves log price moves over the event, either sign, each within ±100, at least 1.
 * @returns sizes without sign: median, least, greatest; `rootMeanSquare`, the deviation to use for the next event (zero mean); n.
 * @throws {DomainError} `too-few-moves`, `move-invalid` with the index.
 * @see common practice; the few moves there are make the figures rough, so n stands beside them.
 */
export function pastEventMoves(logMoves: readonly number[]): {
  readonly median: number;
  readonly least: number;
  readonly greatest: number;
  readonly rootMeanSquare: number;
  readonly n: number;
} {
  const n = logMoves.length;
  if (n < 1) throw new DomainError('too-few-moves', { required: 1, received: 0 });
  const sizes = logMoves.map((move, index) => {
    if (!(Math.abs(move) <= 100)) throw new DomainError('move-invalid', { index, move });
    return Math.abs(move);
  });
  return {
    median: quantile(sizes, 0.5),
    least: Math.min(...sizes),
    greatest: Math.max(...sizes),
    rootMeanSquare: Math.sqrt(sizes.reduce((sum, size) => sum + size * size, 0) / n),
    n,
  };
}
