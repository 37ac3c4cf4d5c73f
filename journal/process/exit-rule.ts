import { type FillKind } from '@/journal/fills/fill';
import { type DecimalText } from '@/journal/money/decimal';

/** A level at which a plan said it would be left. */
export interface ExitRule {
  /** Of the underlying, or the net price per share at which the structure is closed. */
  readonly basis: 'underlying' | 'net-price';
  readonly level: DecimalText;
  /** The side on which the rule holds. */
  readonly heldWhen: 'at-or-above' | 'at-or-below';
  /** Where the price stood when the plan was made: the distance to the level is the measure of how far it was overrun. */
  readonly startLevel: DecimalText;
}

/** From and to included; UTC, ISO 8601 with milliseconds. */
export interface ExitWindow {
  readonly from: string;
  readonly to: string;
}

export interface ExitRules {
  readonly target: ExitRule | null;
  readonly stop: ExitRule | null;
  /** When the plan would be left by the clock; null when it holds to expiry. */
  readonly time: ExitWindow | null;
  /** When it would be left ahead of an event. */
  readonly event: ExitWindow | null;
  /** First instant of the session in which the options expire. */
  readonly expiryOpensAt: string;
}

/** How the position was left. */
export interface ActualExit {
  readonly kind: FillKind;
  readonly at: string;
  /** Price of the underlying and net closing price per share at that time; null where it was not noted. */
  readonly underlyingPrice: DecimalText | null;
  readonly netPrice: DecimalText | null;
}

export type ExitTag = 'target' | 'stop' | 'time' | 'event' | 'expiry' | 'unplanned';
