const SMALLEST_NORMAL = 2 ** -1022;

/**
 * ln(numerator / denominator) for any two positive doubles: where their quotient over- or underflows, the difference of the logarithms.
 * @param numerator, denominator above 0 and finite.
 * @returns a finite number, at most 1,455 in magnitude.
 */
export function logRatio(numerator: number, denominator: number): number {
  const ratio = numerator / denominator;
  return ratio >= SMALLEST_NORMAL && ratio < Infinity ? Math.log(ratio) : Math.log(numerator) - Math.log(denominator);
}
