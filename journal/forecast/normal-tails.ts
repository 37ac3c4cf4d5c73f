import { normalCumulative } from '@/journal/distributions/normal-distribution';

/** Both tails of the standard normal at one point, each with its own digits. */
export interface NormalTails {
  readonly isUpper: boolean;
  readonly below: number;
  readonly above: number;
}

/** @param standard any number, infinities included. */
export function tailsAt(standard: number): NormalTails {
  const tail = normalCumulative(-Math.abs(standard));
  return standard > 0
    ? { isUpper: true, below: 1 - tail, above: tail }
    : { isUpper: false, below: tail, above: 1 - tail };
}

/** Probability between two points, from the nearer tail, so that a small one keeps its digits. */
export function probabilityBetween(low: NormalTails, high: NormalTails): number {
  return low.isUpper ? low.above - high.above : high.below - low.below;
}
