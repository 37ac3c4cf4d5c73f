import { DomainError } from '@/journal/errors/domain-error';
import { requireProbability } from '@/journal/scoring/hit-count';

/** The list of probabilities has one entry a count. */
const MOST_EVENTS = 1_000_000;

/**
 * Probabilities of 0, 1, ... count events among independent events of one probability (binomial).
 * @param count whole number from 0 to 1,000,000.
 * @param probability 0 to 1.
 * @throws {DomainError} `count-invalid`, `probability-invalid`.
 */
export function binomialProbabilities({ count, probability }: { count: number; probability: number }): number[] {
  if (!(Number.isInteger(count) && count >= 0 && count <= MOST_EVENTS))
    throw new DomainError('count-invalid', { count });
  requireProbability(probability);
  const mode = Math.min(count, Math.floor((count + 1) * probability));
  // Outwards from the mode each term follows from its neighbour; dividing by their sum needs no factorials.
  const weights = new Array<number>(count + 1).fill(0);
  weights[mode] = 1;
  const odds = probability / (1 - probability);
  let weight = 1;
  for (let events = mode; events < count; events += 1) {
    weight *= ((count - events) / (events + 1)) * odds;
    weights[events + 1] = weight;
  }
  weight = 1;
  for (let events = mode; events > 0; events -= 1) {
    weight *= events / (count - events + 1) / odds;
    weights[events - 1] = weight;
  }
  const total = weights.reduce((sum, one) => sum + one, 0);
  return weights.map((one) => one / total);
}

/** Less than this in a tail is below the rounding of the sum of the rest. */
const negligible = 1e-22;

/**
 * Probabilities of 0, 1, ... n events among n independent events of differing probabilities (Poisson binomial), by convolution.
 * @param probabilities each 0 to 1.
 * @returns exact but for rounding; counts less likely than about 1e-20 may come out as 0.
 * @throws {DomainError} `probability-invalid`.
 */
export function eventCountProbabilities(probabilities: readonly number[]): number[] {
  const distribution = new Float64Array(probabilities.length + 1);
  distribution[0] = 1;
  // Only counts between `low` and `high` still matter: so n events cost about n to the power 1.5 and not n squared.
  let [low, high] = [0, 0];
  for (const probability of probabilities) {
    requireProbability(probability);
    high += 1;
    for (let events = high; events > low; events -= 1) {
      distribution[events] =
        (distribution[events] ?? 0) * (1 - probability) + (distribution[events - 1] ?? 0) * probability;
    }
    distribution[low] = (distribution[low] ?? 0) * (1 - probability);
    while (low < high && (distribution[low] ?? 0) < negligible) {
      distribution[low] = 0;
      low += 1;
    }
    while (high > low && (distribution[high] ?? 0) < negligible) {
      distribution[high] = 0;
      high -= 1;
    }
  }
  return Array.from(distribution);
}

/**
 * Smallest number of events whose cumulative probability reaches `level`.
 * @param distribution probabilities of 0, 1, ... events, summing to 1. @param level 0 to 1.
 * @throws {DomainError} `probability-invalid`.
 */
export function eventCountQuantile(distribution: readonly number[], level: number): number {
  requireProbability(level);
  let cumulative = 0;
  for (const [events, weight] of distribution.entries()) {
    cumulative += weight;
    // The slack keeps the rounding of the sum from moving a quantile that is met exactly.
    if (cumulative >= level - 1e-12) return events;
  }
  return distribution.length - 1;
}
