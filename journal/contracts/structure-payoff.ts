import { expiryPayoff, type ExpiryPayoff } from '@/journal/contracts/expiry-payoff';
import { isStockLeg, type StructureLeg } from '@/journal/contracts/structure-leg';
import { DomainError } from '@/journal/errors/domain-error';
import { Decimal, toDecimal, toModelNumber } from '@/journal/money/decimal';

/** What one contract is: what its premium and strike are multiplied by, and what exercising it delivers. Decimal texts. */
export interface ContractTerms {
  /** Above 0: premium and strike times this are currency. */
  readonly premiumMultiplier: string;
  /** Shares of the underlying delivered, above 0; another number than the multiplier once a contract was adjusted. */
  readonly deliverableShares: string;
  /** Currency delivered with the shares, 0 or more. */
  readonly deliverableCash: string;
}

export interface StructureCosts {
  /** Decimal text, per contract and side, 0 or more. */
  readonly feePerContract: string;
  /** Decimal text, per share and side, 0 or more. */
  readonly feePerShare: string;
}

/**
 * What opening a structure costs, fees included.
 * @returns currency, negative when received.
 * @throws {DomainError} `decimal-invalid`.
 */
export function costToOpen(
  legs: readonly StructureLeg[],
  { premiumMultiplier }: Pick<ContractTerms, 'premiumMultiplier'>,
  { feePerContract, feePerShare }: StructureCosts,
): Decimal {
  return legs.reduce((sum, leg) => {
    const [price, times, fee] = isStockLeg(leg)
      ? [toDecimal(leg.price), new Decimal(1), toDecimal(feePerShare)]
      : [toDecimal(leg.premium), toDecimal(premiumMultiplier), toDecimal(feePerContract)];
    const amount = price.times(leg.quantity).times(times);
    return sum.plus(leg.side === 'buy' ? amount : amount.negated()).plus(fee.times(leg.quantity));
  }, new Decimal(0));
}

/**
 * Exact pay-off at expiry of options of one expiry with shares, after the fees of opening. An adjusted contract pays what its
 * deliverable is worth beyond its exercise amount: the same straight lines, bent where shares × price + cash = strike × multiplier.
 * @throws {DomainError} `legs-missing`; `legs-of-several-expiries` with the leg's index; `contract-terms-invalid`; `decimal-invalid`;
 *   `payoff-input-invalid`.
 * @see expiryPayoff; adjusted deliverables: rules of the US options clearing house (from memory).
 */
export function structurePayoff(
  legs: readonly StructureLeg[],
  terms: ContractTerms,
  costs: StructureCosts,
): ExpiryPayoff {
  if (legs.length === 0) throw new DomainError('legs-missing');
  const expiry = legs.find((leg) => !isStockLeg(leg))?.expirySessionDate;
  const other = legs.findIndex((leg) => !isStockLeg(leg) && leg.expirySessionDate !== expiry);
  if (other >= 0) throw new DomainError('legs-of-several-expiries', { legIndex: other });
  const signOf = ({ side }: StructureLeg) => (side === 'buy' ? 1 : -1);
  return expiryPayoff({
    legs: legs.flatMap((leg) =>
      isStockLeg(leg)
        ? []
        : [
            {
              type: leg.type,
              strikePrice: bendPrice(leg.strikePrice, terms),
              signedShares: signOf(leg) * leg.quantity * toModelNumber(terms.deliverableShares),
            },
          ],
    ),
    shares: legs.reduce((sum, leg) => (isStockLeg(leg) ? sum + signOf(leg) * leg.quantity : sum), 0),
    cost: costToOpen(legs, terms, costs).toNumber(),
  });
}

/** The price of one share at which exercising is worth nothing. */
function bendPrice(strikePrice: string, terms: ContractTerms): number {
  const [multiplier, shares, cash] = [
    toDecimal(terms.premiumMultiplier),
    toDecimal(terms.deliverableShares),
    toDecimal(terms.deliverableCash),
  ];
  const isValid = multiplier.greaterThan(0) && shares.greaterThan(0) && !cash.isNegative();
  const bend = isValid ? toDecimal(strikePrice).times(multiplier).minus(cash).dividedBy(shares) : new Decimal(0);
  if (!bend.greaterThan(0)) throw new DomainError('contract-terms-invalid', { ...terms, strikePrice });
  return bend.toNumber();
}
