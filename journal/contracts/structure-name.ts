import { type PlannedLeg } from '@/journal/contracts/planned-leg';

interface NamedLeg {
  readonly side: 'buy' | 'sell';
  readonly type: 'call' | 'put';
  readonly strike: number;
  readonly text: string;
  readonly quantity: number;
}

/**
 * The trade's name for a structure of one expiry: "long 102 call", "3 × bull put 97 / 95", "iron condor 3930 to 4070".
 * @param legs as planned; what has no common name is called by its number of legs.
 * @returns words without the underlying; "no legs yet" for none.
 * @see names in common use, e.g. Hull, Options, Futures, and Other Derivatives; Natenberg, Option Volatility and Pricing.
 */
export function structureName(legs: readonly PlannedLeg[]): string {
  if (legs.length === 0) return 'no legs yet';
  const units = legs.reduce((divisor, leg) => greatestCommonDivisor(divisor, leg.quantity), 0);
  const named = legs
    .map((leg): NamedLeg => ({
      side: leg.side,
      type: leg.type,
      strike: Number(leg.strikePrice),
      text: leg.strikePrice.includes('.') ? leg.strikePrice.replace(/\.?0+$/, '') : leg.strikePrice,
      quantity: leg.quantity / units,
    }))
    .sort((left, right) => left.strike - right.strike || (left.type === right.type ? 0 : left.type === 'put' ? -1 : 1));
  const [only] = named;
  if (named.length === 1 && only !== undefined) {
    return `${only.side === 'buy' ? 'long' : 'short'} ${units > 1 ? `${units} × ` : ''}${only.text} ${only.type}`;
  }
  const name = pairName(named) ?? butterflyName(named) ?? ironName(named);
  return name === null ? `${legs.length} legs` : `${units > 1 ? `${units} × ` : ''}${name}`;
}

function greatestCommonDivisor(left: number, right: number): number {
  return right === 0 ? left : greatestCommonDivisor(right, left % right);
}

function pairName(legs: readonly NamedLeg[]): string | null {
  const [low, high] = legs;
  if (legs.length !== 2 || low === undefined || high === undefined) return null;
  const isOneForOne = low.quantity === 1 && high.quantity === 1;
  if (low.type !== high.type && isOneForOne) return mixedPairName(low, high);
  if (low.type !== high.type || low.side === high.side || low.strike === high.strike) return null;
  if (!isOneForOne) return ratioName(low, high);
  const direction = low.side === 'buy' ? 'bull' : 'bear';
  const strikes = low.type === 'call' ? `${low.text} / ${high.text}` : `${high.text} / ${low.text}`;
  return `${direction} ${low.type} ${strikes}`;
}

function mixedPairName(low: NamedLeg, high: NamedLeg): string {
  const way = low.side === 'buy' ? 'long' : 'short';
  if (low.side !== high.side) return `risk reversal ${low.text} / ${high.text}`;
  return low.strike === high.strike ? `${way} straddle ${low.text}` : `${way} strangle ${low.text} / ${high.text}`;
}

function ratioName(low: NamedLeg, high: NamedLeg): string {
  const [bought, sold] = low.side === 'buy' ? [low, high] : [high, low];
  const word = bought.quantity > sold.quantity ? 'backspread' : 'ratio spread';
  return `${low.type} ${word} ${low.text} / ${high.text}, ${low.quantity} × ${high.quantity}`;
}

function butterflyName(legs: readonly NamedLeg[]): string | null {
  const [low, middle, high] = legs;
  if (legs.length !== 3 || low === undefined || middle === undefined || high === undefined) return null;
  const isOneType = low.type === middle.type && middle.type === high.type;
  const isWinged = low.side === high.side && middle.side !== low.side;
  const isWeighted = low.quantity === 1 && middle.quantity === 2 && high.quantity === 1;
  const isEven = Math.abs(middle.strike - low.strike - (high.strike - middle.strike)) < 1e-9;
  if (!(isOneType && isWinged && isWeighted && isEven)) return null;
  return `${low.side === 'buy' ? 'long' : 'short'} ${low.type} butterfly ${low.text} / ${middle.text} / ${high.text}`;
}

function ironName(legs: readonly NamedLeg[]): string | null {
  const [wing, lowBody, highBody, farWing] = legs;
  if (
    legs.length !== 4 ||
    wing === undefined ||
    lowBody === undefined ||
    highBody === undefined ||
    farWing === undefined
  )
    return null;
  const isSplit = wing.type === 'put' && lowBody.type === 'put' && highBody.type === 'call' && farWing.type === 'call';
  const isPaired = wing.side === farWing.side && lowBody.side === highBody.side && wing.side !== lowBody.side;
  const isEven =
    legs.every((leg) => leg.quantity === 1) && wing.strike < lowBody.strike && highBody.strike < farWing.strike;
  if (!(isSplit && isPaired && isEven)) return null;
  const way = wing.side === 'buy' ? '' : 'long ';
  return lowBody.strike === highBody.strike
    ? `${way}iron butterfly ${wing.text} / ${lowBody.text} / ${farWing.text}`
    : `${way}iron condor ${wing.text} to ${farWing.text}`;
}
