import { type Fill, type Instrument } from '@/journal/fills/fill';
import { type LotMethod } from '@/journal/fills/lot';

/** A fill in whole numbers: prices in 1/10,000 of currency, fees in cents, bought positive. */
export interface WholeFill {
  readonly fill: Fill;
  readonly book: number;
  readonly multiplier: bigint;
  readonly signedQuantity: bigint;
  readonly price: bigint;
  readonly fees: bigint;
}

/** Amounts below are in units of 1e-12 of currency. */
export const UNITS_A_CENT = 10_000_000_000n;
const UNITS_A_PRICE_STEP = 100_000_000n;

interface WholeLot {
  readonly sign: bigint;
  readonly total: bigint;
  readonly fees: bigint;
  left: bigint;
  feesGiven: bigint;
  readonly unitValue: bigint;
}

interface WholePool {
  sign: bigint;
  quantity: bigint;
  value: bigint;
  fees: bigint;
}

export interface WholeTotals {
  readonly realised: bigint;
  readonly cash: bigint;
  readonly fees: bigint;
  /** Cash of what is open: paid for longs negative, received for shorts positive, less fees not yet borne. */
  readonly open: bigint;
  readonly openQuantity: bigint;
}

const absolute = (value: bigint) => (value < 0n ? -value : value);
const least = (one: bigint, other: bigint) => (one < other ? one : other);

/** amount x part / whole, half to even. */
function evenShare(amount: bigint, part: bigint, whole: bigint): bigint {
  const doubled = 2n * absolute(amount) * part;
  const floor = doubled / (2n * whole);
  const rest = doubled % (2n * whole);
  const isUp = rest > whole || (rest === whole && floor % 2n === 1n);
  return (amount < 0n ? -1n : 1n) * (floor + (isUp ? 1n : 0n));
}

function bear(lot: WholeLot, quantity: bigint): bigint {
  lot.left -= quantity;
  const given = evenShare(lot.fees, lot.total - lot.left, lot.total);
  const part = given - lot.feesGiven;
  lot.feesGiven = given;
  return part;
}

function lotOf({ signedQuantity, price, fees, multiplier }: WholeFill): WholeLot {
  const total = absolute(signedQuantity);
  const unitValue = price * multiplier * UNITS_A_PRICE_STEP;
  return { sign: signedQuantity > 0n ? 1n : -1n, total, left: total, fees, feesGiven: 0n, unitValue };
}

/** Matching once more in whole numbers only, with no code of the product in it. */
export function matchInWholeNumbers(fills: readonly WholeFill[], method: LotMethod): WholeTotals {
  return method === 'average' ? matchPools(fills) : matchQueues(fills, method);
}

function cashOf(fills: readonly WholeFill[]) {
  let [cash, fees] = [0n, 0n];
  for (const fill of fills) {
    cash -= fill.signedQuantity * fill.price * fill.multiplier * UNITS_A_PRICE_STEP + fill.fees * UNITS_A_CENT;
    fees += fill.fees * UNITS_A_CENT;
  }
  return { cash, fees };
}

function matchQueues(fills: readonly WholeFill[], method: 'fifo' | 'lifo'): WholeTotals {
  const books = new Map<number, WholeLot[]>();
  let realised = 0n;
  for (const fill of fills) {
    const book = books.get(fill.book) ?? [];
    books.set(fill.book, book);
    const lot = lotOf(fill);
    while (lot.left > 0n) {
      const other = method === 'fifo' ? book[0] : book.at(-1);
      if (other === undefined || other.sign === lot.sign) break;
      const quantity = least(lot.left, other.left);
      realised += other.sign * (lot.unitValue - other.unitValue) * quantity;
      realised -= UNITS_A_CENT * (bear(lot, quantity) + bear(other, quantity));
      if (other.left === 0n) book.splice(book.indexOf(other), 1);
    }
    if (lot.left > 0n) book.push(lot);
  }
  const lots = [...books.values()].flat();
  return {
    ...cashOf(fills),
    realised,
    open: lots.reduce(
      (sum, lot) => sum - lot.sign * lot.unitValue * lot.left - (lot.fees - lot.feesGiven) * UNITS_A_CENT,
      0n,
    ),
    openQuantity: lots.reduce((sum, { sign, left }) => sum + sign * left, 0n),
  };
}

function matchPools(fills: readonly WholeFill[]): WholeTotals {
  const pools = new Map<number, WholePool>();
  let realised = 0n;
  for (const fill of fills) {
    const lot = lotOf(fill);
    const pool = pools.get(fill.book) ?? { sign: 0n, quantity: 0n, value: 0n, fees: 0n };
    pools.set(fill.book, pool);
    if (pool.quantity > 0n && pool.sign !== lot.sign) {
      const quantity = least(lot.left, pool.quantity);
      const value = evenShare(pool.value, quantity, pool.quantity);
      const fees = evenShare(pool.fees, quantity, pool.quantity);
      realised += pool.sign * (lot.unitValue * quantity - value) - UNITS_A_CENT * (fees + bear(lot, quantity));
      pool.quantity -= quantity;
      pool.value -= value;
      pool.fees -= fees;
    }
    if (lot.left === 0n) continue;
    pool.sign = lot.sign;
    pool.quantity += lot.left;
    pool.value += lot.unitValue * lot.left;
    pool.fees += lot.fees - lot.feesGiven;
  }
  const all = [...pools.values()];
  return {
    ...cashOf(fills),
    realised,
    open: all.reduce((sum, { sign, value, fees }) => sum - sign * value - fees * UNITS_A_CENT, 0n),
    openQuantity: all.reduce((sum, { sign, quantity }) => sum + sign * quantity, 0n),
  };
}

/** A decimal text in units of 1e-12. */
export function inUnits(amount: string): bigint {
  const [whole = '', fraction = ''] = amount.replace('-', '').split('.');
  if (fraction.length > 12) throw new RangeError(`${amount} has more than 12 decimals`);
  const units = BigInt(whole) * 10n ** 12n + BigInt(fraction.padEnd(12, '0'));
  return amount.startsWith('-') ? -units : units;
}

/** Whole numbers from a 32-bit seed (Marsaglia 2003, xorshift), so that the fills are the same in every run. */
function wholeNumbers(seed: number): (below: number) => number {
  let state = seed >>> 0;
  return (below) => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) % below;
  };
}

const decimalText = (units: number, places: number) => {
  const digits = String(Math.abs(units)).padStart(places + 1, '0');
  return `${units < 0 ? '-' : ''}${digits.slice(0, -places)}.${digits.slice(-places)}`;
};

/** Trades, expiries, exercises and assignments; every twentieth fill of an option that is open ends it, in part or in whole. */
export function randomWholeFills(count: number, instruments: readonly Instrument[]): WholeFill[] {
  const next = wholeNumbers(20261201);
  const positions = instruments.map(() => 0);
  return Array.from({ length: count }, (_, index) => {
    const book = next(instruments.length);
    const instrument = instruments[book];
    if (instrument === undefined) throw new RangeError('an instrument is needed');
    const open = positions[book] ?? 0;
    const isEnding = instrument.kind === 'option' && open !== 0 && next(20) === 0;
    const quantity = 1 + next(isEnding ? Math.abs(open) : 50);
    // Leaning against the open position keeps the books short, so that most fills close something.
    const isBuy = isEnding ? open < 0 : next(100) < (open > 0 ? 35 : 65);
    const ending = next(2) === 0 ? 'expiry' : isBuy ? 'assignment' : 'exercise';
    const signed = isBuy ? quantity : -quantity;
    positions[book] = open + signed;
    const price = next(isEnding && next(2) === 0 ? 1 : 10_000_000);
    const fees = next(2_000) - 100;
    return {
      book,
      multiplier: BigInt(instrument.multiplier),
      signedQuantity: BigInt(signed),
      price: BigInt(price),
      fees: BigInt(fees),
      fill: {
        id: `f${index}`,
        kind: isEnding ? ending : isBuy ? 'buy' : 'sell',
        instrument,
        quantity: String(quantity),
        price: decimalText(price, 4),
        fees: decimalText(fees, 2),
        tradedAt: '2026-12-09T15:00:00.000Z',
        sequence: index,
      },
    };
  });
}
