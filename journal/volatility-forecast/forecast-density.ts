import jstat from 'jstat';
import { normalCumulative, normalQuantile } from '@/journal/distributions/normal-distribution';
import { searchQuantile } from '@/journal/distributions/quantile-search';
import { studentCumulative } from '@/journal/distributions/student-distribution';
import { DomainError } from '@/journal/errors/domain-error';
import { normalRankedScore } from '@/journal/scoring/normal-ranked-score';
import { studentRankedScore } from '@/journal/scoring/student-ranked-score';

/** What is believed of a log return: a normal law, a Student law or a smoothed sample, with functions of it. All in log return. */
export interface ForecastDensity {
  readonly kind: 'normal' | 'student' | 'kernel';
  /** Mean of the law. */
  readonly location: number;
  /** Scale of the law: less than its standard deviation if Student, otherwise the same. */
  readonly scale: number;
  /** Of a Student law, above 2; null for the others. */
  readonly degreesOfFreedom: number | null;
  /** Standard deviation. */
  readonly deviation: number;
  /** Value below which the outcome falls with the probability, strictly between 0 and 1. @throws {DomainError} `probability-out-of-range`. */
  quantile(probability: number): number;
  /** Probability of an outcome up to x. */
  cdf(x: number): number;
  /** Natural logarithm of the density at x. */
  logDensity(x: number): number;
  /** Continuous ranked probability score of the outcome x; less is better. @throws {DomainError} for an x that is not finite. */
  crps(x: number): number;
}

const HALF_LOG_TWO_PI = 0.9189385332046728;

/**
 * Normal law of a log return.
 * @param location finite. @param deviation above 0, finite.
 * @throws {DomainError} `density-invalid`.
 */
export function normalForecast({ location, deviation }: { location: number; deviation: number }): ForecastDensity {
  requireDensity(location, deviation);
  const standard = (x: number) => (x - location) / deviation;
  return {
    kind: 'normal',
    location,
    scale: deviation,
    degreesOfFreedom: null,
    deviation,
    quantile: (probability) => location + deviation * normalQuantile(probability),
    cdf: (x) => normalCumulative(standard(x)),
    logDensity: (x) => -HALF_LOG_TWO_PI - Math.log(deviation) - standard(x) ** 2 / 2,
    crps: (observed) => normalRankedScore({ mean: location, standardDeviation: deviation, observed }),
  };
}

/**
 * Student law of a log return with a given standard deviation.
 * @param location finite. @param deviation above 0, finite. @param degreesOfFreedom above 2, up to 1e6.
 * @throws {DomainError} `density-invalid`.
 * @see Bollerslev (1987), Review of Economics and Statistics 69, 542-547, eq. 1, for the law scaled to a variance.
 */
export function studentForecast({
  location,
  deviation,
  degreesOfFreedom,
}: {
  location: number;
  deviation: number;
  degreesOfFreedom: number;
}): ForecastDensity {
  requireDensity(location, deviation);
  if (!(degreesOfFreedom > 2 && degreesOfFreedom <= 1e6))
    throw new DomainError('density-invalid', { location, deviation, degreesOfFreedom });
  const scale = deviation * Math.sqrt((degreesOfFreedom - 2) / degreesOfFreedom);
  const standard = (x: number) => (x - location) / scale;
  const top = studentLogConstant(degreesOfFreedom);
  const logDensityOf = (z: number) => top - ((degreesOfFreedom + 1) / 2) * Math.log1p((z * z) / degreesOfFreedom);
  return {
    kind: 'student',
    location,
    scale,
    degreesOfFreedom,
    deviation,
    quantile: (probability) => location + scale * studentQuantile(probability),
    cdf: (x) => studentCumulative(standard(x), degreesOfFreedom),
    logDensity: (x) => logDensityOf(standard(x)) - Math.log(scale),
    crps: (observed) => studentRankedScore({ location, scale, degreesOfFreedom, observed }),
  };

  /** By symmetry from the nearer tail, where no digits are lost. */
  function studentQuantile(probability: number): number {
    if (!(probability > 0 && probability < 1)) throw new DomainError('probability-out-of-range', { probability });
    const tail = Math.min(probability, 1 - probability);
    // Bounds that close in on the answer: bisection from the ends of the doubles would take too many steps.
    let least = normalQuantile(tail) - 1;
    while (studentCumulative(least, degreesOfFreedom) > tail) least *= 2;
    const distance = searchQuantile({
      probability: tail,
      cumulative: (z) => studentCumulative(z, degreesOfFreedom),
      density: (z) => Math.exp(logDensityOf(z)),
      start: normalQuantile(tail),
      least,
      most: 0,
    });
    return probability < 0.5 ? distance : 0 - distance;
  }
}

/**
 * Logarithm of the density of Student's law at its centre, for scale 1.
 * @param degreesOfFreedom above 0, finite.
 * @see Student (1908).
 */
export function studentLogConstant(degreesOfFreedom: number): number {
  const { gammaln } = jstat.jStat;
  return gammaln((degreesOfFreedom + 1) / 2) - gammaln(degreesOfFreedom / 2) - Math.log(degreesOfFreedom * Math.PI) / 2;
}

function requireDensity(location: number, deviation: number): void {
  if (!(Number.isFinite(location) && deviation > 0 && deviation < Infinity))
    throw new DomainError('density-invalid', { location, deviation });
}
