import { chiSquareQuantile } from '@/journal/distributions/chi-square-distribution';
import { DomainError } from '@/journal/errors/domain-error';

/**
 * Equal-tailed interval of a volatility estimated from normal, independent returns.
 * @param question.dailyVolatility 0 or more; `degreesOfFreedom` above 0 (n − 1 with the mean removed, n with zero mean,
 *   fractions allowed); `confidence` strictly between 0 and 1.
 * @returns low and high, fractions; fat tails make the true interval wider.
 * @throws {DomainError} `volatility-invalid`, `confidence-out-of-range`, `degrees-of-freedom-invalid`.
 * @see chi-square interval of a standard deviation, e.g. Casella and Berger (2002), Statistical Inference.
 */
export function volatilityInterval(question: {
  readonly dailyVolatility: number;
  readonly degreesOfFreedom: number;
  readonly confidence: number;
}): { low: number; high: number } {
  const { dailyVolatility, degreesOfFreedom, confidence } = question;
  if (!(dailyVolatility >= 0 && dailyVolatility < Infinity))
    throw new DomainError('volatility-invalid', { dailyVolatility });
  if (!(confidence > 0 && confidence < 1)) throw new DomainError('confidence-out-of-range', { confidence });
  const factor = (probability: number) =>
    Math.sqrt(degreesOfFreedom / chiSquareQuantile(probability, degreesOfFreedom));
  const tail = (1 - confidence) / 2;
  return { low: dailyVolatility * factor(1 - tail), high: dailyVolatility * factor(tail) };
}
