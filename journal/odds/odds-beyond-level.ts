import { normalUpperTail } from '@/journal/distributions/normal-distribution';
import { checkLevelQuestion, type LevelQuestion } from '@/journal/odds/level-question';

/**
 * Odds of being above, and below, a level at the end of a period, for a lognormal price.
 * @returns `above` and `below` in [0, 1], each with full relative accuracy in its own tail; at the level itself the chance is 0.
 *   Without variance the drift decides, and exactly at the level neither side has any.
 * @throws {DomainError} `level-question-invalid`.
 * @see Black and Scholes (1973): Phi(d2) for the risk-neutral drift; other drifts shift the mean.
 */
export function oddsBeyondLevel(question: LevelQuestion): { above: number; below: number } {
  checkLevelQuestion(question);
  const { spotPrice, level, totalDeviation, logDrift } = question;
  const distance = Math.log(level / spotPrice) - logDrift;
  if (totalDeviation === 0) return { above: distance < 0 ? 1 : 0, below: distance > 0 ? 1 : 0 };
  const z = distance / totalDeviation;
  return { above: normalUpperTail(z), below: normalUpperTail(-z) };
}
