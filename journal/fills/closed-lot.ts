import { type ClosedLot, type LotDirection } from '@/journal/fills/lot';
import { type SignedFill } from '@/journal/fills/signed-fill';
import { type Decimal, toDecimalText } from '@/journal/money/decimal';

export interface LotClosing {
  readonly direction: LotDirection;
  /** Above 0. */
  readonly quantity: Decimal;
  readonly openFillId: string | null;
  readonly openedAt: string;
  /** Per share. */
  readonly openPrice: Decimal;
  /** Currency for the quantity; not always openPrice x quantity, since an average price may not end. */
  readonly openValue: Decimal;
  readonly openFees: Decimal;
  readonly closing: SignedFill;
  readonly closeFees: Decimal;
}

/** Works out a closed lot's profit: what was sold for less what was bought for, and less the fees of both ends. */
export function closedLot(lot: LotClosing): ClosedLot {
  const { fill, price, multiplier } = lot.closing;
  const closeValue = price.times(lot.quantity).times(multiplier);
  const gain = closeValue.minus(lot.openValue);
  const grossProfit = lot.direction === 'long' ? gain : gain.negated();
  return {
    instrument: fill.instrument,
    direction: lot.direction,
    quantity: toDecimalText(lot.quantity),
    openFillId: lot.openFillId,
    closeFillId: fill.id,
    closeKind: fill.kind,
    openedAt: lot.openedAt,
    closedAt: fill.tradedAt,
    openPrice: toDecimalText(lot.openPrice),
    closePrice: toDecimalText(price),
    grossProfit: toDecimalText(grossProfit),
    openFees: toDecimalText(lot.openFees),
    closeFees: toDecimalText(lot.closeFees),
    realisedProfit: toDecimalText(grossProfit.minus(lot.openFees).minus(lot.closeFees)),
  };
}
