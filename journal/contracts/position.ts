import { type PlannedLeg } from '@/journal/contracts/planned-leg';
import { Decimal, toDecimal, toModelNumber } from '@/journal/money/decimal';

/** A leg as the model sees it. */
export interface ModelLeg {
  readonly legId: string;
  readonly type: 'call' | 'put';
  readonly strikePrice: number;
  /** Contracts times multiplier, positive when bought: currency of profit per currency of the option's price. */
  readonly signedShares: number;
  readonly premium: number;
}

/** A structure as the model sees it: its legs and what opening it costs. */
export interface ModelPosition {
  readonly legs: readonly ModelLeg[];
  /** Premiums and opening fees, currency; negative when more is received. */
  readonly costToOpen: number;
  /** Currency. */
  readonly feesToClose: number;
}

export interface OpeningCost {
  /** Paid is positive, received negative; currency. */
  readonly netPremium: Decimal;
  readonly feesToOpen: Decimal;
  readonly feesToClose: Decimal;
}

/**
 * What opening and closing a structure costs, exactly.
 * @param question.multiplier decimal text, shares a contract; `feePerContract` decimal text, per contract and side.
 * @throws {DomainError} `decimal-invalid`.
 */
export function openingCost(
  legs: readonly PlannedLeg[],
  { multiplier, feePerContract }: { readonly multiplier: string; readonly feePerContract: string },
): OpeningCost {
  const zero = new Decimal(0);
  const netPremium = legs.reduce((sum, leg) => {
    const amount = toDecimal(leg.premium).times(leg.quantity).times(toDecimal(multiplier));
    return leg.side === 'buy' ? sum.plus(amount) : sum.minus(amount);
  }, zero);
  const contracts = legs.reduce((sum, leg) => sum + leg.quantity, 0);
  const fees = toDecimal(feePerContract).times(contracts);
  return { netPremium, feesToOpen: fees, feesToClose: fees };
}

/** Crosses from a plan's exact texts to the model's doubles, once. @throws {DomainError} `decimal-invalid`. */
export function modelPosition(legs: readonly PlannedLeg[], multiplier: string, cost: OpeningCost): ModelPosition {
  const shares = toModelNumber(multiplier);
  return {
    legs: legs.map((leg) => ({
      legId: leg.id,
      type: leg.type,
      strikePrice: toModelNumber(leg.strikePrice),
      signedShares: (leg.side === 'buy' ? 1 : -1) * leg.quantity * shares,
      premium: toModelNumber(leg.premium),
    })),
    costToOpen: cost.netPremium.plus(cost.feesToOpen).toNumber(),
    feesToClose: cost.feesToClose.toNumber(),
  };
}
