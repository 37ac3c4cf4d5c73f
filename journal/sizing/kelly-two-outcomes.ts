import { DomainError } from '@/journal/errors/domain-error';

export interface TwoOutcomes {
  /** Of winning, 0 to 1. */
  readonly probability: number;
  /** What is won and what is lost, both above 0, in one currency. */
  readonly win: number;
  readonly loss: number;
}

/**
 * The share of an account at risk under which it grows fastest in the long run, for a bet with two outcomes.
 * @returns p − (1 − p)/b with b the win per 1 lost; negative where the bet loses on average, and then no bet is right.
 * @throws {DomainError} `kelly-input-invalid`.
 * @see Kelly (1956), Bell System Technical Journal 35; MacLean, Thorp and Ziemba (2011).
 */
export function kellyTwoOutcomes({ probability, win, loss }: TwoOutcomes): number {
  checkOutcomes({ probability, win, loss });
  return probability - ((1 - probability) * loss) / win;
}

/**
 * The probability of winning at which a bet is worth nothing.
 * @returns loss / (win + loss).
 * @throws {DomainError} `kelly-input-invalid`.
 * @see as {@link kellyTwoOutcomes}.
 */
export function breakEvenProbability({ win, loss }: Pick<TwoOutcomes, 'win' | 'loss'>): number {
  checkOutcomes({ probability: 0, win, loss });
  return 1 / (1 + win / loss);
}

function checkOutcomes({ probability, win, loss }: TwoOutcomes): void {
  const isValid = probability >= 0 && probability <= 1 && win > 0 && loss > 0 && win < Infinity && loss < Infinity;
  if (!isValid || !(loss / win < Infinity)) throw new DomainError('kelly-input-invalid', { probability, win, loss });
}
