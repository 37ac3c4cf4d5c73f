import { type PlannedLeg } from '@/journal/contracts/planned-leg';
import { type Fill } from '@/journal/fills/fill';
import { instrumentKey } from '@/journal/fills/instrument-key';
import { signFills } from '@/journal/fills/signed-fill';
import { Decimal, type DecimalText, toDecimalText } from '@/journal/money/decimal';

export interface LegSize {
  /** Null for a series that the plan does not have. */
  readonly legId: string | null;
  /** Contracts, long positive; '0' for a series that the plan does not have. */
  readonly planned: DecimalText;
  /** The greatest position ever held on the planned side, or on either side of an unplanned series. */
  readonly greatest: DecimalText;
  readonly isWithin: boolean;
}

/** Whether no series was ever held larger than planned, on the other side, or without being in the plan. Shares are left out. */
export interface SizeWithinPlan {
  readonly isWithin: boolean;
  readonly legs: readonly LegSize[];
}

interface Series {
  readonly legId: string | null;
  planned: Decimal;
  open: Decimal;
  mostLong: Decimal;
  mostShort: Decimal;
}

/**
 * Holds the positions that were built against the planned ones.
 * @param plan.symbol of the underlying. @param fills effective fills, any order.
 * @throws {DomainError} as signFills.
 */
export function sizeWithinPlan(
  plan: { readonly symbol: string; readonly multiplier: DecimalText; readonly legs: readonly PlannedLeg[] },
  fills: readonly Fill[],
): SizeWithinPlan {
  const zero = new Decimal(0);
  const series = new Map<string, Series>();
  for (const leg of plan.legs) {
    const key = instrumentKey({
      ...leg,
      kind: 'option',
      underlyingSymbol: plan.symbol,
      multiplier: plan.multiplier,
    });
    const known = series.get(key) ?? { legId: leg.id, planned: zero, open: zero, mostLong: zero, mostShort: zero };
    known.planned = known.planned.plus(leg.side === 'buy' ? leg.quantity : -leg.quantity);
    series.set(key, known);
  }
  for (const { fill, key, signedQuantity } of signFills(fills)) {
    if (fill.instrument.kind === 'stock') continue;
    const known = series.get(key) ?? { legId: null, planned: zero, open: zero, mostLong: zero, mostShort: zero };
    known.open = known.open.plus(signedQuantity);
    known.mostLong = Decimal.max(known.mostLong, known.open);
    known.mostShort = Decimal.min(known.mostShort, known.open);
    series.set(key, known);
  }
  const legs = [...series.values()].map(legSize);
  return { isWithin: legs.every(({ isWithin }) => isWithin), legs };
}

function legSize({ legId, planned, mostLong, mostShort }: Series): LegSize {
  const isLong = planned.isZero() ? mostLong.greaterThanOrEqualTo(mostShort.abs()) : planned.isPositive();
  return {
    legId,
    planned: toDecimalText(planned),
    greatest: toDecimalText(isLong ? mostLong : mostShort),
    isWithin:
      mostLong.lessThanOrEqualTo(Decimal.max(planned, 0)) && mostShort.greaterThanOrEqualTo(Decimal.min(planned, 0)),
  };
}
