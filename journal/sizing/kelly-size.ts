import { DomainError } from '@/journal/errors/domain-error';
import { kellyTwoOutcomes, type TwoOutcomes } from '@/journal/sizing/kelly-two-outcomes';

/** A figure at the low end, the best estimate and the high end of the odds it rests on. */
export interface KellyInterval {
  readonly low: number;
  readonly base: number;
  readonly high: number;
}

export interface KellySize {
  /** Share of the account at risk that would grow fastest, at each end of the odds; negative: no bet. */
  readonly fraction: KellyInterval;
  /** What may be used: a quarter of it or less, 0 where it is negative. */
  readonly capped: KellyInterval;
  /** `no-trade`: negative at the best estimate; `unsure`: the interval of the odds reaches below 0; else `trade`. */
  readonly verdict: 'no-trade' | 'unsure' | 'trade';
}

const GREATEST_SHARE = 0.25;

/**
 * Caps Kelly fractions: errors in the odds, fat tails and positions that move together all make them too large.
 * @param fraction at the low end, the best estimate and the high end of the odds, low <= base <= high, finite.
 * @param shareOfKelly what part may be used, above 0 and at most a quarter.
 * @throws {DomainError} `kelly-interval-order`; `kelly-share-invalid`.
 * @see MacLean, Thorp and Ziemba (2011) on fractional Kelly; the quarter is common practice.
 */
export function cappedKelly(fraction: KellyInterval, shareOfKelly = GREATEST_SHARE): KellySize {
  const { low, base, high } = fraction;
  if (!(-Infinity < low && low <= base && base <= high && high < Infinity))
    throw new DomainError('kelly-interval-order', { low, base, high });
  if (!(shareOfKelly > 0 && shareOfKelly <= GREATEST_SHARE))
    throw new DomainError('kelly-share-invalid', { shareOfKelly });
  const cap = (value: number) => Math.max(0, value) * shareOfKelly;
  return {
    fraction,
    capped: { low: cap(low), base: cap(base), high: cap(high) },
    verdict: base <= 0 ? 'no-trade' : low <= 0 ? 'unsure' : 'trade',
  };
}

/**
 * Kelly's size for two outcomes with the interval of the odds, capped.
 * @param question.probability low <= base <= high, each 0 to 1; `win` and `loss` above 0; a loss without limit is null and refused.
 * @throws {DomainError} `kelly-loss-unlimited`, and as {@link kellyTwoOutcomes} and {@link cappedKelly}.
 * @see as {@link kellyTwoOutcomes}.
 */
export function kellySize(
  question: Pick<TwoOutcomes, 'win'> & { readonly probability: KellyInterval; readonly loss: number | null },
  shareOfKelly?: number,
): KellySize {
  const { probability, win, loss } = question;
  if (loss === null) throw new DomainError('kelly-loss-unlimited');
  const at = (odds: number) => kellyTwoOutcomes({ probability: odds, win, loss });
  return cappedKelly(
    { low: at(probability.low), base: at(probability.base), high: at(probability.high) },
    shareOfKelly,
  );
}
