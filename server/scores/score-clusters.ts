import { overlapClusters } from '@/journal/scoring/clusters';
import { effectiveSampleSize, intraclassCorrelation } from '@/journal/scoring/effective-sample-size';
import { type EntryColumns, type OddsColumns } from '@/server/scores/score-columns';

/** Odds beside the entry that stated them. */
export interface ScoredCall {
  readonly odds: OddsColumns;
  readonly entry: EntryColumns;
}

const later = (one: string, other: string) => (one > other ? one : other);

/** Calls that look over the same days of one underlying belong together. */
export function callClusters(calls: readonly ScoredCall[]): number[] {
  return overlapClusters(
    calls.map(({ odds, entry }) => ({
      underlying: entry.underlyingId,
      from: entry.firstSessionDate,
      through: later(entry.firstSessionDate, odds.dueSessionDate),
    })),
  );
}

/** Entries that were held over the same days of one underlying belong together. */
export function entryClusters(entries: readonly EntryColumns[]): number[] {
  return overlapClusters(
    entries.map(({ underlyingId, firstSessionDate, exitSessionDate, judgedSessionDate }) => ({
      underlying: underlyingId,
      from: firstSessionDate,
      through: later(firstSessionDate, judgedSessionDate ?? exitSessionDate),
    })),
  );
}

/** How many independent cases clustered values are worth; where their correlation cannot be told, a cluster counts as one case. */
export function effectiveCount(values: readonly number[], clusters: readonly number[]): number {
  const sizes = new Map<number, number>();
  for (const cluster of clusters) sizes.set(cluster, (sizes.get(cluster) ?? 0) + 1);
  return effectiveSampleSize([...sizes.values()], intraclassCorrelation(values, clusters) ?? 1);
}
