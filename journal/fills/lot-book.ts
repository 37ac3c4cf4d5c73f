import { type ClosedLot, type OpenLot } from '@/journal/fills/lot';
import { type SignedFill } from '@/journal/fills/signed-fill';

/** The open lots of one instrument under one method of matching. */
export interface LotBook {
  /** Takes the next fill in order of effect; gives the lots it closed, in the order it closed them. */
  apply(fill: SignedFill): ClosedLot[];
  openLots(): OpenLot[];
}
