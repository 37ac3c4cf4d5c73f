import { DomainError } from '@/journal/errors/domain-error';

/**
 * Continuous ranked probability score of a forecast given as a sample: each drawn value is as likely as the others. In the outcome's
 * own unit, 0 is best.
 * @param sample at least 1 value of a magnitude up to 1e150, in any order. @param observed of a magnitude up to 1e150.
 * @throws {DomainError} `too-few-values`, `value-invalid` with the index (−1 for the observed value).
 * @see Gneiting and Raftery (2007), J. American Statistical Association 102, 359-378, eq. 20, E|X − y| − E|X − X'|/2 under the
 *   empirical distribution, its second part from the sorted sample.
 */
export function sampleRankedScore(sample: readonly number[], observed: number): number {
  const count = sample.length;
  if (count === 0) throw new DomainError('too-few-values', { required: 1, received: 0 });
  const isUsable = (value: number) => Math.abs(value) <= 1e150;
  if (!isUsable(observed)) throw new DomainError('value-invalid', { index: -1, value: observed });
  const invalid = sample.findIndex((value) => !isUsable(value));
  if (invalid >= 0) throw new DomainError('value-invalid', { index: invalid, value: sample[invalid] ?? null });
  const sorted = [...sample].sort((left, right) => left - right);
  let distance = 0;
  let spread = 0;
  for (const [index, value] of sorted.entries()) {
    distance += Math.abs(value - observed) / count;
    spread += (value / count) * ((2 * index + 1 - count) / count);
  }
  return Math.max(distance - spread, 0);
}
