import { DomainError } from '@/journal/errors/domain-error';

/**
 * Annual volatility, for display only: the clock of this engine is the session.
 * @param dailyVolatility a fraction per session, 0 or more.
 * @param sessionsPerYear 252 by convention.
 * @returns a fraction per year, 0 or more, finite.
 * @throws {DomainError} `volatility-invalid`.
 * @see common practice: scaling with the square root of time.
 */
export function annualizedVolatility(dailyVolatility: number, sessionsPerYear = 252): number {
  const annualized = dailyVolatility * Math.sqrt(sessionsPerYear);
  const isValid = dailyVolatility >= 0 && sessionsPerYear > 0 && sessionsPerYear < Infinity && annualized < Infinity;
  if (!isValid) throw new DomainError('volatility-invalid', { dailyVolatility, sessionsPerYear });
  return annualized;
}
