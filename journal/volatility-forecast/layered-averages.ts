/** Sessions over which the averages fade, 4 to 512 by steps of √2. */
const FADES = Array.from({ length: 15 }, (_, step) => 4 * Math.SQRT2 ** step);
/** Sessions (six years) at which the weight of an average would reach 0. */
const MEMORY = 1560;

/**
 * Variance by averages of past squares over many lengths at once: fifteen exponential averages that fade over 4 to 512 sessions, each
 * with the weight 1 − ln(length)/ln(1560), so that the memory of a shock fades slowly, as it does in markets.
 * @param squares squared returns, oldest first, each 0 or more.
 * @returns one number more than squares: at index t the variance of one session as known from the first t; index 0 is 0.
 * @see Zumbach (2007), The RiskMetrics 2006 methodology, sections 3 and 4; each average is divided by the sum of its weights so far, so
 *   that it needs no start value.
 */
export function layeredVariances(squares: ArrayLike<number>): Float64Array {
  const layers = FADES.map((fade) => ({
    keep: Math.exp(-1 / fade),
    weight: 1 - Math.log(fade) / Math.log(MEMORY),
    sum: 0,
    weights: 0,
  }));
  const weights = layers.reduce((sum, { weight }) => sum + weight, 0);
  const variances = new Float64Array(squares.length + 1);
  for (let index = 0; index < squares.length; index += 1) {
    let variance = 0;
    for (const layer of layers) {
      layer.sum = layer.keep * layer.sum + (1 - layer.keep) * (squares[index] ?? 0);
      layer.weights = layer.keep * layer.weights + (1 - layer.keep);
      variance += (layer.weight * layer.sum) / layer.weights;
    }
    variances[index + 1] = variance / weights;
  }
  return variances;
}
