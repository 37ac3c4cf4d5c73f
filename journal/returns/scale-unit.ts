const LEAST = 1e-60;
const MOST = 1e60;

/**
 * A power of two to divide numbers by, so that fourth powers of them and of their differences neither over- nor underflow.
 * @param values finite.
 * @returns 1 for every ordinary sample (its largest magnitude 0, or from 1e-60 to 1e60), so that those keep their digits; otherwise
 *   what brings the largest magnitude to about 1 (exactly, since it is a power of two).
 */
export function scaleUnit(values: readonly number[]): number {
  let largest = 0;
  for (const value of values) largest = Math.max(largest, Math.abs(value));
  if (largest === 0 || (largest >= LEAST && largest <= MOST)) return 1;
  return 2 ** Math.floor(Math.log2(largest));
}
