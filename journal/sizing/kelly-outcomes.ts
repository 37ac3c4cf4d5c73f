import { DomainError } from '@/journal/errors/domain-error';
import { bracketedRoot } from '@/journal/forecast/bracketed-root';

/** One possible profit with its probability. */
export interface WeighedProfit {
  /** Currency for one unit of the position. */
  readonly profit: number;
  readonly probability: number;
}

const SUM_TOLERANCE = 1e-6;
const INSIDE = 1 - 1e-12;

/**
 * The share of an account at risk under which it grows fastest, for any finite set of profits: it maximises E ln(1 + f·R), with
 * R the profit over the greatest loss.
 * @param outcomes probabilities sum to 1; at least one profit below 0.
 * @returns share of the account that the greatest loss may be; negative where the position loses on average; below 1.
 * @throws {DomainError} `kelly-outcomes-invalid` with the index; `kelly-no-loss`; `kelly-no-gain`.
 * @see Kelly (1956), Bell System Technical Journal 35; MacLean, Thorp and Ziemba (2011).
 */
export function kellyOutcomes(outcomes: readonly WeighedProfit[]): number {
  const returns = returnsOnRisk(outcomes);
  const most = Math.max(...returns.map(({ profit }) => profit));
  if (!(most > 0)) throw new DomainError('kelly-no-gain', { most });
  const slope = (fraction: number) =>
    returns.reduce((sum, { profit, probability }) => sum + (probability * profit) / (1 + fraction * profit), 0);
  // The growth is concave: its slope falls from +∞ to −∞ between the shares at which one outcome takes everything.
  const [low, high] = [-INSIDE / most, INSIDE];
  const [lowValue, highValue] = [slope(low), slope(high)];
  if (!(lowValue > 0)) return low;
  if (!(highValue < 0)) return high;
  return bracketedRoot(slope, { low, high, lowValue, highValue, tolerance: 1e-15 });
}

/**
 * Mean growth of the log of an account a bet, with a share of it at risk.
 * @param fraction share that the greatest loss is of the account, 0 to below 1.
 * @returns E ln(1 + f·R).
 * @throws {DomainError} as {@link kellyOutcomes}; `kelly-fraction-invalid` where an outcome would leave nothing.
 * @see as {@link kellyOutcomes}.
 */
export function logGrowth(outcomes: readonly WeighedProfit[], fraction: number): number {
  const growth = returnsOnRisk(outcomes).reduce(
    (sum, { profit, probability }) => sum + (probability > 0 ? probability * Math.log1p(fraction * profit) : 0),
    0,
  );
  if (!Number.isFinite(growth)) throw new DomainError('kelly-fraction-invalid', { fraction });
  return growth;
}

/** Profits over the greatest loss. */
function returnsOnRisk(outcomes: readonly WeighedProfit[]): WeighedProfit[] {
  let sum = 0;
  let least = 0;
  for (const [index, { profit, probability }] of outcomes.entries()) {
    const isValid = Number.isFinite(profit) && probability >= 0 && probability <= 1;
    if (!isValid) throw new DomainError('kelly-outcomes-invalid', { index, profit, probability });
    sum += probability;
    if (probability > 0) least = Math.min(least, profit);
  }
  if (!(Math.abs(sum - 1) <= SUM_TOLERANCE)) throw new DomainError('kelly-outcomes-invalid', { index: null, sum });
  if (!(least < 0)) throw new DomainError('kelly-no-loss', { least });
  return outcomes.map(({ profit, probability }) => ({ profit: profit / -least, probability }));
}
