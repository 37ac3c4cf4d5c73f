import { normalCumulative, normalDensity } from '@/journal/distributions/normal-distribution';
import {
  type BoundaryScheme,
  type ExerciseBoundary,
  exerciseBoundary,
  logBoundaryAt,
  type UnitPut,
} from '@/journal/pricing/exercise-boundary';
import { quadratureOf } from '@/journal/pricing/gauss-legendre';

/** Of a put on a strike of 1, by the price of the underlying in strikes. */
export interface UnitPutValue {
  readonly price: number;
  /** First and second derivative by the price of the underlying. */
  readonly slope: number;
  readonly bend: number;
  readonly isExercised: boolean;
  /** At and below this price it is exercised now. */
  readonly boundary: number;
}

/** Of the step between two slopes that give the bend, in deviations. */
const BEND_STEP = 1e-3;

/**
 * Value of an American put with one exercise boundary: the European value and what the right to exercise early adds.
 * @param put see exerciseBoundary. @param price of the underlying in strikes, above 0.
 * @returns null where the scheme does not settle on a boundary.
 * @see Kim (1990), Review of Financial Studies 3(4), 547-572, for the premium as an integral over the boundary; numerically as in
 *   Andersen, Lake and Offengenden (2016), section 5.
 */
export function unitPutValue(put: UnitPut, price: number, scheme: BoundaryScheme): UnitPutValue | null {
  const boundary = exerciseBoundary(put, scheme);
  if (!boundary.isSettled) return null;
  const { now } = boundary;
  if (price <= now) return { price: 1 - price, slope: -1, bend: 0, isExercised: true, boundary: now };
  const { value, slope } = held(put, { price, boundary, points: scheme.priceQuadrature });
  const step = price * put.deviation * BEND_STEP;
  // Above the boundary only: the bend jumps to 0 there.
  const [low, high] = [Math.max(now, price - step), price + step];
  const slopeAt = (at: number) => held(put, { price: at, boundary, points: scheme.priceQuadrature }).slope;
  const bend = Math.max(0, (slopeAt(high) - slopeAt(low)) / (high - low));
  return { price: Math.max(value, 1 - price), slope, bend, isExercised: false, boundary: now };
}

/** The price alone, for speed; null as in unitPutValue. */
export function unitPutPrice(put: UnitPut, price: number, scheme: BoundaryScheme): number | null {
  const boundary = exerciseBoundary(put, scheme);
  if (!boundary.isSettled) return null;
  if (price <= boundary.now) return 1 - price;
  return Math.max(1 - price, held(put, { price, boundary, points: scheme.priceQuadrature }).value);
}

interface Held {
  readonly price: number;
  readonly boundary: ExerciseBoundary;
  readonly points: number;
}

/** Value and slope where it is not exercised now. */
function held({ interest, yieldOverLife, deviation }: UnitPut, { price, boundary, points }: Held) {
  const carry = interest - yieldOverLife;
  const logPrice = Math.log(price);
  const { nodes, weights } = quadratureOf(points);
  let [premium, premiumSlope] = [0, 0];
  for (let index = 0; index < nodes.length; index += 1) {
    // Over the square root of the time that passes until it is exercised.
    const root = (1 + (nodes[index] ?? 0)) / 2;
    const passed = root * root;
    const step = deviation * root;
    const forward = logPrice - logBoundaryAt(boundary, Math.sqrt(1 - passed)) + carry * passed;
    const upper = forward / step + step / 2;
    const share = (weights[index] ?? 0) * root;
    const interestEarned = interest * Math.exp(-interest * passed);
    const yieldLost = yieldOverLife * Math.exp(-yieldOverLife * passed);
    const spotTail = normalCumulative(-upper);
    premium += share * (interestEarned * normalCumulative(step - upper) - yieldLost * price * spotTail);
    premiumSlope +=
      share *
      ((yieldLost * normalDensity(upper) - (interestEarned * normalDensity(upper - step)) / price) / step -
        yieldLost * spotTail);
  }
  const upper = (logPrice + carry) / deviation + deviation / 2;
  const [strikeDiscount, spotDiscount] = [Math.exp(-interest), Math.exp(-yieldOverLife)];
  const spotTail = normalCumulative(-upper);
  return {
    value: strikeDiscount * normalCumulative(deviation - upper) - price * spotDiscount * spotTail + premium,
    slope: Math.max(-1, Math.min(0, premiumSlope - spotDiscount * spotTail)),
  };
}
