import { DomainError } from '@/journal/errors/domain-error';

/** A known cash dividend. */
export interface CashDividend {
  /** Calendar years until the shares go ex, 0 or more. */
  readonly years: number;
  /** Currency per share, 0 or more. */
  readonly amount: number;
}

/**
 * The spot price less the present value of the dividends that fall within an option's life: what a European option is priced on.
 * @param question.spotPrice above 0; `years` to expiry, 0 or more; `ratePerYear` continuous. A dividend after expiry, or already
 *   paid (0 years), does not count.
 * @returns currency per share, above 0.
 * @throws {DomainError} `dividend-invalid` with the index; `dividends-exceed-spot` when nothing would be left.
 * @see escrowed-dividend model, e.g. Hull, Options, Futures, and Other Derivatives; its faults: Haug, Haug and Lewis (2003).
 */
export function escrowedSpot(question: {
  readonly spotPrice: number;
  readonly dividends: readonly CashDividend[];
  readonly years: number;
  readonly ratePerYear: number;
}): number {
  const { spotPrice, dividends, years, ratePerYear } = question;
  let presentDividends = 0;
  for (const [index, dividend] of dividends.entries()) {
    const isValid =
      dividend.years >= 0 && dividend.years < Infinity && dividend.amount >= 0 && dividend.amount < Infinity;
    if (!isValid) throw new DomainError('dividend-invalid', { index, years: dividend.years, amount: dividend.amount });
    const isWithinLife = dividend.years > 0 && dividend.years <= years;
    if (isWithinLife) presentDividends += dividend.amount * Math.exp(-ratePerYear * dividend.years);
  }
  const escrowed = spotPrice - presentDividends;
  if (presentDividends > 0 && !(escrowed > 0))
    throw new DomainError('dividends-exceed-spot', { spotPrice, presentDividends });
  return escrowed;
}
