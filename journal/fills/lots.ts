import { changeLots } from '@/journal/fills/change-lots';
import { cashFlowOf } from '@/journal/fills/cash-flow';
import { type Fill } from '@/journal/fills/fill';
import { type ClosedLot, type LotMethod, type OpenLot } from '@/journal/fills/lot';
import { type LotBook } from '@/journal/fills/lot-book';
import { LotPool } from '@/journal/fills/lot-pool';
import { LotQueue } from '@/journal/fills/lot-queue';
import { type InstrumentChange } from '@/journal/fills/instrument-change';
import { signEvents } from '@/journal/fills/signed-fill';
import { Decimal, type DecimalText, toDecimal, toDecimalText } from '@/journal/money/decimal';

export interface MatchedLots {
  /** In the order they were closed. */
  readonly closed: readonly ClosedLot[];
  /** By instrument in order of first trade; within one, oldest first. */
  readonly open: readonly OpenLot[];
  /** Sum over the closed lots, after their fees, currency. Not a tax figure. */
  readonly realisedProfit: DecimalText;
  /** Fees of all fills, open and closed. */
  readonly fees: DecimalText;
  /** Sum of all cash flows after fees; equals realisedProfit when nothing is open. */
  readonly cashFlow: DecimalText;
}

/**
 * Matches what closed with what opened, instrument by instrument. A fill larger than the position closes it and opens the rest the
 * other way. Fees of a fill that is matched in parts are split to the cent without loss (journal/money/amount-split).
 * @param fills effective fills, any order, any number of instruments in one currency.
 * @param options.method 'fifo' oldest lot first, 'lifo' newest first, 'average' all at the average price of what is open.
 * @param options.changes splits, symbol changes and other adjustments of what is held, any order.
 * @throws {DomainError} as signEvents.
 */
export function matchLots(
  fills: readonly Fill[],
  { method, changes = [] }: { method: LotMethod; changes?: readonly InstrumentChange[] },
): MatchedLots {
  const books = new Map<string, LotBook>();
  const closed: ClosedLot[] = [];
  let fees = new Decimal(0);
  let cashFlow = new Decimal(0);
  const bookOf = (key: string): LotBook => {
    const book = books.get(key) ?? (method === 'average' ? new LotPool() : new LotQueue(method));
    books.set(key, book);
    return book;
  };
  for (const signed of signEvents(fills, changes)) {
    if (signed.kind === 'change') {
      const { to } = signed.change;
      const carried = changeLots(bookOf(signed.fromKey).carryOut(), signed);
      bookOf(signed.toKey).carryIn(carried, { instrument: to, multiplier: toDecimal(to.multiplier) });
      continue;
    }
    for (const lot of bookOf(signed.key).apply(signed)) closed.push(lot);
    fees = fees.plus(signed.fees);
    cashFlow = cashFlow.plus(cashFlowOf(signed));
  }
  const realisedProfit = closed.reduce((sum, lot) => sum.plus(toDecimal(lot.realisedProfit)), new Decimal(0));
  return {
    closed,
    open: [...books.values()].flatMap((book) => book.openLots()),
    realisedProfit: toDecimalText(realisedProfit),
    fees: toDecimalText(fees),
    cashFlow: toDecimalText(cashFlow),
  };
}
