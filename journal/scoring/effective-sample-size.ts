import { DomainError } from '@/journal/errors/domain-error';
import { byCluster } from '@/journal/scoring/clusters';
import { requireScoreValues } from '@/journal/scoring/score-values';

/**
 * How many independent cases a clustered sample is worth: n / (1 + (m - 1) x rho).
 * @param clusterSizes whole numbers from 1, at least one; m is their mean weighted by size, sum m² / sum m.
 * @param correlation of two cases of one cluster, 0 to 1.
 * @returns 1 to n.
 * @throws {DomainError} `values-missing`, `cluster-size-invalid`, `correlation-invalid`.
 * @see Kish (1965), Survey Sampling, section 5.4 and, for unequal clusters, 11.7 (from memory).
 */
export function effectiveSampleSize(clusterSizes: readonly number[], correlation: number): number {
  if (clusterSizes.length === 0) throw new DomainError('values-missing');
  for (const size of clusterSizes) {
    if (!(Number.isSafeInteger(size) && size >= 1)) throw new DomainError('cluster-size-invalid', { size });
  }
  if (!(correlation >= 0 && correlation <= 1)) throw new DomainError('correlation-invalid', { correlation });
  const count = clusterSizes.reduce((sum, size) => sum + size, 0);
  const meanSize = clusterSizes.reduce((sum, size) => sum + size ** 2, 0) / count;
  return count / (1 + (meanSize - 1) * correlation);
}

/**
 * Correlation of two values of one cluster, from the spread between and inside clusters.
 * @param values from -1e100 to 1e100, at least one. @param clusters one label a value.
 * @returns 0 to 1: a negative estimate says that clusters do not matter and becomes 0. Null when it cannot be told: a single cluster,
 *   no cluster with two values, or no spread at all.
 * @throws {DomainError} `values-missing`, `value-out-of-range`, `clusters-not-matching`.
 * @see One-way analysis of variance: Fisher (1925), Statistical Methods for Research Workers, chapter VII; for unequal sizes Donner
 *   (1986), International Statistical Review 54(1), 67-82 (from memory).
 */
export function intraclassCorrelation(values: readonly number[], clusters: readonly number[]): number | null {
  requireScoreValues(values);
  const groups = byCluster(values, clusters);
  const { length: count } = values;
  if (groups.length < 2 || groups.length === count) return null;
  const meanOf = (members: readonly number[]) => members.reduce((sum, value) => sum + value, 0) / members.length;
  const overallMean = meanOf(values);
  let between = 0;
  let within = 0;
  for (const group of groups) {
    const mean = meanOf(group);
    between += group.length * (mean - overallMean) ** 2;
    within += group.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  }
  const betweenSquare = between / (groups.length - 1);
  const withinSquare = within / (count - groups.length);
  const typicalSize = (count - groups.reduce((sum, { length }) => sum + length ** 2, 0) / count) / (groups.length - 1);
  const spread = betweenSquare + (typicalSize - 1) * withinSquare;
  return spread > 0 ? Math.min(1, Math.max(0, (betweenSquare - withinSquare) / spread)) : null;
}
