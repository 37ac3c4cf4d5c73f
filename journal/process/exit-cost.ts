import { DomainError } from '@/journal/errors/domain-error';
import { type DecimalText, toDecimal, toDecimalText } from '@/journal/money/decimal';
import { roundMoney } from '@/journal/money/rounding';
import { type ExchangeCalendar } from '@/journal/sessions/exchange-calendar';
import { type ClockSettings, sessionsBetween } from '@/journal/sessions/session-clock';

export interface ExitAgainstRule {
  /** Net price per share at which the rule would have closed, and at which it was closed. */
  readonly rulePrice: DecimalText;
  readonly exitPrice: DecimalText;
  readonly entryPrice: DecimalText;
  /** Shares of the structure: units times multiplier; positive when it was bought, negative when it was sold. */
  readonly signedShares: DecimalText;
}

export interface ExitCost {
  /** Before fees, currency. */
  readonly profitByRule: DecimalText;
  readonly profit: DecimalText;
  /** What leaving the rule cost; negative when it paid. It judges the rule's follower, not the rule. */
  readonly cost: DecimalText;
}

/**
 * What it cost to close elsewhere than the rule said.
 * @returns amounts before fees, half-even to cents.
 * @throws {DomainError} `decimal-invalid`, `quantity-zero`.
 * @see common practice.
 */
export function exitCost({ rulePrice, exitPrice, entryPrice, signedShares }: ExitAgainstRule): ExitCost {
  const shares = toDecimal(signedShares);
  if (shares.isZero()) throw new DomainError('quantity-zero', { signedShares });
  const profitAt = (price: DecimalText) => roundMoney(toDecimal(price).minus(toDecimal(entryPrice)).times(shares));
  const [profitByRule, profit] = [profitAt(rulePrice), profitAt(exitPrice)];
  return {
    profitByRule: toDecimalText(profitByRule),
    profit: toDecimalText(profit),
    cost: toDecimalText(profitByRule.minus(profit)),
  };
}

/**
 * Sessions from the moment a rule held to the exit; 0 when the exit was not later.
 * @throws {DomainError} as sessionsBetween.
 */
export function exitDelay(question: {
  readonly calendar: ExchangeCalendar;
  readonly settings: ClockSettings;
  readonly ruleHeldAt: string;
  readonly exitAt: string;
}): number {
  const { calendar, settings, ruleHeldAt, exitAt } = question;
  return sessionsBetween({ calendar, settings, from: ruleHeldAt, to: exitAt });
}
