import { bracketedRoot } from '@/journal/forecast/bracketed-root';
import { normalNodes, normalWeighted, type PriceBend } from '@/journal/forecast/normal-quadrature';
import { probabilityBetween, tailsAt } from '@/journal/forecast/normal-tails';
import { monotonePieces, type MonotonePiece } from '@/journal/forecast/monotone-pieces';
import { checkLognormalPrice, joinRanges, type LognormalPrice, type ProfitLaw } from '@/journal/forecast/profit-law';

/** A profit that bends with the price of the underlying, as it does before expiry. */
export interface ProfitCurve {
  /** Continuous, finite for every price above 0. */
  readonly profitAt: (spotPrice: number) => number;
  /** Where it bends sharply. */
  readonly bends: readonly PriceBend[];
  /** Amounts closer than this cannot be told apart (rounding of the values); above 0. */
  readonly resolution: number;
  /** Its limits toward a price of 0 and without end; infinite where it has none. */
  readonly limits: { readonly atNothing: number; readonly atInfinity: number };
  /** The mean under the price's law where it is known in closed form; integrated when left out. */
  readonly mean?: number;
}

const ROOT_TOLERANCE = 1e-14;

/**
 * Distribution of a profit that is a curved function of a lognormal price.
 * The curve is cut at its turning points; between them every amount has one price, found on the curve itself, so that
 * probabilities are exact ones of lognormal intervals. Quantiles invert them; means of parts are integrated by Gauss and
 * Legendre between nodes that crowd where the curve bends.
 * @param curve see {@link ProfitCurve}; `price` totalDeviation above 0.
 * @returns probabilities to about 1e-12, quantiles to the rounding of the profit, expected shortfall to about 1e-8 of it; no
 *   lumps but that of a profit that is the same everywhere. A pair of turns that both fall between two nodes is not seen.
 * @throws {DomainError} `price-law-invalid`.
 * @see as profitLaw; turning points: golden section, Kiefer (1953), Proc. AMS 4.
 */
export function curvedProfitLaw(curve: ProfitCurve, price: LognormalPrice): ProfitLaw {
  checkLognormalPrice(price);
  const { resolution, limits } = curve;
  const priceOf = (standard: number) => price.spotPrice * Math.exp(price.logDrift + price.totalDeviation * standard);
  const profitOf = (standard: number) => curve.profitAt(priceOf(standard));
  const { standards, profits, pieces } = monotonePieces(profitOf, normalNodes(curve.bends, price), resolution);
  const sorted = Float64Array.from(profits).sort();
  const [lowest = 0, highest = 0] = [sorted[0], sorted[sorted.length - 1]];

  /** The standard deviates at which a piece is below an amount; the outermost reach without end. */
  const spanBelow = (piece: MonotonePiece, amount: number): readonly [number, number] | null => {
    const { first, last } = piece;
    const [start = 0, end = 0] = [profits[first], profits[last]];
    const from = first === 0 ? -Infinity : (standards[first] ?? 0);
    const to = last === standards.length - 1 ? Infinity : (standards[last] ?? 0);
    if (Math.min(start, end) >= amount) return null;
    if (Math.max(start, end) < amount) return [from, to];
    const edge = crossing(profitOf, { standards, profits, piece, amount });
    return start < end ? [from, edge] : [edge, to];
  };
  const cumulative = (amount: number) => {
    let sum = 0;
    for (const piece of pieces) {
      const span = spanBelow(piece, amount);
      if (span !== null) sum += probabilityBetween(tailsAt(span[0]), tailsAt(span[1]));
    }
    return Math.min(1, sum);
  };
  // Searches for different probabilities pass the same nodes.
  const seen = new Float64Array(sorted.length).fill(-1);
  const cumulativeAtNode = (index: number) => {
    const known = seen[index] ?? -1;
    if (known >= 0) return known;
    return (seen[index] = cumulative((sorted[index] ?? 0) + resolution));
  };
  const quantile = (probability: number): number => {
    let low = -1;
    let high = sorted.length - 1;
    while (high - low > 1) {
      const middle = (low + high) >> 1;
      if (cumulativeAtNode(middle) >= probability) high = middle;
      else low = middle;
    }
    const upper = sorted[high] ?? highest;
    if (low < 0) return upper;
    const lower = sorted[low] ?? lowest;
    const error = (amount: number) => cumulative(amount + resolution) - probability;
    const lowValue = cumulativeAtNode(low) - probability;
    const highValue = cumulativeAtNode(high) - probability;
    if (!(upper - lower > resolution) || !(highValue > 0)) return upper;
    return bracketedRoot(error, { low: lower, high: upper, lowValue, highValue, tolerance: resolution });
  };
  const partialMean = (amount: number) => {
    let sum = 0;
    for (const piece of pieces) {
      const span = spanBelow(piece, amount);
      if (span !== null) sum += weightedProfit(profitOf, standards, piece, span);
    }
    return sum;
  };
  const below = (amount: number) => cumulative(amount - resolution);
  const isFlat = highest - lowest <= resolution;
  return {
    mean: curve.mean ?? partialMean(Infinity),
    below,
    atOrBelow: (amount) => cumulative(amount + resolution),
    quantile,
    expectedShortfall: (probability) => {
      const edge = quantile(probability);
      return (partialMean(edge) + edge * (probability - cumulative(edge))) / probability;
    },
    lumps: isFlat ? [{ profit: lowest, probability: 1 }] : [],
    least: Math.min(lowest, limits.atNothing, limits.atInfinity),
    most: Math.max(highest, limits.atNothing, limits.atInfinity),
    rangesAbove: (amount) => {
      const spans = pieces.flatMap((piece) =>
        spanAbove(piece, { standards, below: spanBelow(piece, amount + resolution) }),
      );
      return joinRanges(spans).map(({ from, to }) => ({
        from: from === -Infinity ? 0 : priceOf(from),
        to: priceOf(to),
        probability: probabilityBetween(tailsAt(from), tailsAt(to)),
      }));
    },
  };
}

/** What {@link ProfitCurve} leaves of a piece when the part below an amount is taken away. */
function spanAbove(
  { first, last }: MonotonePiece,
  { standards, below }: { readonly standards: Float64Array; readonly below: readonly [number, number] | null },
): { from: number; to: number }[] {
  const from = first === 0 ? -Infinity : (standards[first] ?? 0);
  const to = last === standards.length - 1 ? Infinity : (standards[last] ?? 0);
  if (below === null) return [{ from, to }];
  if (below[0] > from) return [{ from, to: below[0] }];
  return below[1] < to ? [{ from: below[1], to }] : [];
}

/** Where a monotone piece takes an amount that lies between its ends. */
function crossing(
  profitOf: (standard: number) => number,
  question: {
    readonly standards: Float64Array;
    readonly profits: Float64Array;
    readonly piece: MonotonePiece;
    readonly amount: number;
  },
): number {
  const { standards, profits, piece, amount } = question;
  let { first, last } = piece;
  const isRising = (profits[first] ?? 0) < (profits[last] ?? 0);
  while (last - first > 1) {
    const middle = (first + last) >> 1;
    const isBelow = (profits[middle] ?? 0) < amount;
    if (isBelow === isRising) first = middle;
    else last = middle;
  }
  return bracketedRoot((standard) => profitOf(standard) - amount, {
    low: standards[first] ?? 0,
    high: standards[last] ?? 0,
    lowValue: (profits[first] ?? 0) - amount,
    highValue: (profits[last] ?? 0) - amount,
    tolerance: ROOT_TOLERANCE,
  });
}

/** The integral of profit times normal density over a part of a piece. */
function weightedProfit(
  profitOf: (standard: number) => number,
  standards: Float64Array,
  { first, last }: MonotonePiece,
  [from, to]: readonly [number, number],
): number {
  let sum = 0;
  for (let index = first; index < last; index += 1) {
    const low = Math.max(from, standards[index] ?? 0);
    const high = Math.min(to, standards[index + 1] ?? 0);
    if (low < high) sum += normalWeighted(profitOf, low, high);
  }
  return sum;
}
