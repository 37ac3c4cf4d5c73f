import { normalCumulative, normalDensity, scaledUpperTail } from '@/journal/distributions/normal-distribution';
import { quadratureOf } from '@/journal/pricing/gauss-legendre';

/**
 * A put over one unit of time: its whole life. Rates are those over the life, the deviation is that of the log price over it, and
 * prices are in units of the strike.
 */
export interface UnitPut {
  /** Interest over the life, continuous; 0 or more, or above `yieldOverLife`. */
  readonly interest: number;
  readonly yieldOverLife: number;
  /** Above 0. */
  readonly deviation: number;
}

/** How finely a boundary is worked out, and a price from it. */
export interface BoundaryScheme {
  /** Chebyshev intervals over the square root of time left. */
  readonly intervals: number;
  /** Points of the quadrature in the fixed-point equation. */
  readonly quadrature: number;
  readonly iterations: number;
  /** Points of the quadrature in the price. */
  readonly priceQuadrature: number;
  /** Most that the last coefficients may be of the largest for the boundary to count as resolved. */
  readonly tailWithin: number;
}

/** The price of the underlying, in strikes, at and below which a put is exercised, by time left. */
export interface ExerciseBoundary {
  /** Just before expiry. */
  readonly atExpiry: number;
  /** Chebyshev coefficients of ln(boundary / atExpiry)² over the square root of time left. */
  readonly coefficients: Float64Array;
  /** With the whole life left. */
  readonly now: number;
  /** The iteration came to rest on a curve that the polynomial follows: else the boundary is no good. */
  readonly isSettled: boolean;
}

/**
 * Works out the early-exercise boundary of a put by collocation: at Chebyshev points of the square root of time left, the boundary
 * meets its integral equation by fixed-point iteration with a Newton step, started from the quadratic approximation.
 * @param put with interest above 0, or 0 and a negative yield: else a put is never exercised early, or its exercise region has two
 *   edges, and neither is for this function.
 * @see Andersen, Lake and Offengenden (2016), J. Computational Finance 20(1), 39-87, equation A and the algorithm of section 4;
 *   start: Barone-Adesi and Whaley (1987), J. Finance 42(2), 301-320.
 */
export function exerciseBoundary(put: UnitPut, scheme: BoundaryScheme): ExerciseBoundary {
  const { interest, yieldOverLife } = put;
  const atExpiry = yieldOverLife > 0 ? Math.min(1, interest / yieldOverLife) : 1;
  const lowest = perpetualBoundary(put);
  const { intervals } = scheme;
  const values = new Float64Array(intervals + 1);
  const boundaries = new Float64Array(intervals + 1);
  const coefficients = new Float64Array(intervals + 1);
  let guess = atExpiry;
  for (let index = 1; index <= intervals; index += 1) {
    const root = rootAt(index, intervals);
    // The boundary falls as time is left: each point starts from the one before it.
    guess = quadraticStart(put, root * root, {
      guess: Math.max(lowest, guess * Math.exp(-put.deviation / intervals)),
      lowest,
      atExpiry,
    });
    boundaries[index] = guess;
    values[index] = Math.log(guess / atExpiry) ** 2;
  }
  fitChebyshev(values, coefficients);
  let moved = 0;
  for (let iteration = 0; iteration < scheme.iterations; iteration += 1) {
    moved = 0;
    for (let index = 1; index <= intervals; index += 1) {
      const root = rootAt(index, intervals);
      const boundary = improvedBoundary(
        put,
        { root, boundary: boundaries[index] ?? 0, lowest, atExpiry, coefficients },
        scheme,
      );
      moved = Math.max(moved, Math.abs(Math.log(boundary / (boundaries[index] ?? 0))));
      boundaries[index] = boundary;
      values[index] = Math.log(boundary / atExpiry) ** 2;
    }
    fitChebyshev(values, coefficients);
  }
  const isSettled = isAtRest(put, moved) && tailOf(coefficients) <= scheme.tailWithin;
  return { atExpiry, coefficients, now: boundaries[intervals] ?? 0, isSettled };
}

/** Of the last iteration, in deviations over the life; and that times the rates, since on those the worth of early exercise rests. */
const LARGEST_MOVE = 0.05;
const LARGEST_MOVE_BY_RATES = 2e-4;

/** Also false for NaN. A move of exactly nothing is that of points that are stuck. */
function isAtRest({ interest, yieldOverLife, deviation }: UnitPut, moved: number): boolean {
  const move = moved / deviation;
  return (
    move > 0 && move <= LARGEST_MOVE && move * (Math.abs(interest) + Math.abs(yieldOverLife)) <= LARGEST_MOVE_BY_RATES
  );
}

/** The larger of the last two coefficients as a share of the largest of all. */
function tailOf(coefficients: Float64Array): number {
  let largest = 0;
  for (const coefficient of coefficients) largest = Math.max(largest, Math.abs(coefficient));
  const [beforeLast = 0, last = 0] = coefficients.subarray(-2);
  return Math.max(Math.abs(beforeLast), Math.abs(last)) / largest;
}

/** The boundary of a put that never expires: below that of any other. Merton (1973). */
function perpetualBoundary({ interest, yieldOverLife, deviation }: UnitPut): number {
  const variance = deviation * deviation;
  const ratio = (2 * (interest - yieldOverLife)) / variance;
  const root = Math.sqrt((ratio - 1) ** 2 + (8 * interest) / variance);
  // The negative power, without the difference of two near numbers.
  const power = ratio > 1 ? (1 - ratio - root) / 2 : (-4 * interest) / variance / (1 - ratio + root);
  return power / (power - 1);
}

/** ln of the boundary, in strikes, at a square root of time left from 0 to 1. */
export function logBoundaryAt({ atExpiry, coefficients }: ExerciseBoundary, root: number): number {
  return Math.log(atExpiry) - Math.sqrt(Math.max(0, chebyshevAt(coefficients, 2 * root - 1)));
}

/** Square root of time left at a Chebyshev point, from 0 at the first to 1 at the last. */
const rootAt = (index: number, intervals: number) => (1 - Math.cos((Math.PI * index) / intervals)) / 2;

interface Point {
  readonly root: number;
  readonly boundary: number;
  readonly lowest: number;
  readonly atExpiry: number;
  readonly coefficients: Float64Array;
}

const ROOT_TWO_PI = Math.sqrt(2 * Math.PI);

/** One step of the fixed-point iteration at one point, with the derivative of the leading terms. */
function improvedBoundary(
  { interest, yieldOverLife, deviation }: UnitPut,
  point: Point,
  scheme: BoundaryScheme,
): number {
  const { root, boundary, lowest, atExpiry, coefficients } = point;
  const time = root * root;
  const carry = interest - yieldOverLife;
  const spread = deviation * root;
  const { nodes, weights } = quadratureOf(scheme.quadrature);
  const logBoundary = Math.log(boundary / atExpiry);
  let [sumN, sumD] = [0, 0];
  for (let index = 0; index < nodes.length; index += 1) {
    // Since the earlier point time x half² has passed; the earlier point has the rest left.
    const half = (1 + (nodes[index] ?? 0)) / 2;
    const passed = time * half * half;
    const left = time - passed;
    const step = spread * half;
    const level = chebyshevAt(coefficients, 2 * Math.sqrt(left) - 1);
    const forward = logBoundary + Math.sqrt(level > 0 ? level : 0) + carry * passed;
    const upper = forward / step + step / 2;
    // The density at the lower argument is that at the upper one times the forward: one exponential serves both.
    const bell = Math.exp(-0.5 * upper * upper) * (weights[index] ?? 0);
    sumN += bell * Math.exp(interest * left + forward);
    const tail = upper > 0 ? (weights[index] ?? 0) - bell * scaledUpperTail(upper) : bell * scaledUpperTail(-upper);
    sumD += Math.exp(yieldOverLife * left) * (bell / ROOT_TWO_PI + step * tail);
  }
  const lower = (Math.log(boundary) + carry * time) / spread - spread / 2;
  const upper = lower + spread;
  const [lowerDensity, upperDensity] = [normalDensity(lower), normalDensity(upper)];
  const n = lowerDensity / spread + (interest * root * sumN) / (deviation * ROOT_TWO_PI);
  const d = upperDensity / spread + normalCumulative(upper) + (yieldOverLife * root * sumD) / deviation;
  const bend = -lower / (boundary * spread * spread);
  const growth = Math.exp(-carry * time);
  const wanted = (growth * n) / d;
  const slope = (growth * bend * (lowerDensity * d - upperDensity * n)) / (d * d);
  const stepped = boundary - (wanted - boundary) / (slope - 1);
  if (stepped >= lowest && stepped <= atExpiry) return stepped;
  return wanted > 0 && wanted < Infinity ? Math.max(lowest, Math.min(wanted, atExpiry)) : boundary;
}

const START_STEPS = 6;
const START_TOLERANCE = 1e-5;

/** The boundary by the quadratic approximation with so much time left, by Newton's method from a guess; from above 0 to atExpiry. */
function quadraticStart({ interest, yieldOverLife, deviation }: UnitPut, time: number, start: StartAt): number {
  const { guess, lowest, atExpiry } = start;
  const variance = deviation * deviation;
  const spread = deviation * Math.sqrt(time);
  const carry = interest - yieldOverLife;
  const ratio = (2 * carry) / variance;
  const discounted = -Math.expm1(-interest * time);
  const source = discounted > 0 ? (2 * interest) / (variance * discounted) : 2 / (variance * time);
  const power = (1 - ratio - Math.sqrt((ratio - 1) ** 2 + 4 * source)) / 2;
  const [strikeDiscount, spotDiscount] = [Math.exp(-interest * time), Math.exp(-yieldOverLife * time)];
  let price = guess;
  for (let step = 0; step < START_STEPS; step += 1) {
    const upper = (Math.log(price) + carry * time) / spread + spread / 2;
    const held = 1 - spotDiscount * normalCumulative(-upper);
    // What exercising brings beyond holding, by the approximation.
    const gap = 1 - strikeDiscount * normalCumulative(spread - upper) - price * held * (1 - 1 / power);
    const slope = (spotDiscount * normalDensity(upper)) / (power * spread) - held * (1 - 1 / power);
    const next = Math.min(atExpiry, Math.max(lowest, price / 4, price - gap / slope));
    const isThere = Math.abs(next - price) <= START_TOLERANCE * price;
    if (next > 0) price = next;
    if (isThere) break;
  }
  return price;
}

interface StartAt {
  /** Above 0. */
  readonly guess: number;
  readonly lowest: number;
  readonly atExpiry: number;
}

/** Coefficients of the polynomial through values at the Chebyshev extrema of -1 to 1, lowest point first. */
function fitChebyshev(values: Float64Array, coefficients: Float64Array): void {
  const last = values.length - 1;
  for (let degree = 0; degree <= last; degree += 1) {
    let sum = 0;
    for (let index = 0; index <= last; index += 1) {
      const share = index === 0 || index === last ? 0.5 : 1;
      // Point `index` lies at -cos(π index / last).
      sum += share * (values[index] ?? 0) * Math.cos((Math.PI * degree * (last - index)) / last);
    }
    coefficients[degree] = ((degree === 0 || degree === last ? 1 : 2) * sum) / last;
  }
}

/** Clenshaw's sum. */
function chebyshevAt(coefficients: Float64Array, z: number): number {
  let [before, value] = [0, 0];
  for (let degree = coefficients.length - 1; degree > 0; degree -= 1) {
    const next = (coefficients[degree] ?? 0) + 2 * z * value - before;
    before = value;
    value = next;
  }
  return (coefficients[0] ?? 0) + z * value - before;
}
