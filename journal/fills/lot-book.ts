import { type ClosedLot, type LotDirection, type OpenLot } from '@/journal/fills/lot';
import { type Instrument } from '@/journal/fills/fill';
import { type SignedFill } from '@/journal/fills/signed-fill';
import { type Decimal } from '@/journal/money/decimal';

/** An open lot on its way from one instrument to what that became. */
export interface CarriedLot {
  readonly direction: LotDirection;
  readonly openFillId: string | null;
  readonly openedAt: string;
  /** Above 0. */
  readonly quantity: Decimal;
  /** Price x quantity x multiplier, currency, 0 or more. */
  readonly value: Decimal;
  readonly fees: Decimal;
}

/** The open lots of one instrument under one method of matching. */
export interface LotBook {
  /** Takes the next fill in order of effect; gives the lots it closed, in the order it closed them. */
  apply(fill: SignedFill): ClosedLot[];
  /** In the order they were opened. */
  openLots(): OpenLot[];
  /** Hands over all open lots, in the order they were opened. */
  carryOut(): CarriedLot[];
  /** Takes over lots of what became this instrument. Their direction is that of the lots already there. */
  carryIn(lots: readonly CarriedLot[], into: { readonly instrument: Instrument; readonly multiplier: Decimal }): void;
}
