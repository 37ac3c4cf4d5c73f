import { DomainError } from '@/journal/errors/domain-error';

/** 'list-only': the cases themselves and no rate. 'provisional': rates with their interval, in grey. 'shown': rates with interval. */
export type SampleRule = 'list-only' | 'provisional' | 'shown';

const provisionalFrom = 20;
const shownAbove = 50;

/**
 * What may be said from so many resolved cases: below 20 no rates at all, from 20 to 50 provisional ones.
 * @param count whole number from 0.
 * @throws {DomainError} `count-invalid`.
 * @see Common practice; a frequency is known to 10 points only from 97 cases on.
 */
export function sampleSizeRule(count: number): SampleRule {
  if (!(Number.isInteger(count) && count >= 0)) throw new DomainError('count-invalid', { count });
  if (count < provisionalFrom) return 'list-only';
  return count <= shownAbove ? 'provisional' : 'shown';
}
