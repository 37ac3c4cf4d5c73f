import { closedLot } from '@/journal/fills/closed-lot';
import { type Instrument } from '@/journal/fills/fill';
import { type ClosedLot, type LotDirection, type OpenLot } from '@/journal/fills/lot';
import { type CarriedLot, type LotBook } from '@/journal/fills/lot-book';
import { AVERAGE_PLACES, averagePrice } from '@/journal/fills/lot-value';
import { type SignedFill } from '@/journal/fills/signed-fill';
import { type AmountSplit, dealPart, startAmountSplit, undealtAmount } from '@/journal/money/amount-split';
import { type Decimal, toDecimalText } from '@/journal/money/decimal';

interface QueuedLot {
  readonly instrument: Instrument;
  readonly multiplier: Decimal;
  readonly direction: LotDirection;
  readonly openFillId: string | null;
  readonly openedAt: string;
  readonly price: Decimal;
  quantity: Decimal;
  fees: AmountSplit;
  /** After a change of the instrument, whose price need not end; else null, and the value is price x quantity. */
  value: AmountSplit | null;
}

/** The lots of one instrument, closed oldest first (FIFO) or newest first (LIFO). All open lots have one direction. */
export class LotQueue implements LotBook {
  private lots: QueuedLot[] = [];
  /** Lots before this one are used up; moving it is cheaper than shifting a long array. */
  private oldest = 0;

  constructor(private readonly order: 'fifo' | 'lifo') {}

  apply(closing: SignedFill): ClosedLot[] {
    const closed: ClosedLot[] = [];
    const direction = directionOf(closing);
    let left = closing.signedQuantity.abs();
    let closeFees = startAmountSplit({ amount: closing.fees, quantity: left });
    while (left.greaterThan(0)) {
      const lot = this.next();
      if (lot === undefined || lot.direction === direction) break;
      const quantity = left.lessThan(lot.quantity) ? left : lot.quantity;
      const opened = dealPart(lot.fees, quantity);
      const ended = dealPart(closeFees, quantity);
      closed.push(
        closedLot({
          direction: lot.direction,
          quantity,
          openFillId: lot.openFillId,
          openedAt: lot.openedAt,
          openPrice: lot.price,
          openValue: takeValue(lot, quantity),
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
    if (left.greaterThan(0)) this.open(closing, { direction, quantity: left, fees: closeFees });
    return closed;
  }

  openLots(): OpenLot[] {
    return this.lots.slice(this.oldest).map((lot) => ({
      instrument: lot.instrument,
      direction: lot.direction,
      quantity: toDecimalText(lot.quantity),
      fillId: lot.openFillId,
      openedAt: lot.openedAt,
      price: toDecimalText(lot.price),
      value: toDecimalText(valueLeft(lot)),
      fees: toDecimalText(undealtAmount(lot.fees)),
    }));
  }

  carryOut(): CarriedLot[] {
    const carried = this.lots.slice(this.oldest).map((lot) => ({
      direction: lot.direction,
      openFillId: lot.openFillId,
      openedAt: lot.openedAt,
      quantity: lot.quantity,
      value: valueLeft(lot),
      fees: undealtAmount(lot.fees),
    }));
    [this.lots, this.oldest] = [[], 0];
    return carried;
  }

  carryIn(lots: readonly CarriedLot[], into: { readonly instrument: Instrument; readonly multiplier: Decimal }): void {
    const taken = lots.map(({ direction, openFillId, openedAt, quantity, value, fees }): QueuedLot => ({
      ...into,
      direction,
      openFillId,
      openedAt,
      price: averagePrice({ value, quantity, multiplier: into.multiplier }),
      quantity,
      fees: startAmountSplit({ amount: fees, quantity }),
      value: startAmountSplit({ amount: value, quantity, places: AVERAGE_PLACES }),
    }));
    this.lots = [...this.lots.slice(this.oldest), ...taken].sort(
      (one, other) => Date.parse(one.openedAt) - Date.parse(other.openedAt),
    );
    this.oldest = 0;
  }

  private open(
    { fill, multiplier, price }: SignedFill,
    { direction, quantity, fees }: Pick<QueuedLot, 'direction' | 'quantity' | 'fees'>,
  ): void {
    this.lots.push({
      instrument: fill.instrument,
      multiplier,
      direction,
      openFillId: fill.id,
      openedAt: fill.tradedAt,
      price,
      quantity,
      fees,
      value: null,
    });
  }

  private next(): QueuedLot | undefined {
    return this.order === 'fifo' ? this.lots[this.oldest] : this.lots.at(-1);
  }

  private remove(): void {
    if (this.order === 'fifo') this.oldest += 1;
    else this.lots.pop();
  }
}

/** Takes the value of a quantity out of a lot. */
function takeValue(lot: QueuedLot, quantity: Decimal): Decimal {
  if (lot.value === null) return lot.price.times(quantity).times(lot.multiplier);
  const { part, split } = dealPart(lot.value, quantity);
  lot.value = split;
  return part;
}

function valueLeft({ value, price, quantity, multiplier }: QueuedLot): Decimal {
  return value === null ? price.times(quantity).times(multiplier) : undealtAmount(value);
}

function directionOf({ signedQuantity }: SignedFill): LotDirection {
  return signedQuantity.isPositive() ? 'long' : 'short';
}
