import { type AttributedLeg, type LegEnd } from '@/journal/attribution/attributed-leg';
import { type ClosedLot } from '@/journal/fills/lot';
import { toModelNumber } from '@/journal/money/decimal';

/** What was known besides the fill at one end of a lot. */
export type KnownAtEnd = Omit<LegEnd, 'fillPrice' | 'fees'>;

/**
 * The leg to attribute of a closed lot, so that the attributed profit is the realised one. At average cost an opening price may have
 * been rounded at its twelfth decimal.
 * @param known state, middle price and volatility at the opening and the closing of the lot.
 * @throws {DomainError} `decimal-invalid`.
 */
export function attributedLot(
  lot: ClosedLot,
  { legId, entry, exit }: { readonly legId: string; readonly entry: KnownAtEnd; readonly exit: KnownAtEnd },
): AttributedLeg {
  const { instrument } = lot;
  return {
    legId,
    instrument:
      instrument.kind === 'stock'
        ? { kind: 'stock' }
        : { kind: 'option', type: instrument.type, strikePrice: toModelNumber(instrument.strikePrice) },
    signedQuantity: lot.direction === 'long' ? lot.quantity : `-${lot.quantity}`,
    multiplier: instrument.multiplier,
    entry: { ...entry, fillPrice: lot.openPrice, fees: lot.openFees },
    exit: { ...exit, fillPrice: lot.closePrice, fees: lot.closeFees },
  };
}
