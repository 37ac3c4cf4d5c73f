import { type FillKind, type Instrument } from '@/journal/fills/fill';
import { type DecimalText } from '@/journal/money/decimal';

export type LotMethod = 'fifo' | 'lifo' | 'average';
export type LotDirection = 'long' | 'short';

/** A quantity that was opened and closed. Amounts in currency for the whole quantity. */
export interface ClosedLot {
  readonly instrument: Instrument;
  readonly direction: LotDirection;
  /** Above 0. */
  readonly quantity: DecimalText;
  /** Null at average cost, where opening fills are pooled. */
  readonly openFillId: string | null;
  readonly closeFillId: string;
  readonly closeKind: FillKind;
  /** At average cost the instant the pool began. */
  readonly openedAt: string;
  readonly closedAt: string;
  /** Per share; at average cost, and after a split or other change, rounded to 12 decimals. */
  readonly openPrice: DecimalText;
  readonly closePrice: DecimalText;
  readonly grossProfit: DecimalText;
  readonly openFees: DecimalText;
  readonly closeFees: DecimalText;
  /** Gross profit less both fees. */
  readonly realisedProfit: DecimalText;
}

/** A quantity still open. */
export interface OpenLot {
  readonly instrument: Instrument;
  readonly direction: LotDirection;
  /** Above 0. */
  readonly quantity: DecimalText;
  /** Null at average cost. */
  readonly fillId: string | null;
  readonly openedAt: string;
  /** Per share; at average cost, and after a split or other change, rounded to 12 decimals. */
  readonly price: DecimalText;
  /** Price x quantity x multiplier without rounding, currency, 0 or more: what was paid, or received when short. */
  readonly value: DecimalText;
  /** Fees of opening that no closed lot has borne yet. */
  readonly fees: DecimalText;
}
