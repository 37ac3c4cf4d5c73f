import jstat from 'jstat';
import { DomainError } from '@/journal/errors/domain-error';

/**
 * Distribution function of Student's t.
 * @param t any number.
 * @param degreesOfFreedom above 0, fractions allowed.
 * @returns probability in [0, 1].
 * @throws {DomainError} `degrees-of-freedom-invalid`.
 * @see Student (1908); through the regularised incomplete beta function of jstat.
 */
export function studentCumulative(t: number, degreesOfFreedom: number): number {
  const isValid = degreesOfFreedom > 0 && degreesOfFreedom < Infinity;
  if (!isValid) throw new DomainError('degrees-of-freedom-invalid', { degreesOfFreedom });
  const tail = 0.5 * jstat.jStat.ibeta(degreesOfFreedom / (degreesOfFreedom + t * t), degreesOfFreedom / 2, 0.5);
  return t < 0 ? tail : 1 - tail;
}
