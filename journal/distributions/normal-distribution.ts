import { DomainError } from '@/journal/errors/domain-error';

const ROOT_TWO_PI = 2.5066282746310002; // sqrt(2π)
const CENTRE = 0.67448975;
const MIDDLE = Math.sqrt(32);
/** Deviations at which density and tail are 0 in doubles. */
const VANISHED = 39;
const CUT_SCALE = 2 ** 20;
const CUT_UNIT = 2 ** -20;
const ONE_SIXTH = 1 / 6;

/**
 * Density of the standard normal distribution.
 * @param x any number.
 * @returns exp(-x²/2)/sqrt(2π), full relative accuracy while it is a normal double (|x| up to 37.6).
 */
export function normalDensity(x: number): number {
  return expMinusHalfSquare(x) / ROOT_TWO_PI;
}

/**
 * exp(-x²/2) without losing digits to the rounding of x²: x is cut after 20 binary places, so that the square of the cut is
 * exact, and what is left of the exponent is so small that four terms of its series have all digits.
 * @see Cody (1969) and Algorithm 715, which cut after four places and pay for a second exponential.
 */
export function expMinusHalfSquare(x: number): number {
  const square = x * x;
  if (square < 2) return Math.exp(-0.5 * square); // rounding it costs no more than the exponential's own
  if (square > VANISHED * VANISHED) return 0;
  const cut = Math.trunc(x * CUT_SCALE) * CUT_UNIT;
  const rest = 0.5 * (x - cut) * (x + cut); // 0 to 4e-5
  return Math.exp(-0.5 * cut * cut) * (1 - rest * (1 - rest * (0.5 - rest * ONE_SIXTH)));
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
  return x > VANISHED ? 0 : expMinusHalfSquare(x) * scaledTail(x);
}

// Rational minimax approximations of Cody (1993) for |x| <= 0.674, to sqrt(32), and beyond. Their coefficients stand in place:
// read from arrays they take twice the time.

function centralRatio(x: number): number {
  const y = x * x;
  const numerator =
    (((0.065682337918207449113 * y + 2.2352520354606839287) * y + 161.02823106855587881) * y + 1067.6894854603709582) *
      y +
    18154.981253343561249;
  const denominator =
    (((y + 47.20258190468824187) * y + 976.09855173777669322) * y + 10260.932208618978205) * y + 45507.789335026729956;
  return numerator / denominator;
}

/** P(Z > x)·exp(x²/2) for x above {@link CENTRE}. */
function scaledTail(x: number): number {
  if (x <= MIDDLE) {
    const numerator =
      (((((((1.0765576773720192317e-8 * x + 0.39894151208813466764) * x + 8.8831497943883759412) * x +
        93.506656132177855979) *
        x +
        597.27027639480026226) *
        x +
        2494.5375852903726711) *
        x +
        6848.1904505362823326) *
        x +
        11602.651437647350124) *
        x +
      9842.7148383839780218;
    const denominator =
      (((((((x + 22.266688044328115691) * x + 235.38790178262499861) * x + 1519.377599407554805) * x +
        6485.558298266760755) *
        x +
        18615.571640885098091) *
        x +
        34900.952721145977266) *
        x +
        38912.003286093271411) *
        x +
      19685.429676859990727;
    return numerator / denominator;
  }
  const y = 1 / (x * x);
  const numerator =
    (((((0.02307344176494017303 * y + 0.21589853405795699) * y + 0.1274011611602473639) * y + 0.022235277870649807) *
      y +
      0.001421619193227893466) *
      y +
      2.9112874951168792e-5) *
    y;
  const denominator =
    ((((y + 1.28426009614491121) * y + 0.468238212480865118) * y + 0.0659881378689285515) * y +
      0.00378239633202758244) *
      y +
    7.29751555083966205e-5;
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
 * Upper tail where its exponential is known already, from the density or from the other term of a price.
 * @param x any number; `bell` exp(-x²/2).
 * @see as {@link normalUpperTail}.
 */
export function upperTailWithBell(x: number, bell: number): number {
  const distance = x < 0 ? -x : x;
  const tail = distance <= CENTRE ? 0.5 - distance * centralRatio(distance) : bell * scaledTail(distance);
  return x < 0 ? 1 - tail : tail;
}

/**
 * Quantile of the standard normal distribution.
 * @param probability strictly between 0 and 1.
 * @returns x with P(Z <= x) = probability, accuracy about 1e-16 absolute near the centre and 4e-16 relative in the tails.
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
