import { DomainError } from '@/journal/errors/domain-error';

const ROOT_TWO_PI = 2.5066282746310002; // sqrt(2π)
const CENTRE = 0.67448975;
const MIDDLE = Math.sqrt(32);

/** Rational minimax coefficients of Cody (1993), intervals |x| <= 0.674, to sqrt(32), and beyond. */
const a = [
  2.2352520354606839287, 161.02823106855587881, 1067.6894854603709582, 18154.981253343561249, 0.065682337918207449113,
] as const;
const b = [47.20258190468824187, 976.09855173777669322, 10260.932208618978205, 45507.789335026729956] as const;
const c = [
  0.39894151208813466764, 8.8831497943883759412, 93.506656132177855979, 597.27027639480026226, 2494.5375852903726711,
  6848.1904505362823326, 11602.651437647350124, 9842.7148383839780218, 1.0765576773720192317e-8,
] as const;
const d = [
  22.266688044328115691, 235.38790178262499861, 1519.377599407554805, 6485.558298266760755, 18615.571640885098091,
  34900.952721145977266, 38912.003286093271411, 19685.429676859990727,
] as const;
const p = [
  0.21589853405795699, 0.1274011611602473639, 0.022235277870649807, 0.001421619193227893466, 2.9112874951168792e-5,
  0.02307344176494017303,
] as const;
const q = [
  1.28426009614491121, 0.468238212480865118, 0.0659881378689285515, 0.00378239633202758244, 7.29751555083966205e-5,
] as const;

/**
 * Density of the standard normal distribution.
 * @param x any number.
 * @returns exp(-x²/2)/sqrt(2π), full relative accuracy while it is a normal double (|x| up to 37.6).
 */
export function normalDensity(x: number): number {
  return expMinusHalfSquare(Math.abs(x)) / ROOT_TWO_PI;
}

/**
 * exp(-x²/2) without losing digits to the rounding of x²: the square of x cut to sixteenths is exact, the rest is small
 * (Cody 1969, as in Algorithm 715).
 */
export function expMinusHalfSquare(x: number): number {
  const cut = Math.trunc(x * 16) / 16;
  const rest = (x - cut) * (x + cut);
  return Math.exp(-0.5 * cut * cut) * Math.exp(-0.5 * rest);
}

/**
 * Upper tail of the standard normal distribution, P(Z > x).
 * @param x any number; NaN gives NaN.
 * @returns probability in [0, 1], relative accuracy about 1e-15 down to 1e-300 (x to 37).
 * @see Cody (1969), Rational Chebyshev approximations for the error function, Math. Comp. 23; coefficients of ANORM in
 *   Cody (1993), Algorithm 715, ACM TOMS 19 (from memory; checked against 60-digit values in the tests).
 */
export function normalUpperTail(x: number): number {
  return x < 0 ? 1 - positiveTail(-x) : positiveTail(x);
}

/** Distribution function of the standard normal, P(Z <= x); accuracy and source as {@link normalUpperTail}. */
export function normalCumulative(x: number): number {
  return x > 0 ? 1 - positiveTail(x) : positiveTail(-x);
}

function positiveTail(x: number): number {
  if (x <= CENTRE) return 0.5 - x * centralRatio(x);
  return x > 40 ? 0 : expMinusHalfSquare(x) * scaledTail(x);
}

function centralRatio(x: number): number {
  const y = x * x;
  const numerator = (((a[4] * y + a[0]) * y + a[1]) * y + a[2]) * y + a[3];
  const denominator = (((y + b[0]) * y + b[1]) * y + b[2]) * y + b[3];
  return numerator / denominator;
}

/** P(Z > x)·exp(x²/2) for x above {@link CENTRE}. */
function scaledTail(x: number): number {
  if (x <= MIDDLE) {
    const numerator =
      (((((((c[8] * x + c[0]) * x + c[1]) * x + c[2]) * x + c[3]) * x + c[4]) * x + c[5]) * x + c[6]) * x + c[7];
    const denominator =
      (((((((x + d[0]) * x + d[1]) * x + d[2]) * x + d[3]) * x + d[4]) * x + d[5]) * x + d[6]) * x + d[7];
    return numerator / denominator;
  }
  const y = 1 / (x * x);
  const numerator = (((((p[5] * y + p[0]) * y + p[1]) * y + p[2]) * y + p[3]) * y + p[4]) * y;
  const denominator = ((((y + q[0]) * y + q[1]) * y + q[2]) * y + q[3]) * y + q[4];
  return (1 / ROOT_TWO_PI - numerator / denominator) / x;
}

/**
 * Upper tail without its exponential factor, P(Z > x)·exp(x²/2): what is left to multiply by when the exponential is known
 * from elsewhere (it neither over- nor underflows).
 * @param x 0 or more.
 * @see as {@link normalUpperTail}.
 */
export function scaledUpperTail(x: number): number {
  return x <= CENTRE ? (0.5 - x * centralRatio(x)) * Math.exp((x * x) / 2) : scaledTail(x);
}

/**
 * Quantile of the standard normal distribution.
 * @param probability strictly between 0 and 1.
 * @returns x with P(Z <= x) = probability, relative accuracy about 1e-15.
 * @throws {DomainError} `probability-out-of-range`.
 * @see Newton's method on the logarithm of the tail, which is concave, so that it converges from the outside.
 */
export function normalQuantile(probability: number): number {
  if (!(probability > 0 && probability < 1)) throw new DomainError('probability-out-of-range', { probability });
  if (probability === 0.5) return 0;
  const tail = Math.min(probability, 1 - probability);
  let x = tail < 0.1 ? -Math.sqrt(-2 * Math.log(tail)) : (tail - 0.5) * ROOT_TWO_PI;
  for (let step = 0; step < 12; step += 1) {
    // On the log of the tail Newton converges from any start in the tail; near the centre it is as good.
    const value = positiveTail(-x);
    const change = (Math.log(value / tail) * value) / normalDensity(x);
    x -= change;
    if (x > 0) x = 0;
    if (Math.abs(change) <= 1e-16 * Math.abs(x)) break;
  }
  return probability < 0.5 ? x : -x;
}
