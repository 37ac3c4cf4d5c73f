import { studentCumulative } from '@/journal/distributions/student-distribution';
import { DomainError } from '@/journal/errors/domain-error';
import { checkLevelQuestion, type LevelQuestion } from '@/journal/odds/level-question';

/**
 * Odds beyond a level when the volatility is itself estimated: Student's t with one degree of freedom fewer than returns.
 * For levels and bands only: the expected price under it is infinite, so that no expected profit can be had from it.
 * @param question see oddsBeyondLevel; `returns` whole, from 2: how many the volatility was estimated from.
 * @returns `above` and `below` in [0, 1], summing to 1; without deviation as oddsBeyondLevel.
 * @throws {DomainError} `level-question-invalid`, `returns-count-invalid`.
 * @see predictive density of a normal sample, e.g. Casella and Berger (2002), Statistical Inference, for one session; that the scale
 *   goes with the root of sessions: common practice.
 */
export function studentOddsBeyondLevel(question: LevelQuestion & { readonly returns: number }): {
  above: number;
  below: number;
} {
  checkLevelQuestion(question);
  const { spotPrice, level, totalDeviation, logDrift, returns } = question;
  checkReturnsCount(returns);
  const distance = Math.log(level / spotPrice) - logDrift;
  if (totalDeviation === 0) return { above: distance < 0 ? 1 : 0, below: distance > 0 ? 1 : 0 };
  const t = distance / totalDeviation;
  return { above: studentCumulative(-t, returns - 1), below: studentCumulative(t, returns - 1) };
}

/**
 * How much a band of some estimated deviations to either side covers.
 * @param band.deviations 0 or more. @param band.returns whole, from 2.
 * @returns in [0, 1]; 0.670, 0.940, 0.9926 for 1, 2, 3 with 20 returns.
 * @throws {DomainError} `deviations-invalid`, `returns-count-invalid`.
 * @see as studentOddsBeyondLevel.
 */
export function studentBandCoverage({ deviations, returns }: { deviations: number; returns: number }): number {
  if (!(deviations >= 0)) throw new DomainError('deviations-invalid', { deviations });
  checkReturnsCount(returns);
  return 1 - 2 * studentCumulative(-deviations, returns - 1);
}

function checkReturnsCount(returns: number): void {
  if (!(Number.isSafeInteger(returns) && returns >= 2 && returns <= 1e6))
    throw new DomainError('returns-count-invalid', { returns });
}
