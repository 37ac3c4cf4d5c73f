import { expMinusHalfSquare, normalUpperTail, scaledUpperTail } from '@/journal/distributions/normal-distribution';
import { checkLevelQuestion, type LevelQuestion } from '@/journal/odds/level-question';

/**
 * Odds that a level is reached at any time within a period, watched without a break, for geometric Brownian motion.
 * @returns in [0, 1]; 1 when the level is the spot price. Never less than the odds of finishing beyond it.
 * @throws {DomainError} `level-question-invalid`.
 * @see Harrison (1985), Brownian Motion and Stochastic Flow Systems; Shreve (2004), Stochastic Calculus for Finance II.
 *   With b = ln(level/spot), e its sign, m the log drift, s the total deviation:
 *   Phi((e·m − |b|)/s) + exp(2·m·b/s²)·Phi((−e·m − |b|)/s).
 */
export function touchOdds(question: LevelQuestion): number {
  checkLevelQuestion(question);
  const { spotPrice, level, totalDeviation, logDrift } = question;
  const distance = Math.log(level / spotPrice);
  if (distance === 0) return 1;
  const toward = distance > 0 ? logDrift : -logDrift;
  const gap = Math.abs(distance);
  if (totalDeviation === 0) return toward >= gap ? 1 : 0;
  const direct = normalUpperTail((gap - toward) / totalDeviation);
  // exp(2·m·b/s²)·Phi(−(b + m)/s) with both factors' exponentials joined: neither over- nor underflows on its own.
  const beyond = (gap + toward) / totalDeviation;
  const reflected =
    beyond >= 0
      ? expMinusHalfSquare(Math.abs(gap - toward) / totalDeviation) * scaledUpperTail(beyond)
      : Math.exp((2 * toward * gap) / (totalDeviation * totalDeviation)) * normalUpperTail(beyond);
  return Math.min(1, direct + reflected);
}
