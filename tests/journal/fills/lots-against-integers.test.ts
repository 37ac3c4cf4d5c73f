import { type Fill } from '@/journal/fills/fill';
import { matchLots } from '@/journal/fills/lots';
import { option, zqxaStock } from '@/tests/journal/fills/fill-fixtures';

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

const instruments = [
  option('call', '102'),
  option('put', '97.5'),
  option('call', '4050', { underlyingSymbol: 'ZZIX' }),
  option('put', '12', { multiplier: '10' }),
  zqxaStock,
];

const text = (units: number, places: number) => {
  const digits = String(Math.abs(units)).padStart(places + 1, '0');
  return `${units < 0 ? '-' : ''}${digits.slice(0, -places)}.${digits.slice(-places)}`;
};

interface WholeFill {
  readonly fill: Fill;
  readonly instrumentIndex: number;
  readonly signedQuantity: bigint;
  /** In 1/10,000 of currency. */
  readonly price: bigint;
  /** In cents. */
  readonly fees: bigint;
}

function randomFills(count: number): WholeFill[] {
  const next = wholeNumbers(20261201);
  const positions = instruments.map(() => 0);
  return Array.from({ length: count }, (_, index) => {
    const instrumentIndex = next(instruments.length);
    const instrument = instruments[instrumentIndex] ?? zqxaStock;
    const quantity = 1 + next(50);
    // Leaning against the open position keeps the books short, so that most fills close something.
    const isBuy = next(100) < ((positions[instrumentIndex] ?? 0) > 0 ? 35 : 65);
    positions[instrumentIndex] = (positions[instrumentIndex] ?? 0) + (isBuy ? quantity : -quantity);
    const price = 1 + next(9_999_999);
    const fees = next(2_000) - 100;
    return {
      instrumentIndex,
      signedQuantity: BigInt(isBuy ? quantity : -quantity),
      price: BigInt(price),
      fees: BigInt(fees),
      fill: {
        id: `f${index}`,
        kind: isBuy ? 'buy' : 'sell',
        instrument,
        quantity: String(quantity),
        price: text(price, 4),
        fees: text(fees, 2),
        tradedAt: '2026-12-09T15:00:00.000Z',
        sequence: index,
      },
    };
  });
}

const absolute = (value: bigint) => (value < 0n ? -value : value);

/** Cents of amount x part / whole, half to even. */
function evenShare(amount: bigint, part: bigint, whole: bigint): bigint {
  const doubled = 2n * absolute(amount) * part;
  const floor = doubled / (2n * whole);
  const rest = doubled % (2n * whole);
  const isUp = rest > whole || (rest === whole && floor % 2n === 1n);
  return (amount < 0n ? -1n : 1n) * (floor + (isUp ? 1n : 0n));
}

interface WholeLot {
  readonly sign: bigint;
  readonly price: bigint;
  readonly fees: bigint;
  readonly total: bigint;
  left: bigint;
}

/** FIFO and LIFO once more, in whole numbers only: amounts in 1/10,000 of currency. */
function matchInWholeNumbers(fills: readonly WholeFill[], method: 'fifo' | 'lifo') {
  const books: WholeLot[][] = instruments.map(() => []);
  let realised = 0n;
  let cash = 0n;
  for (const { instrumentIndex, signedQuantity, price, fees } of fills) {
    const book = books[instrumentIndex] ?? [];
    const multiplier = BigInt(instruments[instrumentIndex]?.multiplier ?? '0');
    const sign = signedQuantity > 0n ? 1n : -1n;
    const total = absolute(signedQuantity);
    const lot: WholeLot = { sign, price, fees, total, left: total };
    cash -= signedQuantity * price * multiplier + fees * 100n;
    const bear = (bearer: WholeLot, quantity: bigint) => {
      const before = evenShare(bearer.fees, bearer.total - bearer.left, bearer.total);
      bearer.left -= quantity;
      return evenShare(bearer.fees, bearer.total - bearer.left, bearer.total) - before;
    };
    while (lot.left > 0n) {
      const other = method === 'fifo' ? book[0] : book.at(-1);
      if (other === undefined || other.sign === sign) break;
      const quantity = lot.left < other.left ? lot.left : other.left;
      realised += other.sign * (price - other.price) * quantity * multiplier;
      realised -= 100n * (bear(lot, quantity) + bear(other, quantity));
      if (other.left === 0n) book.splice(book.indexOf(other), 1);
    }
    if (lot.left > 0n) book.push(lot);
  }
  return { realised, cash, open: books.flat().map(({ sign, left }) => sign * left) };
}

const inTenThousandths = (amount: string) => {
  const [whole = '', fraction = ''] = amount.replace('-', '').split('.');
  const units = BigInt(whole) * 10_000n + BigInt(fraction.padEnd(4, '0'));
  return amount.startsWith('-') ? -units : units;
};

describe('matchLots on 100,000 random fills', () => {
  const fills = randomFills(100_000);

  it.each(['fifo', 'lifo'] as const)('equals whole-number arithmetic to the last digit, by %s', (method) => {
    const expected = matchInWholeNumbers(fills, method);
    const matched = matchLots(
      fills.map(({ fill }) => fill),
      { method },
    );
    expect(matched.closed.length).toBeGreaterThan(90_000);
    expect(inTenThousandths(matched.realisedProfit)).toBe(expected.realised);
    expect(inTenThousandths(matched.cashFlow)).toBe(expected.cash);
    expect(
      matched.open.map(({ direction, quantity }) => BigInt(direction === 'long' ? quantity : `-${quantity}`)).sort(),
    ).toEqual(expected.open.sort());
  });
});
