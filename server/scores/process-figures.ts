import { adherenceRate, processTable } from '@/journal/process/plan-followed';
import { sampled, type SampleOptions } from '@/server/scores/sampled';
import { type EntryColumns } from '@/server/scores/score-columns';
import { type Scores } from '@/shared/scores/scores';

/** Plans followed or not, by result; the counts are a list, only their rate needs enough of them. */
export function processFigures(entries: readonly EntryColumns[], options: SampleOptions): Scores['process'] {
  const judged = entries.flatMap(({ isFollowed, realisedProfit }) =>
    isFollowed === null || realisedProfit === null ? [] : [{ isFollowed, realisedProfit }],
  );
  const report = sampled(judged.length, options, () => adherenceRate(judged).rate);
  return { ...processTable(judged), ...report };
}
