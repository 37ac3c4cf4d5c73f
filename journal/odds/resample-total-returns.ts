import { type BlockMethod, blockDraws, defaultBlockLength } from '@/journal/odds/block-draws';
import { checkReturns, filterReturns } from '@/journal/odds/filter-returns';
import { type PathCount, type ResampledPaths, resamplePaths } from '@/journal/odds/resample-paths';
import { resampleStandardised } from '@/journal/odds/resample-standardised';
import { seededRandom } from '@/journal/random/seeded-random';
import { exactSum } from '@/journal/returns/exact-sum';

/** `filtered` is filtered historical simulation; the others draw the returns as they were, in blocks. */
export type ResampleMethod = BlockMethod | 'filtered';

export interface ResampleQuestion extends PathCount {
  /** Session log returns, oldest first, at least 2, each within ±100. */
  readonly logReturns: readonly number[];
  /** Whole number; the same seed gives the same paths. */
  readonly seed: number | bigint;
  /** `stationary` by default. */
  readonly method?: ResampleMethod;
  /** Of `moving` and `stationary`; the cube root of the number of returns by default, 1 for independent draws. */
  readonly blockLength?: number;
  /** Whether the source's mean, that of the standardised returns when filtered, is taken out; true by default. */
  readonly removeMean?: boolean;
  /** Decay of `filtered`; 0.94 by default. */
  readonly lambda?: number;
  /**
   * Added to every session; 0 by default, so that the mean of the log price stays. Minus half the session's variance leaves the
   * expected price where it is, as the zero-return drift does.
   */
  readonly logDriftPerSession?: number;
}

export interface ResampledReturns extends ResampledPaths {
  readonly method: ResampleMethod;
  readonly paths: number;
  /** How many past returns all of it rests on: odds of rarer events than one in these are not known from them. */
  readonly sourceReturns: number;
  /** 1 when filtered. */
  readonly blockLength: number;
}

/**
 * Total log returns over a hold, drawn from past session returns.
 * @returns one total, one highest and one lowest close a path, in the order drawn.
 * @throws {DomainError} `too-few-returns`, `return-invalid` with the index, `block-length-out-of-range`, `lambda-out-of-range`,
 *   `filter-volatility-zero`, `daily-volatility-invalid`, `sessions-out-of-range`, `paths-out-of-range`, `drift-invalid`,
 *   `seed-invalid`, `resampled-path-overflow`.
 * @see blockDraws, resampleStandardised and resamplePaths (which says how a fraction of a session counts).
 */
export function resampleTotalReturns(question: ResampleQuestion): ResampledReturns {
  const { logReturns, method = 'stationary', paths } = question;
  checkReturns(logReturns);
  const about = { method, paths, sourceReturns: logReturns.length };
  if (method === 'filtered') return { ...filteredPaths(question), ...about, blockLength: 1 };
  const blockLength = question.blockLength ?? defaultBlockLength(logReturns.length);
  return { ...blockPaths(question, { method, blockLength }), ...about, blockLength };
}

function blockPaths(
  { logReturns, seed, removeMean = true, logDriftPerSession = 0, sessions, paths }: ResampleQuestion,
  block: { readonly method: BlockMethod; readonly blockLength: number },
): ResampledPaths {
  const source = removeMean ? withoutMean(logReturns) : Float64Array.from(logReturns);
  const draws = blockDraws(source.length, seededRandom(seed), block);
  return resamplePaths(
    { sessions, paths },
    { logDriftPerSession, startPath: draws.start, drawReturn: () => source[draws.next()] ?? NaN },
  );
}

function filteredPaths({
  logReturns,
  seed,
  removeMean = true,
  lambda = 0.94,
  logDriftPerSession = 0,
  sessions,
  paths,
}: ResampleQuestion): ResampledPaths {
  const { standardised, dailyVolatility } = filterReturns(logReturns, { lambda });
  return resampleStandardised({
    standardised: removeMean ? withoutMean(standardised) : standardised,
    dailyVolatility,
    lambda,
    seed,
    logDriftPerSession,
    sessions,
    paths,
  });
}

function withoutMean(values: readonly number[] | Float64Array): Float64Array {
  const mean = exactSum(values) / values.length;
  return Float64Array.from(values, (value) => value - mean);
}
