import { type Fill } from '@/journal/fills/fill';
import { type InstrumentChange } from '@/journal/fills/instrument-change';
import { type SignedFill, signFills } from '@/journal/fills/signed-fill';
import { Decimal, type DecimalText, toDecimalText } from '@/journal/money/decimal';

/**
 * Cash that moved with one fill: -(signed quantity) x price x multiplier - fees. (Common practice.)
 * @returns currency; received is positive, paid negative.
 */
export function cashFlowOf({ signedQuantity, price, multiplier, fees }: SignedFill): Decimal {
  return signedQuantity.negated().times(price).times(multiplier).minus(fees);
}

/**
 * Cash that moved with each fill, after fees.
 * @param fills effective fills, any order. @param changes splits and other adjustments of what is held, any order.
 * @returns one amount a fill by its id, in order of effect; received is positive.
 * @throws {DomainError} as signFills.
 */
export function cashFlows(fills: readonly Fill[], changes: readonly InstrumentChange[] = []): Map<string, DecimalText> {
  return new Map(signFills(fills, changes).map((signed) => [signed.fill.id, toDecimalText(cashFlowOf(signed))]));
}

/**
 * Sum of all cash flows after fees. Once every position is flat this is the realised profit, whatever the matching method.
 * @throws {DomainError} as signFills.
 */
export function totalCashFlow(fills: readonly Fill[], changes: readonly InstrumentChange[] = []): DecimalText {
  return toDecimalText(signFills(fills, changes).reduce((sum, signed) => sum.plus(cashFlowOf(signed)), new Decimal(0)));
}
