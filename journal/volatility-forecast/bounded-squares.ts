const LARGEST_MOVE = 5;
const DECAY = 0.97;
const FIRST_RETURNS = 21;

/**
 * Squared returns with the news of a single shock bounded: a move past five times the volatility just before counts as five times, so
 * that one event does not set the forecast for months.
 * @param returns log returns, oldest first, finite.
 * @returns as many squares; the first 21 and all after nothing but zeros unbounded.
 * @see the bound on the news of one return: Muler and Yohai (2008), J. Statistical Planning and Inference 138, 2918-2940. The bound of
 *   five, and the volatility it is set against (weighted at 0.97, or of the whole history if that is more), are from experience.
 */
export function boundedSquares(returns: readonly number[]): Float64Array {
  const squares = new Float64Array(returns.length);
  let recent = 0;
  let whole = 0;
  for (const [index, value] of returns.entries()) {
    const square = value * value;
    const reference = Math.max(recent, whole);
    const isBound = index >= FIRST_RETURNS && reference > 0;
    const bounded = isBound ? Math.min(square, LARGEST_MOVE ** 2 * reference) : square;
    squares[index] = bounded;
    whole += (bounded - whole) / (index + 1);
    recent = index < FIRST_RETURNS ? whole : DECAY * recent + (1 - DECAY) * bounded;
  }
  return squares;
}
