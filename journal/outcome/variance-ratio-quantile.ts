import { DomainError } from '@/journal/errors/domain-error';

/**
 * Quantile of the ratio of two independent estimates of one variance from normal returns (the F distribution). Worked out here to
 * the last digits, since jstat's quantile is good to seven or eight only; the tests hold the two against each other.
 * @param probability above 0 and below 1.
 * @param numeratorDegrees from 0.1 to 1e6 (returns of the estimate on top). @param denominatorDegrees likewise; fractions allowed in
 *   both.
 * @returns 0 or more.
 * @throws {DomainError} `variance-ratio-invalid`.
 * @see NIST Digital Library of Mathematical Functions 8.17 (incomplete beta function); the relation to F from any statistics text.
 */
export function varianceRatioQuantile({
  probability,
  numeratorDegrees,
  denominatorDegrees,
}: {
  probability: number;
  numeratorDegrees: number;
  denominatorDegrees: number;
}): number {
  const areDegreesValid = [numeratorDegrees, denominatorDegrees].every((degrees) => degrees >= 0.1 && degrees <= 1e6);
  if (!(probability > 0 && probability < 1 && areDegreesValid)) {
    throw new DomainError('variance-ratio-invalid', { probability, numeratorDegrees, denominatorDegrees });
  }
  const [top, bottom] = [numeratorDegrees / 2, denominatorDegrees / 2];
  // On the logarithm of the odds of the beta variable both ends are reached in equal steps.
  let [low, high] = [-1, 1];
  const cumulative = (logOdds: number) => betaCumulative({ logOdds, first: top, second: bottom });
  while (cumulative(low) > probability) low *= 2;
  while (cumulative(high) < probability) high *= 2;
  for (let middle = (low + high) / 2; middle > low && middle < high; middle = (low + high) / 2) {
    if (cumulative(middle) < probability) low = middle;
    else high = middle;
  }
  return (Math.exp(high) * denominatorDegrees) / numeratorDegrees;
}

interface BetaPoint {
  /** ln(x / (1 - x)) of the point x. */
  readonly logOdds: number;
  readonly first: number;
  readonly second: number;
}

/** Regularised incomplete beta function, by the continued fraction on the side where it converges fast (DLMF 8.17.22). */
function betaCumulative({ logOdds, first, second }: BetaPoint): number {
  const x = 1 / (1 + Math.exp(-logOdds));
  if (x > (first + 1) / (first + second + 2)) {
    return 1 - betaCumulative({ logOdds: -logOdds, first: second, second: first });
  }
  const logX = -Math.log1p(Math.exp(-logOdds));
  const logRest = -Math.log1p(Math.exp(logOdds));
  const logFront = first * logX + second * logRest - logBeta(first, second) - Math.log(first);
  return Math.exp(logFront) / betaFraction({ x, first, second });
}

/** 1 + d1/(1 + d2/(1 + ...)), evaluated forwards (modified Lentz). */
function betaFraction({ x, first, second }: { x: number; first: number; second: number }): number {
  const tiny = 1e-300;
  let [value, numerator, denominator] = [1, 1, 0];
  for (let step = 1; step <= 10_000; step += 1) {
    const half = Math.floor(step / 2);
    const coefficient =
      step % 2 === 0
        ? (half * (second - half) * x) / ((first + step - 1) * (first + step))
        : (-(first + half) * (first + second + half) * x) / ((first + step - 1) * (first + step));
    denominator = 1 + coefficient * denominator;
    denominator = 1 / (Math.abs(denominator) < tiny ? tiny : denominator);
    numerator = 1 + coefficient / numerator;
    if (Math.abs(numerator) < tiny) numerator = tiny;
    value *= numerator * denominator;
    if (Math.abs(numerator * denominator - 1) <= Number.EPSILON) return value;
  }
  return value;
}

function logBeta(first: number, second: number): number {
  return logGamma(first) + logGamma(second) - logGamma(first + second);
}

/** ln of the gamma function for x > 0: raised to 10 or more by its recurrence, then Stirling's series (DLMF 5.11.1). */
function logGamma(x: number): number {
  let [raised, product] = [x, 1];
  while (raised < 10) {
    product *= raised;
    raised += 1;
  }
  const inverseSquare = 1 / raised ** 2;
  const coefficients = [1 / 12, -1 / 360, 1 / 1260, -1 / 1680, 1 / 1188, -691 / 360360, 1 / 156];
  const series = coefficients.reduceRight((sum, coefficient) => sum * inverseSquare + coefficient, 0) / raised;
  return (raised - 0.5) * Math.log(raised) - raised + Math.log(2 * Math.PI) / 2 + series - Math.log(product);
}
