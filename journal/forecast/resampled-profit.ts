import { DomainError } from '@/journal/errors/domain-error';

/** A figure of a finite sample of paths. */
export interface SampledFigure {
  readonly value: number;
  /** Standard error by the draws alone; what the source returns do not know is not in it. */
  readonly error: number;
}

/** The distribution of a profit over resampled paths. */
export interface ResampledProfit {
  readonly paths: number;
  readonly mean: SampledFigure;
  /** P(profit > 0). */
  readonly oddsOfProfit: SampledFigure;
  /** Mean of the worst 5 %. */
  readonly expectedShortfall: SampledFigure;
  /** 5, 25, 50, 75, 95, with the 95 % interval of each by the draws. */
  readonly percentiles: readonly {
    readonly percent: number;
    readonly profit: number;
    readonly low: number;
    readonly high: number;
  }[];
}

const FEWEST_PATHS = 100;
const SHORTFALL = 0.05;
const TWO_SIDED_95 = 1.959963984540054;

/**
 * Profit over resampled total returns of the underlying: empirical odds beside the lognormal ones.
 * @param question.totalLogReturns log price changes over the whole hold, one a path, at least 100, finite; `profitAt` currency at a
 *   price of the underlying; `spotPrice` above 0.
 * @returns figures with Monte Carlo errors. A share of 0 or 1 has the error of one path in all, so that none reads as certain.
 * @throws {DomainError} `resampled-paths-too-few`; `resampled-return-invalid` with the index; `spot-not-positive`.
 * @see Efron (1979); standard errors of a mean and a share; quantile intervals by order statistics; expected shortfall: Manistre
 *   and Hancock (2005), North American Actuarial Journal 9.
 */
export function resampledProfit(question: {
  readonly profitAt: (spotPrice: number) => number;
  readonly spotPrice: number;
  readonly totalLogReturns: ArrayLike<number>;
}): ResampledProfit {
  const profits = profitsOf(question);
  const paths = profits.length;
  const mean = meanOf(profits);
  const oddsOfProfit = profits.reduce((count, profit) => (profit > 0 ? count + 1 : count), 0) / paths;
  const share = Math.min(1 - 1 / paths, Math.max(1 / paths, oddsOfProfit));
  return {
    paths,
    mean: { value: mean, error: Math.sqrt(varianceOf(profits, mean) / paths) },
    oddsOfProfit: { value: oddsOfProfit, error: Math.sqrt((share * (1 - share)) / paths) },
    expectedShortfall: shortfallOf(profits),
    percentiles: [5, 25, 50, 75, 95].map((percent) => {
      const probability = percent / 100;
      const margin = TWO_SIDED_95 * Math.sqrt(paths * probability * (1 - probability));
      const at = (rank: number) => profits[Math.min(paths - 1, Math.max(0, rank))] ?? 0;
      const rank = probability * paths;
      return {
        percent,
        profit: at(Math.ceil(rank) - 1),
        low: at(Math.floor(rank - margin) - 1),
        high: at(Math.ceil(rank + margin)),
      };
    }),
  };
}

/** Lowest first. */
function profitsOf({ profitAt, spotPrice, totalLogReturns }: Parameters<typeof resampledProfit>[0]): Float64Array {
  const { length } = totalLogReturns;
  if (!(length >= FEWEST_PATHS))
    throw new DomainError('resampled-paths-too-few', { paths: length, required: FEWEST_PATHS });
  if (!(spotPrice > 0 && spotPrice < Infinity)) throw new DomainError('spot-not-positive', { spotPrice });
  const profits = new Float64Array(length);
  for (let index = 0; index < length; index += 1) {
    const logReturn = totalLogReturns[index] ?? NaN;
    const profit = profitAt(spotPrice * Math.exp(logReturn));
    if (!Number.isFinite(logReturn) || !Number.isFinite(profit))
      throw new DomainError('resampled-return-invalid', { index, logReturn });
    profits[index] = profit;
  }
  return profits.sort();
}

function shortfallOf(profits: Float64Array): SampledFigure {
  const worst = profits.subarray(0, Math.max(1, Math.round(SHORTFALL * profits.length)));
  const value = meanOf(worst);
  const edge = worst[worst.length - 1] ?? value;
  const spread = varianceOf(worst, value) + (1 - SHORTFALL) * (edge - value) ** 2;
  return { value, error: Math.sqrt(spread / worst.length) };
}

function meanOf(values: Float64Array): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

function varianceOf(values: Float64Array, mean: number): number {
  const sum = values.reduce((total, value) => total + (value - mean) ** 2, 0);
  return sum / Math.max(1, values.length - 1);
}
