import { studentCumulative } from '@/journal/distributions/student-distribution';
import { DomainError } from '@/journal/errors/domain-error';
import { seededRandom } from '@/journal/random/seeded-random';
import { quantile } from '@/journal/returns/quantile';
import { byCluster } from '@/journal/scoring/clusters';
import { requireConfidence } from '@/journal/scoring/hit-count';
import { requireScoreValues } from '@/journal/scoring/score-values';

export interface ClusteredMean {
  readonly mean: number;
  readonly clusterCount: number;
  /** Null from a single cluster. */
  readonly standardError: number | null;
  /** Two-sided, that the true mean is 0: Student with clusters - 1 degrees of freedom. Null from a single cluster or without spread. */
  readonly pValue: number | null;
}

/**
 * Mean of values of which those of one cluster may move together, with a standard error that allows for it.
 * @param values from -1e100 to 1e100, at least one. @param clusters one label a value; all different for independent values.
 * @throws {DomainError} `values-missing`, `value-out-of-range`, `clusters-not-matching`.
 * @see Liang and Zeger (1986), Biometrika 73(1), 13-22, with the factor G / (G - 1) of common practice.
 */
export function clusteredMean(values: readonly number[], clusters: readonly number[]): ClusteredMean {
  const groups = clusterSums(values, clusters);
  const count = values.length;
  const mean = groups.reduce((sum, group) => sum + group.sum, 0) / count;
  const clusterCount = groups.length;
  if (clusterCount < 2) return { mean, clusterCount, standardError: null, pValue: null };
  const squares = groups.reduce((sum, group) => sum + (group.sum - group.count * mean) ** 2, 0);
  const standardError = Math.sqrt((clusterCount / (clusterCount - 1)) * squares) / count;
  const pValue = standardError > 0 ? 2 * studentCumulative(-Math.abs(mean / standardError), clusterCount - 1) : null;
  return { mean, clusterCount, standardError, pValue };
}

/**
 * Compares two methods on the same cases.
 * @param scores, otherScores of the same cases in the same order, finite; less is better.
 * @param clusters one label a case.
 * @returns the mean of score - other: negative when the first method is better.
 * @throws {DomainError} `scores-not-matching`, and as clusteredMean.
 * @see Diebold and Mariano (1995), J. Business and Economic Statistics 13(3), 253-263, with clusters in place of lags.
 */
export function comparePaired({
  scores,
  otherScores,
  clusters,
}: {
  scores: readonly number[];
  otherScores: readonly number[];
  clusters: readonly number[];
}): ClusteredMean {
  if (scores.length !== otherScores.length) {
    throw new DomainError('scores-not-matching', { scores: scores.length, otherScores: otherScores.length });
  }
  const differences = scores.map((score, index) => score - (otherScores[index] ?? Number.NaN));
  return clusteredMean(differences, clusters);
}

/**
 * Interval of a mean by drawing whole clusters anew.
 * @param seed whole number; the same seed gives the same interval. @param resamples whole number from 100.
 * @returns null from a single cluster: nothing tells how another would differ.
 * @throws {DomainError} `resamples-invalid`, `confidence-invalid`, and as clusteredMean.
 * @see Efron (1979), Annals of Statistics 7(1), 1-26 (percentile interval); Davison and Hinkley (1997), section 3.8 (whole clusters).
 */
export function clusterBootstrapInterval(
  values: readonly number[],
  clusters: readonly number[],
  { seed, resamples = 2000, confidence = 0.95 }: { seed: number; resamples?: number; confidence?: number },
): { low: number; high: number } | null {
  requireConfidence(confidence);
  if (!(Number.isSafeInteger(resamples) && resamples >= 100)) throw new DomainError('resamples-invalid', { resamples });
  const groups = clusterSums(values, clusters);
  if (groups.length < 2) return null;
  const random = seededRandom(seed);
  const means = Array.from({ length: resamples }, () => {
    let sum = 0;
    let count = 0;
    for (let draw = 0; draw < groups.length; draw += 1) {
      const group = groups[random.index(groups.length)];
      sum += group?.sum ?? 0;
      count += group?.count ?? 0;
    }
    return sum / count;
  });
  return { low: quantile(means, (1 - confidence) / 2), high: quantile(means, (1 + confidence) / 2) };
}

function clusterSums(values: readonly number[], clusters: readonly number[]): { sum: number; count: number }[] {
  requireScoreValues(values);
  return byCluster(values, clusters).map((group) => ({
    sum: group.reduce((sum, value) => sum + value, 0),
    count: group.length,
  }));
}
