/**
 * Sum with the rounding errors carried along, so that the order and number of terms hardly matter.
 * @param values finite, and every sum of the first few of them too. @returns 0 for none.
 * @see Neumaier (1974), Z. angew. Math. Mech. 54 (an improved Kahan summation).
 */
export function exactSum(values: Iterable<number>): number {
  let sum = 0;
  let carried = 0;
  for (const value of values) {
    const next = sum + value;
    carried += Math.abs(sum) >= Math.abs(value) ? sum - next + value : value - next + sum;
    sum = next;
  }
  return sum + carried;
}
