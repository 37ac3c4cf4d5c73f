import { DomainError } from '@/journal/errors/domain-error';
import { Decimal, toDecimal } from '@/journal/money/decimal';

/** Limits on one entry; null where a desk or trader set none. Amounts are decimal texts, currency. */
export interface SizeLimits {
  /** Greatest loss of one entry, 0 or more. */
  readonly lossPerEntry: string | null;
  /** Greatest loss of everything open on the underlying, with what is at risk there already; both 0 or more. */
  readonly riskPerUnderlying: { readonly limit: string; readonly open: string } | null;
  /** Greatest loss as a share of an account, 0 to 1 as decimal text, and what the account is worth. */
  readonly shareOfAccount: { readonly share: string; readonly accountValue: string } | null;
  /** Contracts of all legs together, a whole number from 0. */
  readonly contracts: number | null;
}

export type SizeLimitName = 'loss-per-entry' | 'risk-per-underlying' | 'share-of-account' | 'contracts';

export interface AllowedQuantity {
  /** Units that keep every limit, 0 or more; null where there is no limit at all. */
  readonly quantity: number | null;
  /** The limit that allows fewest, the first of equals; null where there is none. */
  readonly binding: SizeLimitName | null;
  /** What each limit that was set allows on its own. */
  readonly allowed: readonly { readonly limit: SizeLimitName; readonly quantity: number }[];
}

/**
 * How many units of a structure its limits allow.
 * @param unit.greatestLoss decimal text, currency a unit with its fees, above 0; null without limit, which is refused.
 * @param unit.contracts of all legs of one unit, a whole number from 1.
 * @throws {DomainError} `loss-without-limit`; `loss-not-positive`; `unit-contracts-invalid`; `size-limit-invalid` with its name;
 *   `decimal-invalid`.
 * @see common practice; exact in decimals, rounded down.
 */
export function allowedQuantity(
  unit: { readonly greatestLoss: string | null; readonly contracts: number },
  limits: SizeLimits,
): AllowedQuantity {
  if (unit.greatestLoss === null) throw new DomainError('loss-without-limit');
  const loss = toDecimal(unit.greatestLoss);
  if (!loss.greaterThan(0)) throw new DomainError('loss-not-positive', { greatestLoss: unit.greatestLoss });
  if (!(Number.isInteger(unit.contracts) && unit.contracts >= 1))
    throw new DomainError('unit-contracts-invalid', { contracts: unit.contracts });
  const allowed: { limit: SizeLimitName; quantity: number }[] = [];
  const allow = (limit: SizeLimitName, amount: Decimal, each: Decimal) =>
    void allowed.push({ limit, quantity: Decimal.max(0, amount.dividedBy(each).floor()).toNumber() });

  const { lossPerEntry, riskPerUnderlying, shareOfAccount, contracts } = limits;
  if (lossPerEntry !== null) allow('loss-per-entry', amountOf('loss-per-entry', lossPerEntry), loss);
  if (riskPerUnderlying !== null) {
    const [limit, open] = [riskPerUnderlying.limit, riskPerUnderlying.open].map((text) =>
      amountOf('risk-per-underlying', text),
    );
    allow('risk-per-underlying', (limit ?? new Decimal(0)).minus(open ?? 0), loss);
  }
  if (shareOfAccount !== null) {
    const share = amountOf('share-of-account', shareOfAccount.share);
    if (share.greaterThan(1)) throw new DomainError('size-limit-invalid', { limit: 'share-of-account' });
    allow('share-of-account', share.times(amountOf('share-of-account', shareOfAccount.accountValue)), loss);
  }
  if (contracts !== null) {
    if (!(Number.isInteger(contracts) && contracts >= 0))
      throw new DomainError('size-limit-invalid', { limit: 'contracts', contracts });
    allow('contracts', new Decimal(contracts), new Decimal(unit.contracts));
  }
  const [first, ...others] = allowed;
  if (first === undefined) return { quantity: null, binding: null, allowed };
  const tightest = others.reduce((least, each) => (each.quantity < least.quantity ? each : least), first);
  return { quantity: tightest.quantity, binding: tightest.limit, allowed };
}

function amountOf(limit: SizeLimitName, text: string): Decimal {
  const amount = toDecimal(text);
  if (amount.isNegative()) throw new DomainError('size-limit-invalid', { limit, amount: text });
  return amount;
}
