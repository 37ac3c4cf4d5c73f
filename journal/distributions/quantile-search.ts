import { DomainError } from '@/journal/errors/domain-error';

/**
 * Inverts a distribution function on an interval by bisection closed with Newton's steps.
 * @param question.probability strictly between 0 and 1; `start` a first guess; `least` and `most` bound the answer.
 * @returns x with cumulative(x) = probability, to the accuracy of `cumulative`.
 * @throws {DomainError} `probability-out-of-range`.
 */
export function searchQuantile(question: {
  readonly probability: number;
  readonly cumulative: (x: number) => number;
  readonly density: (x: number) => number;
  readonly start: number;
  readonly least: number;
  readonly most: number;
}): number {
  const { probability, cumulative, density } = question;
  if (!(probability > 0 && probability < 1)) throw new DomainError('probability-out-of-range', { probability });
  let { least, most } = question;
  let x = Number.isFinite(question.start) ? Math.min(Math.max(question.start, least), most) : (least + most) / 2;
  for (let step = 0; step < 200; step += 1) {
    const error = cumulative(x) - probability;
    if (error > 0) most = x;
    else least = x;
    const slope = density(x);
    const newton = x - error / slope;
    const next = slope > 0 && newton > least && newton < most ? newton : (least + most) / 2;
    if (Math.abs(next - x) <= 4e-16 * Math.abs(x) || next === x) return next;
    x = next;
  }
  return x;
}
