import { type ClosedLot, type LotDirection, type OpenLot } from '@/journal/fills/lot';
import { type LotBook } from '@/journal/fills/lot-book';
import { closedLot } from '@/journal/fills/closed-lot';
import { type SignedFill } from '@/journal/fills/signed-fill';
import { type AmountSplit, dealPart, startAmountSplit, undealtAmount } from '@/journal/money/amount-split';
import { Decimal, toDecimalText } from '@/journal/money/decimal';

interface QueuedLot {
  readonly opening: SignedFill;
  quantity: Decimal;
  fees: AmountSplit;
}

/** The lots of one instrument, closed oldest first (FIFO) or newest first (LIFO). All open lots have one direction. */
export class LotQueue implements LotBook {
  private readonly lots: QueuedLot[] = [];
  /** Lots before this one are used up; moving it is cheaper than shifting a long array. */
  private oldest = 0;

  constructor(private readonly order: 'fifo' | 'lifo') {}

  apply(closing: SignedFill): ClosedLot[] {
    const closed: ClosedLot[] = [];
    let left = closing.signedQuantity.abs();
    let closeFees = startAmountSplit({ amount: closing.fees, quantity: left });
    while (left.greaterThan(0)) {
      const lot = this.next();
      if (lot === undefined || isSameSide(lot.opening, closing)) break;
      const quantity = Decimal.min(left, lot.quantity);
      const opened = dealPart(lot.fees, quantity);
      const ended = dealPart(closeFees, quantity);
      const { multiplier, price, fill } = lot.opening;
      closed.push(
        closedLot({
          direction: directionOf(lot.opening),
          quantity,
          openFillId: fill.id,
          openedAt: fill.tradedAt,
          openPrice: price,
          openValue: price.times(quantity).times(multiplier),
          openFees: opened.part,
          closing,
          closeFees: ended.part,
        }),
      );
      lot.fees = opened.split;
      closeFees = ended.split;
      lot.quantity = lot.quantity.minus(quantity);
      left = left.minus(quantity);
      if (lot.quantity.isZero()) this.remove();
    }
    // What closed nothing opens: the fill's remaining fees go with it.
    if (left.greaterThan(0)) this.lots.push({ opening: closing, quantity: left, fees: closeFees });
    return closed;
  }

  openLots(): OpenLot[] {
    return this.lots.slice(this.oldest).map(({ opening, quantity, fees }) => ({
      instrument: opening.fill.instrument,
      direction: directionOf(opening),
      quantity: toDecimalText(quantity),
      fillId: opening.fill.id,
      openedAt: opening.fill.tradedAt,
      price: toDecimalText(opening.price),
      fees: toDecimalText(undealtAmount(fees)),
    }));
  }

  private next(): QueuedLot | undefined {
    return this.order === 'fifo' ? this.lots[this.oldest] : this.lots.at(-1);
  }

  private remove(): void {
    if (this.order === 'fifo') this.oldest += 1;
    else this.lots.pop();
  }
}

function isSameSide(one: SignedFill, other: SignedFill): boolean {
  return one.signedQuantity.isPositive() === other.signedQuantity.isPositive();
}

function directionOf(opening: SignedFill): LotDirection {
  return opening.signedQuantity.isPositive() ? 'long' : 'short';
}
