import { closedLot } from '@/journal/fills/closed-lot';
import { type Instrument } from '@/journal/fills/fill';
import { type ClosedLot, type LotDirection, type OpenLot } from '@/journal/fills/lot';
import { type CarriedLot, type LotBook } from '@/journal/fills/lot-book';
import { AVERAGE_PLACES, averagePrice } from '@/journal/fills/lot-value';
import { type SignedFill } from '@/journal/fills/signed-fill';
import { dealPart, startAmountSplit, undealtAmount } from '@/journal/money/amount-split';
import { type Decimal, toDecimalText } from '@/journal/money/decimal';
import { roundMoney } from '@/journal/money/rounding';

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
      this.open(signed, { direction, quantity, fees: signed.fees });
      return [];
    }
    const closedQuantity = quantity.lessThan(this.pool.quantity) ? quantity : this.pool.quantity;
    const closeFees = dealPart(startAmountSplit({ amount: signed.fees, quantity }), closedQuantity);
    const closed = this.close({ pool: this.pool, signed, quantity: closedQuantity, closeFees: closeFees.part });
    const left = quantity.minus(closedQuantity);
    if (left.greaterThan(0)) this.open(signed, { direction, quantity: left, fees: undealtAmount(closeFees.split) });
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
        value: toDecimalText(this.pool.value),
        fees: toDecimalText(fees),
      },
    ];
  }

  carryOut(): CarriedLot[] {
    if (this.pool === null) return [];
    const { direction, openedAt, quantity, value, fees } = this.pool;
    this.pool = null;
    return [{ direction, openFillId: null, openedAt, quantity, value, fees }];
  }

  carryIn(lots: readonly CarriedLot[], into: { readonly instrument: Instrument; readonly multiplier: Decimal }): void {
    for (const { direction, openedAt, quantity, value, fees } of lots) {
      this.add({ ...into, direction, openedAt, quantity, value, fees });
    }
  }

  private open({ fill, multiplier, price }: SignedFill, part: Pick<Pool, 'direction' | 'quantity' | 'fees'>): void {
    const value = price.times(part.quantity).times(multiplier);
    this.add({ ...part, instrument: fill.instrument, multiplier, openedAt: fill.tradedAt, value });
  }

  private add(more: Pool): void {
    const { pool } = this;
    this.pool =
      pool === null
        ? more
        : {
            ...more,
            openedAt: Date.parse(more.openedAt) < Date.parse(pool.openedAt) ? more.openedAt : pool.openedAt,
            quantity: pool.quantity.plus(more.quantity),
            value: pool.value.plus(more.value),
            fees: pool.fees.plus(more.fees),
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
      : roundMoney(pool.value.times(quantity).dividedBy(pool.quantity), AVERAGE_PLACES);
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
