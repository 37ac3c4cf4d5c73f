import { type PayoffSegment } from '@/journal/contracts/expiry-payoff';
import { DomainError } from '@/journal/errors/domain-error';
import { type NormalTails, probabilityBetween, tailsAt } from '@/journal/forecast/normal-tails';

/** A lognormal price: ln S has mean ln(spot) + logDrift and standard deviation totalDeviation. */
export interface LognormalPrice {
  readonly spotPrice: number;
  readonly logDrift: number;
  /** Above 0. */
  readonly totalDeviation: number;
}

/** The distribution of a profit. */
export interface ProfitLaw {
  readonly mean: number;
  /** P(profit < amount). */
  readonly below: (amount: number) => number;
  /** P(profit <= amount). */
  readonly atOrBelow: (amount: number) => number;
  /** Smallest amount that is not undercut with more than this probability. */
  readonly quantile: (probability: number) => number;
  /** Mean of the worst part of this probability. */
  readonly expectedShortfall: (probability: number) => number;
  /** Amounts with a probability of their own, lowest first. */
  readonly lumps: readonly { readonly profit: number; readonly probability: number }[];
  /** Least and greatest profit over all prices, reached or approached; infinite without limit. */
  readonly least: number;
  readonly most: number;
  /** Where the profit is above an amount, lowest price first; their probabilities sum to P(profit > amount). */
  readonly rangesAbove: (amount: number) => readonly PriceRange[];
}

/** Prices of the underlying between two levels, 0 and Infinity included. */
export interface PriceRange {
  readonly from: number;
  readonly to: number;
  readonly probability: number;
}

const NEGLIGIBLE = 1e-15;
/** Beyond e^600 the squares of prices leave the doubles. */
const FARTHEST_LOG_PRICE = 600;
const DEVIATIONS_IN_REACH = 10;

/** @throws {DomainError} `price-law-invalid` where the spot is not above 0, the deviation not above 0, or prices leave the doubles. */
export function checkLognormalPrice({ spotPrice, logDrift, totalDeviation }: LognormalPrice): void {
  const reach =
    Math.abs(Math.log(spotPrice)) + Math.abs(logDrift) + totalDeviation * (DEVIATIONS_IN_REACH + totalDeviation);
  if (!(spotPrice > 0 && totalDeviation > 0 && reach < FARTHEST_LOG_PRICE))
    throw new DomainError('price-law-invalid', { spotPrice, logDrift, totalDeviation });
}

/**
 * Distribution of a profit that is a piecewise linear function of a lognormal price.
 * @param segments cover (0, ∞) without gaps, lowest first.
 * @returns every figure in closed form from the normal distribution, but quantiles, which are searched to 1e-10 of the range.
 * @throws {DomainError} `price-law-invalid`.
 * @see partial expectations of the lognormal distribution as in Black and Scholes (1973); expected shortfall: Acerbi and
 *   Tasche (2002), J. Banking and Finance 26.
 */
export function profitLaw(segments: readonly PayoffSegment[], price: LognormalPrice): ProfitLaw {
  checkLognormalPrice(price);
  const weighed = weigh(segments, price);
  const cumulative = (amount: number, includesAmount: boolean) => {
    let sum = 0;
    for (const segment of weighed) sum += shareBelow(segment, amount, price, includesAmount);
    return Math.min(1, sum);
  };
  const atOrBelow = (amount: number) => cumulative(amount, true);
  const below = (amount: number) => cumulative(amount, false);
  const quantile = (probability: number) => searchAmount(weighed, probability, atOrBelow);
  return {
    mean: weighed.reduce((sum, segment) => sum + segment.partialMean, 0),
    below,
    atOrBelow,
    quantile,
    expectedShortfall: (probability) => {
      const edge = quantile(probability);
      const worse = weighed.reduce((sum, segment) => sum + partialMeanBelow(segment, edge, price), 0);
      return (worse + edge * (probability - below(edge))) / probability;
    },
    lumps: lumpsOf(weighed),
    least: Math.min(...segments.map((segment) => Math.min(...endsOf(segment)))),
    most: Math.max(...segments.map((segment) => Math.max(...endsOf(segment)))),
    rangesAbove: (amount) =>
      joinRanges(segments.flatMap((segment) => rangeAbove(segment, amount))).map((range) => ({
        ...range,
        probability: probabilityBetween(boundaryAt(range.from, price).count, boundaryAt(range.to, price).count),
      })),
  };
}

/** Profit at both ends of a segment. */
function endsOf({ from, to, intercept, slope }: PayoffSegment): readonly [number, number] {
  return [intercept + slope * from, slope === 0 ? intercept : intercept + slope * to];
}

function rangeAbove(segment: PayoffSegment, amount: number): { from: number; to: number }[] {
  const [start, end] = endsOf(segment);
  if (!(Math.max(start, end) > amount)) return [];
  const { from, to } = segment;
  if (Math.min(start, end) > amount || segment.slope === 0) return [{ from, to }];
  const [, low] = segment.slope > 0 ? rangeBelow(segment, amount) : [0, from];
  const [high] = segment.slope > 0 ? [to] : rangeBelow(segment, amount);
  return low < high ? [{ from: low, to: high }] : [];
}

/** Ranges that follow each other without a gap made one. */
export function joinRanges(
  ranges: readonly { readonly from: number; readonly to: number }[],
): { readonly from: number; readonly to: number }[] {
  const joined: { from: number; to: number }[] = [];
  for (const { from, to } of ranges) {
    const last = joined[joined.length - 1];
    if (last !== undefined && from <= last.to) last.to = to;
    else joined.push({ from, to });
  }
  return joined;
}

interface WeighedSegment extends PayoffSegment {
  readonly least: number;
  readonly most: number;
  readonly probability: number;
  /** E[profit; price in this segment]. */
  readonly partialMean: number;
}

/** The tails at a price: of the price itself, and of the price as seen under its own expectation. */
interface Boundary {
  readonly count: NormalTails;
  readonly value: NormalTails;
}

function boundaryAt(level: number, { spotPrice, logDrift, totalDeviation }: LognormalPrice): Boundary {
  const standard = level <= 0 ? -Infinity : (Math.log(level / spotPrice) - logDrift) / totalDeviation;
  return { count: tailsAt(standard), value: tailsAt(standard - totalDeviation) };
}

function forwardOf({ spotPrice, logDrift, totalDeviation }: LognormalPrice): number {
  return spotPrice * Math.exp(logDrift + totalDeviation ** 2 / 2);
}

function weigh(segments: readonly PayoffSegment[], price: LognormalPrice): WeighedSegment[] {
  const forward = forwardOf(price);
  const weighed: WeighedSegment[] = [];
  let low = boundaryAt(0, price);
  for (const segment of segments) {
    const { from, to, intercept, slope } = segment;
    const high = boundaryAt(to, price);
    const probability = probabilityBetween(low.count, high.count);
    const [start, end] = endsOf(segment);
    if (probability > NEGLIGIBLE) {
      weighed.push({
        from,
        to,
        intercept,
        slope,
        least: Math.min(start, end),
        most: Math.max(start, end),
        probability,
        partialMean: intercept * probability + slope * forward * probabilityBetween(low.value, high.value),
      });
    }
    low = high;
  }
  return weighed;
}

/** The part of a segment on which the profit is below an amount, as a range of prices. */
function rangeBelow({ from, to, intercept, slope }: PayoffSegment, amount: number): readonly [number, number] {
  const edge = Math.min(Math.max((amount - intercept) / slope, from), to);
  return slope > 0 ? [from, edge] : [edge, to];
}

function shareBelow(segment: WeighedSegment, amount: number, price: LognormalPrice, includesAmount: boolean): number {
  if (segment.most < amount || (includesAmount && segment.most === amount)) return segment.probability;
  if (segment.least >= amount || segment.slope === 0) return 0;
  const [from, to] = rangeBelow(segment, amount);
  return probabilityBetween(boundaryAt(from, price).count, boundaryAt(to, price).count);
}

function partialMeanBelow(segment: WeighedSegment, amount: number, price: LognormalPrice): number {
  if (segment.most < amount) return segment.partialMean;
  if (segment.least >= amount || segment.slope === 0) return 0;
  const [from, to] = rangeBelow(segment, amount);
  const [low, high] = [boundaryAt(from, price), boundaryAt(to, price)];
  return (
    segment.intercept * probabilityBetween(low.count, high.count) +
    segment.slope * forwardOf(price) * probabilityBetween(low.value, high.value)
  );
}

function searchAmount(
  weighed: readonly WeighedSegment[],
  probability: number,
  atOrBelow: (amount: number) => number,
): number {
  let low = Math.min(...weighed.map((segment) => segment.least));
  let high = Math.max(...weighed.map((segment) => segment.most));
  if (low === -Infinity) low = widen(-1, (amount) => atOrBelow(amount) > probability / 2);
  if (high === Infinity) high = widen(1, (amount) => atOrBelow(amount) < probability);
  if (atOrBelow(low) >= probability) return low;
  const tolerance = 1e-10 * Math.max(1, high - low);
  while (high - low > tolerance) {
    const middle = (low + high) / 2;
    if (atOrBelow(middle) >= probability) high = middle;
    else low = middle;
  }
  // A point mass is hit exactly: the search ends within rounding of it.
  const corner = weighed
    .flatMap((segment) => [segment.least, segment.most])
    .find((amount) => Math.abs(amount - high) <= 2 * tolerance);
  return corner ?? high;
}

function widen(start: number, isTooNarrow: (amount: number) => boolean): number {
  let amount = start;
  while (isTooNarrow(amount) && Math.abs(amount) < 1e18) amount *= 4;
  return amount;
}

function lumpsOf(weighed: readonly WeighedSegment[]): { profit: number; probability: number }[] {
  const byProfit = new Map<number, number>();
  for (const { slope, intercept, probability } of weighed) {
    if (slope === 0) byProfit.set(intercept, (byProfit.get(intercept) ?? 0) + probability);
  }
  return [...byProfit]
    .map(([profit, probability]) => ({ profit, probability }))
    .sort((left, right) => left.profit - right.profit);
}
