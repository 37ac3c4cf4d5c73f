import { DomainError } from '@/journal/errors/domain-error';
import { exponentialOfSum } from '@/journal/distributions/exponential';
import { TAIL_SERIES } from '@/journal/distributions/tail-series';

const ROOT_TWO_PI = 2.5066282746310002; // sqrt(2π)
/** Deviations at which density and tail are 0 in doubles. */
const VANISHED = 39;

/**
 * Density of the standard normal distribution.
 * @param x any number.
 * @returns exp(-x²/2)/sqrt(2π), full relative accuracy while it is a normal double (|x| up to 37.6).
 */
export function normalDensity(x: number): number {
  return expMinusHalfSquare(x) / ROOT_TWO_PI;
}

/**
 * exp(-x²/2) without losing digits to the rounding of x²: x is cut to 24 binary digits, so that the square of the cut is
 * exact, and what is left goes into the remainder of the exponential.
 * @see Cody (1969) and Algorithm 715, which cut after four places and pay for a second exponential.
 */
export function expMinusHalfSquare(x: number): number {
  if (x > 39 || x < -39) return 0;
  const cut = Math.fround(x);
  return exponentialOfSum(-0.5 * cut * cut, -0.5 * (x - cut) * (x + cut));
}

/**
 * Upper tail of the standard normal distribution, P(Z > x).
 * @param x any number; NaN gives NaN.
 * @returns probability in [0, 1], relative accuracy about 5e-16 down to 1e-300 (x to 37).
 * @see {@link scaledUpperTail}, times its exponential.
 */
export function normalUpperTail(x: number): number {
  return x < 0 ? 1 - positiveTail(-x) : positiveTail(x);
}

/** Distribution function of the standard normal, P(Z <= x); accuracy and source as {@link normalUpperTail}. */
export function normalCumulative(x: number): number {
  return x > 0 ? 1 - positiveTail(x) : positiveTail(-x);
}

function positiveTail(x: number): number {
  return x > VANISHED ? 0 : expMinusHalfSquare(x) * scaledUpperTail(x);
}

/**
 * Upper tail without its exponential factor, P(Z > x)·exp(x²/2): what is left to multiply by when the exponential is known
 * from elsewhere (it neither over- nor underflows).
 * @param x any number; NaN gives NaN. Below -38 the exponential leaves the doubles and the result is Infinity.
 * @returns relative accuracy about 3e-16 from -1 on, 1e-15 below.
 * @see Taylor series about the nearest node of {@link TAIL_SERIES}; beyond the last node the asymptotic series, Abramowitz and
 *   Stegun (1964) 26.2.12.
 */
export function scaledUpperTail(x: number): number {
  if (!(x <= 39 && x >= -1)) return scaledTailBeyondNodes(x);
  const row = (x * 16 + 16.5) | 0; // nodes lie a sixteenth apart, from -1
  const y = row / 16 - 1 - x; // up to 1/32 in size: nine terms have all digits
  const square = y * y;
  const at = row * 12;
  const c = TAIL_SERIES;
  const high =
    (c[at + 4] ?? NaN) +
    y * (c[at + 5] ?? NaN) +
    square * ((c[at + 6] ?? NaN) + y * (c[at + 7] ?? NaN) + square * (c[at + 8] ?? NaN));
  const low = (c[at + 1] ?? NaN) + y * ((c[at + 2] ?? NaN) + y * (c[at + 3] ?? NaN));
  return (c[at] ?? NaN) + (y * low + square * square * high);
}

/** Above 39 (and NaN) seven terms of the series leave less than a rounding; below -1 the tail is nearly all there is. */
function scaledTailBeyondNodes(x: number): number {
  if (x < -1) return normalUpperTail(x) / expMinusHalfSquare(x);
  const y = 1 / (x * x);
  const series = 1 - y * (1 - y * (3 - y * (15 - y * (105 - y * (945 - y * 10395)))));
  return series / (x * ROOT_TWO_PI);
}

/**
 * Quantile of the standard normal distribution.
 * @param probability strictly between 0 and 1.
 * @returns x with P(Z <= x) = probability, accuracy about 1e-16 absolute near the centre and 4e-16 relative in the tails.
 * @throws {DomainError} `probability-out-of-range`.
 * @see Newton's method on the logarithm of the tail, which is concave, so that it converges from the outside; from the quartiles
 *   inwards on the part between median and quantile.
 */
export function normalQuantile(probability: number): number {
  if (!(probability > 0 && probability < 1)) throw new DomainError('probability-out-of-range', { probability });
  const tail = Math.min(probability, 1 - probability);
  const distance = tail > 0.25 ? centralQuantile(0.5 - tail) : tailQuantile(tail);
  return probability < 0.5 ? -distance : distance;
}

/** Distance from the median at which `part` of the probability lies between, up to one quarter. */
function centralQuantile(part: number): number {
  let x = part * ROOT_TWO_PI;
  for (let step = 0; step < 12; step += 1) {
    const change = centralRatio(x) - part / normalDensity(x);
    x -= change;
    if (Math.abs(change) <= 1e-16 * x) break;
  }
  return x;
}

/** P(0 < Z < x) over the density: x + x³/3 + x⁵/15 + …, Abramowitz and Stegun (1964) 26.2.11. */
function centralRatio(x: number): number {
  let term = x;
  let sum = x;
  for (let odd = 3; term > 1e-18 * sum; odd += 2) {
    term *= (x * x) / odd;
    sum += term;
  }
  return sum;
}

function tailQuantile(tail: number): number {
  let x = tail < 0.1 ? Math.sqrt(-2 * Math.log(tail)) : (0.5 - tail) * ROOT_TWO_PI;
  for (let step = 0; step < 12; step += 1) {
    const value = positiveTail(x);
    const change = (Math.log(value / tail) * value) / normalDensity(x);
    x += change;
    if (Math.abs(change) <= 1e-16 * x) break;
  }
  return x;
}
