import { type LognormalPrice } from '@/journal/forecast/profit-law';

/** A price around which a profit bends. */
export interface PriceBend {
  readonly price: number;
  /** The move of the log price over which it does, 0 for a corner. */
  readonly width: number;
}

/** Deviations beyond which nothing counts: P(|Z| > 9) is 2e-19. */
const REACH = 9;
const SPACING = 1 / 16;
const BEND_REACH = 6;
const BEND_STEPS = 24;
/** Gauss-Legendre rule of three points on [-1, 1]. */
const GAUSS = [
  { place: -Math.sqrt(0.6), weight: 5 / 18 },
  { place: 0, weight: 8 / 18 },
  { place: Math.sqrt(0.6), weight: 5 / 18 },
] as const;
const ROOT_TWO_PI = Math.sqrt(2 * Math.PI);

/** Standard deviates in even steps over everything that counts, with the bends' own steps where those are finer; increasing. */
export function normalNodes(
  bends: readonly PriceBend[],
  { spotPrice, logDrift, totalDeviation }: LognormalPrice,
): Float64Array {
  const nodes: number[] = [];
  for (let step = -REACH / SPACING; step <= REACH / SPACING; step += 1) nodes.push(step * SPACING);
  for (const { price, width } of bends) {
    const centre = (Math.log(price / spotPrice) - logDrift) / totalDeviation;
    const reach = (BEND_REACH * width) / totalDeviation;
    if (reach > BEND_STEPS * SPACING) continue;
    const steps = reach > 0 ? BEND_STEPS : 0;
    for (let step = -steps; step <= steps; step += 1) {
      const node = centre + (reach * step) / BEND_STEPS;
      if (Math.abs(node) < REACH) nodes.push(node);
    }
  }
  return Float64Array.from(nodes).sort();
}

/** The integral of a function times the normal density between two deviates that are close to each other. */
export function normalWeighted(valueAt: (standard: number) => number, low: number, high: number): number {
  let sum = 0;
  for (const { place, weight } of GAUSS) {
    const standard = gaussPlace(low, high, place);
    sum += weight * (high - low) * valueAt(standard) * Math.exp(-0.5 * standard * standard);
  }
  return sum / ROOT_TWO_PI;
}

/**
 * A lognormal price as a finite set of prices with weights, for the mean of any function of it.
 * @param bends where the function bends, so that none falls inside a cell.
 * @returns weights sum to 1.
 * @see Gauss-Legendre quadrature between {@link normalNodes}.
 */
export function weighedPrices(
  bends: readonly PriceBend[],
  price: LognormalPrice,
): { readonly price: number; readonly weight: number }[] {
  const nodes = normalNodes(bends, price);
  const weighed: { price: number; weight: number }[] = [];
  let whole = 0;
  for (let index = 0; index + 1 < nodes.length; index += 1) {
    const [low = 0, high = 0] = [nodes[index], nodes[index + 1]];
    if (!(low < high)) continue;
    for (const { place, weight: share } of GAUSS) {
      const standard = gaussPlace(low, high, place);
      const weight = share * (high - low) * Math.exp(-0.5 * standard * standard);
      whole += weight;
      weighed.push({ price: price.spotPrice * Math.exp(price.logDrift + price.totalDeviation * standard), weight });
    }
  }
  return weighed.map((each) => ({ ...each, weight: each.weight / whole }));
}

function gaussPlace(low: number, high: number, place: number): number {
  return (low + high) / 2 + (place * (high - low)) / 2;
}
