/** One contract line of a structure, as planned. */
export interface PlannedLeg {
  readonly id: string;
  readonly side: 'buy' | 'sell';
  readonly type: 'call' | 'put';
  /** Decimal text, above 0, per share. */
  readonly strikePrice: string;
  /** 'YYYY-MM-DD', a session of the exchange's calendar. */
  readonly expirySessionDate: string;
  /** Contracts, a whole number from 1. */
  readonly quantity: number;
  /** Decimal text, 0 or more, per share: what the trader expects to pay or receive. */
  readonly premium: string;
}
