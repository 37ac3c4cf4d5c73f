import { DomainError } from '@/journal/errors/domain-error';
import { type ResampledPaths } from '@/journal/odds/resample-paths';
import { type SampledOdds, sampledOdds } from '@/journal/odds/sampled-odds';

/** What is asked of resampled paths; levels are prices above 0. */
export type PathEvent =
  /** At the end at or above the level. */
  | { readonly kind: 'above'; readonly level: number }
  /** At the end at or below the level. */
  | { readonly kind: 'below'; readonly level: number }
  /** At the end at or above the lower level and below the upper one. */
  | { readonly kind: 'between'; readonly lowerLevel: number; readonly upperLevel: number }
  /** At or beyond the level at one close at least; the spot price itself is touched from the start. */
  | { readonly kind: 'touch-at-closes'; readonly level: number };

/**
 * Odds of an event over resampled paths.
 * @param question.paths see resampleTotalReturns. @param question.spotPrice above 0.
 * @throws {DomainError} `spot-not-positive`, `level-not-positive`, `levels-out-of-order`.
 * @see sampledOdds for the error and for what stands in place of 0 and 1.
 */
export function resampledOdds({
  paths,
  spotPrice,
  event,
}: {
  readonly paths: ResampledPaths;
  readonly spotPrice: number;
  readonly event: PathEvent;
}): SampledOdds {
  if (!(spotPrice > 0 && spotPrice < Infinity)) throw new DomainError('spot-not-positive', { spotPrice });
  const { totalLogReturns, maxLogAtCloses, minLogAtCloses } = paths;
  const logLevel = (level: number) => {
    if (!(level > 0 && level < Infinity)) throw new DomainError('level-not-positive', { level });
    return Math.log(level / spotPrice);
  };
  const odds = (values: Float64Array, isHit: (value: number) => boolean) =>
    sampledOdds({ hits: countOf(values, isHit), paths: values.length });
  switch (event.kind) {
    case 'above': {
      const level = logLevel(event.level);
      return odds(totalLogReturns, (value) => value >= level);
    }
    case 'below': {
      const level = logLevel(event.level);
      return odds(totalLogReturns, (value) => value <= level);
    }
    case 'between': {
      const [low, high] = [logLevel(event.lowerLevel), logLevel(event.upperLevel)];
      if (!(low < high)) throw new DomainError('levels-out-of-order', { lowerLevel: event.lowerLevel });
      return odds(totalLogReturns, (value) => value >= low && value < high);
    }
    case 'touch-at-closes': {
      const level = logLevel(event.level);
      if (level > 0) return odds(maxLogAtCloses, (value) => value >= level);
      return level < 0 ? odds(minLogAtCloses, (value) => value <= level) : odds(totalLogReturns, () => true);
    }
  }
}

function countOf(values: Float64Array, isHit: (value: number) => boolean): number {
  let count = 0;
  for (const value of values) if (isHit(value)) count += 1;
  return count;
}
