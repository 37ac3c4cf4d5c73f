import { clusteredMean } from '@/journal/scoring/clustered-mean';
import { clusteredMeanInterval } from '@/journal/scoring/clustered-mean-interval';
import { grouped } from '@/server/scores/grouped';
import { sampled, type SampleOptions } from '@/server/scores/sampled';
import { effectiveCount, entryClusters } from '@/server/scores/score-clusters';
import { type EntryColumns } from '@/server/scores/score-columns';
import { type Scores } from '@/shared/scores/scores';

/** Realised against planned volatility, by the method of the plan; the most used first. */
export function volatilityFigures(entries: readonly EntryColumns[], options: SampleOptions): Scores['volatility'] {
  const byMethod = grouped(
    entries.filter(({ volatilityRatio }) => volatilityRatio !== null),
    ({ volatilityMethod }) => [volatilityMethod],
  );
  return [...byMethod]
    .sort(([one, some], [other, more]) => more.length - some.length || one.localeCompare(other, 'en'))
    .map(([method, members]) => {
      const clusters = entryClusters(members);
      // Variances add up over time, so the mean is taken of squares.
      const squares = members.map(({ volatilityRatio }) => (volatilityRatio ?? 0) ** 2);
      const report = sampled(members.length, options, () => {
        const estimate = clusteredMean(squares, clusters);
        const interval = clusteredMeanInterval(estimate);
        return {
          ratio: Math.sqrt(estimate.mean),
          low: interval === null ? null : Math.sqrt(Math.max(0, interval.low)),
          high: interval === null ? null : Math.sqrt(interval.high),
          effectiveCount: effectiveCount(squares, clusters),
        };
      });
      return { method, ...report };
    });
}
