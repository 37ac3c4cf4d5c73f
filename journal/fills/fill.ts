import { type OptionContract } from '@/journal/contracts/option-contract';
import { type DecimalText } from '@/journal/money/decimal';

/**
 * What happened to the position. 'buy' and 'sell' are trades. The other three end an open option: 'expiry' either side,
 * 'assignment' a short one, 'exercise' a long one; their side follows from the position they close.
 */
export type FillKind = 'buy' | 'sell' | 'expiry' | 'assignment' | 'exercise';

/** What one contract of an adjusted series delivers: no longer as many shares of its own underlying as its price is multiplied by. */
export interface Deliverable {
  readonly symbol: string;
  /** Above 0. */
  readonly sharesPerContract: DecimalText;
  /** Currency delivered beside the shares, 0 or more. */
  readonly cashPerContract: DecimalText;
}

export interface OptionInstrument extends OptionContract {
  readonly kind: 'option';
  /**
   * Shares, or currency per point, that one contract's price is multiplied by; decimal text above 0. The strike is multiplied by it
   * too, whatever is delivered.
   */
  readonly multiplier: DecimalText;
  /** Only of an adjusted series; else as many shares of the underlying as the multiplier says. */
  readonly deliverable?: Deliverable;
}
export interface StockInstrument {
  readonly kind: 'stock';
  readonly symbol: string;
  readonly multiplier: '1';
}
export type Instrument = OptionInstrument | StockInstrument;

/** One execution, or one ending of an option, as it took effect. */
export interface Fill {
  readonly id: string;
  readonly kind: FillKind;
  readonly instrument: Instrument;
  /** Contracts or shares, above 0. */
  readonly quantity: DecimalText;
  /**
   * Currency per share, 0 or more. An option that ends worthless, or by delivery of shares, ends at 0; one that is settled in
   * cash ends at its settlement value per share.
   */
  readonly price: DecimalText;
  /** Currency for the whole fill; a rebate is negative. */
  readonly fees: DecimalText;
  /** UTC, ISO 8601 with milliseconds. */
  readonly tradedAt: string;
  /** Order among fills of the same instant. */
  readonly sequence: number;
}
