import { DomainError } from '@/journal/errors/domain-error';
import { type PathCount, type ResampledPaths, resamplePaths } from '@/journal/odds/resample-paths';
import { seededRandom } from '@/journal/random/seeded-random';

/**
 * Filtered historical simulation: standardised returns are drawn anew, and each draw moves the volatility of the sessions after it.
 * @param question.standardised at least 1, finite. @param question.dailyVolatility of the first session, above 0, a fraction.
 * @param question.lambda decay of the variance, strictly between 0 and 1. @param question.seed whole number.
 * @param question.logDriftPerSession added to every session; 0 when not given.
 * @throws {DomainError} `too-few-returns`, `return-invalid` with the index, `daily-volatility-invalid`, `lambda-out-of-range`,
 *   `seed-invalid`, and as resamplePaths.
 * @see Barone-Adesi, Giannopoulos and Vosper (1999), J. Futures Markets 19.
 */
export function resampleStandardised(
  question: PathCount & {
    readonly standardised: ArrayLike<number>;
    readonly dailyVolatility: number;
    readonly lambda: number;
    readonly seed: number | bigint;
    readonly logDriftPerSession?: number;
  },
): ResampledPaths {
  const { standardised, dailyVolatility, lambda, seed, logDriftPerSession = 0 } = question;
  if (!(lambda > 0 && lambda < 1)) throw new DomainError('lambda-out-of-range', { lambda });
  if (!(dailyVolatility > 1e-140 && dailyVolatility <= 100))
    throw new DomainError('daily-volatility-invalid', { dailyVolatility });
  const source = Float64Array.from(standardised);
  if (source.length < 1) throw new DomainError('too-few-returns', { required: 1, received: 0 });
  const bad = source.findIndex((value) => !Number.isFinite(value));
  if (bad >= 0) throw new DomainError('return-invalid', { index: bad, value: source[bad] ?? null });
  const random = seededRandom(seed);
  let variance = 0;
  return resamplePaths(question, {
    logDriftPerSession,
    startPath: () => {
      variance = dailyVolatility * dailyVolatility;
    },
    drawReturn: () => {
      const value = (source[random.index(source.length)] ?? NaN) * Math.sqrt(variance);
      variance = lambda * variance + (1 - lambda) * value * value;
      return value;
    },
  });
}
