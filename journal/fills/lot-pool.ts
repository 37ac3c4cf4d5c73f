import { closedLot } from '@/journal/fills/closed-lot';
import { type ClosedLot, type LotDirection, type OpenLot } from '@/journal/fills/lot';
import { type LotBook } from '@/journal/fills/lot-book';
import { type SignedFill } from '@/journal/fills/signed-fill';
import { dealPart, startAmountSplit, undealtAmount } from '@/journal/money/amount-split';
import { Decimal, toDecimalText } from '@/journal/money/decimal';
import { roundMoney } from '@/journal/money/rounding';

/** Averages need not end (a third of a cent); they are kept to this many decimals, and the last part closed takes the rest. */
const averagePlaces = 12;

interface Pool {
  readonly direction: LotDirection;
  readonly openedAt: string;
  readonly instrument: OpenLot['instrument'];
  readonly multiplier: Decimal;
  readonly quantity: Decimal;
  /** Price x quantity x multiplier of all that is open, currency, 0 or more. */
  readonly value: Decimal;
  readonly fees: Decimal;
}

/** All that is open of one instrument at its average price and with its fees pooled. */
export class LotPool implements LotBook {
  private pool: Pool | null = null;

  apply(signed: SignedFill): ClosedLot[] {
    const direction = signed.signedQuantity.isPositive() ? 'long' : 'short';
    const quantity = signed.signedQuantity.abs();
    if (this.pool === null || this.pool.direction === direction) {
      this.add({ signed, direction, quantity, fees: signed.fees });
      return [];
    }
    const closedQuantity = Decimal.min(quantity, this.pool.quantity);
    const closeFees = dealPart(startAmountSplit({ amount: signed.fees, quantity }), closedQuantity);
    const closed = this.close({ pool: this.pool, signed, quantity: closedQuantity, closeFees: closeFees.part });
    const left = quantity.minus(closedQuantity);
    if (left.greaterThan(0)) this.add({ signed, direction, quantity: left, fees: undealtAmount(closeFees.split) });
    return [closed];
  }

  openLots(): OpenLot[] {
    if (this.pool === null) return [];
    const { instrument, direction, quantity, openedAt, fees } = this.pool;
    return [
      {
        instrument,
        direction,
        quantity: toDecimalText(quantity),
        fillId: null,
        openedAt,
        price: toDecimalText(averagePrice(this.pool)),
        fees: toDecimalText(fees),
      },
    ];
  }

  private add({
    signed,
    direction,
    quantity,
    fees,
  }: {
    signed: SignedFill;
    direction: LotDirection;
    quantity: Decimal;
    fees: Decimal;
  }) {
    const value = signed.price.times(quantity).times(signed.multiplier);
    this.pool = {
      direction,
      openedAt: this.pool?.openedAt ?? signed.fill.tradedAt,
      instrument: signed.fill.instrument,
      multiplier: signed.multiplier,
      quantity: quantity.plus(this.pool?.quantity ?? 0),
      value: value.plus(this.pool?.value ?? 0),
      fees: fees.plus(this.pool?.fees ?? 0),
    };
  }

  private close({
    pool,
    signed,
    quantity,
    closeFees,
  }: {
    pool: Pool;
    signed: SignedFill;
    quantity: Decimal;
    closeFees: Decimal;
  }) {
    const isAll = quantity.equals(pool.quantity);
    const openValue = isAll
      ? pool.value
      : roundMoney(pool.value.times(quantity).dividedBy(pool.quantity), averagePlaces);
    const openFees = dealPart(startAmountSplit({ amount: pool.fees, quantity: pool.quantity }), quantity);
    this.pool = isAll
      ? null
      : {
          ...pool,
          quantity: pool.quantity.minus(quantity),
          value: pool.value.minus(openValue),
          fees: undealtAmount(openFees.split),
        };
    return closedLot({
      direction: pool.direction,
      quantity,
      openFillId: null,
      openedAt: pool.openedAt,
      openPrice: averagePrice(pool),
      openValue,
      openFees: openFees.part,
      closing: signed,
      closeFees,
    });
  }
}

function averagePrice({ value, quantity, multiplier }: Pool): Decimal {
  return roundMoney(value.dividedBy(quantity).dividedBy(multiplier), averagePlaces);
}
