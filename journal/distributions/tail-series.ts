const NODES_PER_UNIT = 16;
const FIRST_NODE = -1;
const LAST_NODE = 39;
/** From one row of the table to the next. */
const ROW_LENGTH = 12;
const COEFFICIENTS = 11;
/** Up to here in exact arithmetic: the recurrence upwards is the shorter way where the one downwards takes thousands of steps. */
const EXACT_BELOW = 2;

function tailSeries(): Float64Array {
  const rows = (LAST_NODE - FIRST_NODE) * NODES_PER_UNIT + 1;
  const table = new Float64Array(rows * ROW_LENGTH);
  for (let row = 0; row < rows; row += 1) {
    const sixteenths = row + FIRST_NODE * NODES_PER_UNIT;
    const isNear = sixteenths < EXACT_BELOW * NODES_PER_UNIT;
    table.set(isNear ? nearCoefficients(sixteenths) : farCoefficients(sixteenths / NODES_PER_UNIT), row * ROW_LENGTH);
  }
  return table;
}

/** Downwards: from step n the start's error is damped by exp(−2·node·(√n − √k)), to 1e-17 from the one taken here. */
function farCoefficients(node: number): number[] {
  const steps = Math.ceil((20 / node + Math.sqrt(COEFFICIENTS)) ** 2);
  const ratios: number[] = [];
  for (let k = steps, ratio = 1 / (node + Math.sqrt(steps)); k >= 0; k -= 1) {
    ratio = 1 / (node + (k + 1) * ratio);
    if (k < COEFFICIENTS) ratios[k] = ratio;
  }
  let coefficient = 0.3989422804014327; // 1/sqrt(2π)
  return ratios.map((ratio) => (coefficient *= ratio));
}

const FIXED_POINT_BITS = 120;
const ONE = BigInt(1) << BigInt(FIXED_POINT_BITS);
/** 1/sqrt(2π) to 45 digits. */
const BELL_TOP = (BigInt('398942280401432677939946059934381868475858631') * ONE) / BigInt(10) ** BigInt(45);

/** T(x) = exp(x²/2)/2 − Σ x^(2k+1)/(2k+1)!!/sqrt(2π), then the recurrence upwards, in whole numbers of 2^-120. */
function nearCoefficients(sixteenths: number): number[] {
  const x = BigInt(sixteenths);
  const unit = BigInt(NODES_PER_UNIT);
  let even = ONE / BigInt(2);
  let odd = (BELL_TOP * x) / unit;
  let tail = even - odd;
  for (let k = 1; k < 60; k += 1) {
    even = (even * x * x) / (unit * unit * BigInt(2 * k));
    odd = (odd * x * x) / (unit * unit * BigInt(2 * k + 1));
    tail += even - odd;
  }
  const coefficients = [BELL_TOP, tail];
  for (let k = 1; k < COEFFICIENTS; k += 1) {
    const [before = ONE, last = ONE] = coefficients.slice(-2);
    coefficients.push((before - (last * x) / unit) / BigInt(k));
  }
  return coefficients.slice(1).map((coefficient) => Number(coefficient) / Number(ONE));
}

/**
 * What is left of the upper tail of the standard normal distribution without its exponential, T(x) = P(Z > x)·exp(x²/2), as its
 * Taylor series about 641 nodes a sixteenth apart: T(node − y) = Σ coefficient[k]·y^k.
 *
 * The k-th coefficient is ∫ s^k/k!·exp(−node·s − s²/2) ds / sqrt(2π), so that all are positive and obey
 * (k+1)·c[k+1] = c[k−1] − node·c[k], with 1/sqrt(2π) before the first.
 * @see Gautschi (1961), Math. Comp. 15, on these integrals (repeated integrals of the error function) and their recurrence, which
 *   loses digits upwards and is sound downwards.
 */
export const TAIL_SERIES = tailSeries();
