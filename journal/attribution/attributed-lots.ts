import { type AttributedLeg, type LegEnd } from '@/journal/attribution/attributed-leg';
import { type ClosedLot } from '@/journal/fills/lot';
import { toModelNumber } from '@/journal/money/decimal';

/** What was known besides the fill at one end of a lot. */
export type KnownAtEnd = Omit<LegEnd, 'fillPrice' | 'fees'>;

/**
 * Legs to attribute from closed lots, so that the attributed profit is the realised one. At average cost an opening price may have
 * been rounded at its twelfth decimal.
 * @param lots of matchLots. @param knownAt state, middle price and volatility at the opening and the closing of a lot.
 * @throws {DomainError} `decimal-invalid`, and what `knownAt` throws.
 */
export function attributedLots(
  lots: readonly ClosedLot[],
  knownAt: (lot: ClosedLot, end: 'entry' | 'exit') => KnownAtEnd,
): AttributedLeg[] {
  return lots.map((lot, index) => ({
    legId: `${lot.openFillId ?? 'pool'} ${lot.closeFillId} ${index}`,
    instrument:
      lot.instrument.kind === 'stock'
        ? { kind: 'stock' }
        : { kind: 'option', type: lot.instrument.type, strikePrice: toModelNumber(lot.instrument.strikePrice) },
    signedQuantity: lot.direction === 'long' ? lot.quantity : `-${lot.quantity}`,
    multiplier: lot.instrument.multiplier,
    entry: { ...knownAt(lot, 'entry'), fillPrice: lot.openPrice, fees: lot.openFees },
    exit: { ...knownAt(lot, 'exit'), fillPrice: lot.closePrice, fees: lot.closeFees },
  }));
}
