import { chiSquareQuantile } from '@/journal/distributions/chi-square-distribution';
import { DomainError } from '@/journal/errors/domain-error';

/**
 * Equal-tailed interval of a volatility estimated from normal, independent returns.
 * @param question.dailyVolatility 0 or more; `degreesOfFreedom` above 0 (n − 1 with the mean removed, n with zero mean,
 *   fractions allowed); `confidence` strictly between 0 and 1.
 * @returns low and high, fractions, finite; fat tails make the true interval wider.
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
  const tail = (1 - confidence) / 2;
  // The second condition leaves out confidences so near to 1 that no double lies between.
  if (!(confidence > 0 && 1 - tail < 1)) throw new DomainError('confidence-out-of-range', { confidence });
  const factor = (probability: number) =>
    Math.sqrt(degreesOfFreedom / chiSquareQuantile(probability, degreesOfFreedom));
  const interval = { low: dailyVolatility * factor(1 - tail), high: dailyVolatility * factor(tail) };
  if (!(interval.high < Infinity)) throw new DomainError('volatility-invalid', { dailyVolatility });
  return interval;
}
