import { DomainError } from '@/journal/errors/domain-error';

/** Totals and extremes of resampled paths, one element a path, in log price from the start. */
export interface ResampledPaths {
  readonly totalLogReturns: Float64Array;
  /** Over the closes of the path, its end included, its start not. */
  readonly maxLogAtCloses: Float64Array;
  readonly minLogAtCloses: Float64Array;
}

/** How far and how often. */
export interface PathCount {
  /** Sessions of a path, above 0 to 5,040, fractions allowed. */
  readonly sessions: number;
  /** Whole, 1 to 1,000,000. */
  readonly paths: number;
}

/**
 * Paths built of one drawn log return a session. A fraction of a session comes last, and scales its drawn return by the root of the
 * fraction, so that variance runs with sessions; a drift runs with sessions too.
 * @param count see {@link PathCount}.
 * @param options.logDriftPerSession added to every session, finite.
 * @param options.startPath called before each path. @param options.drawReturn the next session's log return.
 * @throws {DomainError} `sessions-out-of-range`, `paths-out-of-range`, `drift-invalid`; `resampled-path-overflow` with the path.
 * @see Efron (1979), Annals of Statistics 7; the fraction's rule: common practice.
 */
export function resamplePaths(
  { sessions, paths }: PathCount,
  options: {
    readonly logDriftPerSession: number;
    readonly startPath: () => void;
    readonly drawReturn: () => number;
  },
): ResampledPaths {
  if (!(sessions > 0 && sessions <= 5040)) throw new DomainError('sessions-out-of-range', { sessions });
  if (!(Number.isInteger(paths) && paths >= 1 && paths <= 1_000_000))
    throw new DomainError('paths-out-of-range', { paths });
  const { logDriftPerSession, startPath, drawReturn } = options;
  if (!Number.isFinite(logDriftPerSession)) throw new DomainError('drift-invalid', { logDriftPerSession });
  const whole = Math.floor(sessions);
  const fraction = sessions - whole;
  const rootFraction = Math.sqrt(fraction);
  const totalLogReturns = new Float64Array(paths);
  const maxLogAtCloses = new Float64Array(paths);
  const minLogAtCloses = new Float64Array(paths);
  for (let path = 0; path < paths; path += 1) {
    startPath();
    let total = 0;
    let highest = -Infinity;
    let lowest = Infinity;
    for (let session = 0; session < whole; session += 1) {
      total += drawReturn() + logDriftPerSession;
      if (total > highest) highest = total;
      if (total < lowest) lowest = total;
    }
    if (fraction > 0) {
      total += drawReturn() * rootFraction + logDriftPerSession * fraction;
      if (total > highest) highest = total;
      if (total < lowest) lowest = total;
    }
    if (!(highest < Infinity && lowest > -Infinity)) throw new DomainError('resampled-path-overflow', { path });
    totalLogReturns[path] = total;
    maxLogAtCloses[path] = highest;
    minLogAtCloses[path] = lowest;
  }
  return { totalLogReturns, maxLogAtCloses, minLogAtCloses };
}
