import { type PlannedLeg } from '@/journal/contracts/planned-leg';

/** Shares of the underlying held beside the options of a structure. */
export interface StockLeg {
  readonly id: string;
  readonly side: 'buy' | 'sell';
  readonly type: 'shares';
  /** Shares, a whole number from 1. */
  readonly quantity: number;
  /** Decimal text, above 0, per share: what they were or will be bought or sold at. */
  readonly price: string;
}

export type StructureLeg = PlannedLeg | StockLeg;

export function isStockLeg(leg: StructureLeg): leg is StockLeg {
  return leg.type === 'shares';
}
