import { expMinusHalfSquare, scaledUpperTail, upperTailWithBell } from '@/journal/distributions/normal-distribution';

const ONE_OVER_ROOT_TWO_PI = 0.3989422804014327;
/** From here on tails are taken as a ratio to their exponential, which the two terms of a price share. */
const TAIL_STARTS = 0.7;

/**
 * Value of whichever of call and put is out of the money.
 * By symmetry it depends on the larger and the smaller of the present values only, so calls and puts keep their digits alike.
 * @param presentSpot spot less the yield to expiry, above 0; `presentStrike` the strike discounted, above 0;
 *   `totalDeviation` standard deviation of the log price to expiry, 0 or more.
 * @returns currency per share, 0 or more; relative accuracy as good as the inputs allow, down to 1e-300.
 * @see Black and Scholes (1973), J. Political Economy 81. With m = ln(larger/smaller)/deviation, near and far m ∓ deviation/2:
 *   smaller·P(Z > near) − larger·P(Z > far).
 */
export function outOfTheMoneyPrice(presentSpot: number, presentStrike: number, totalDeviation: number): number {
  const larger = Math.max(presentSpot, presentStrike);
  const smaller = Math.min(presentSpot, presentStrike);
  return totalDeviation > 0 ? priceOfRatio(larger, smaller, logRatio(larger, smaller), totalDeviation) : 0;
}

/**
 * The same where ln(larger / smaller) is known from elsewhere. Numbers by position, not in an object: this is the innermost
 * step of every lattice and search.
 * @param larger the larger present value, `smaller` the other; `logOfRatio` 0 or more; `totalDeviation` above 0.
 */
export function priceOfRatio(larger: number, smaller: number, logOfRatio: number, totalDeviation: number): number {
  const moneyness = logOfRatio / totalDeviation;
  const near = moneyness - totalDeviation / 2;
  const far = moneyness + totalDeviation / 2;
  // Both terms carry the same exponential, smaller·φ(near) = larger·φ(far); taken once, its rounding cannot part them.
  const bell = expMinusHalfSquare(near);
  const price =
    near > TAIL_STARTS
      ? smaller * bell * (scaledUpperTail(near) - scaledUpperTail(far))
      : smaller * upperTailWithBell(near, bell) - larger * upperTailWithBell(far, bell * (smaller / larger));
  return price > 0 ? price : 0;
}

export interface OutOfTheMoneyTerms {
  /** As {@link outOfTheMoneyPrice}. */
  readonly price: number;
  /** Φ(d1) of the call or Φ(−d1) of the put, whichever is out of the money. */
  readonly spotTail: number;
  /** Φ(d2) of the call or Φ(−d2) of the put, whichever is out of the money: its chance of ending in the money. */
  readonly strikeTail: number;
  /** Present spot times φ(d1), which equals present strike times φ(d2). */
  readonly spotDensity: number;
  /** ln(present spot / present strike). */
  readonly logMoneyness: number;
}

/**
 * The out-of-the-money price with the terms that the Greeks are made of.
 * @param presentSpot and the others as for {@link outOfTheMoneyPrice}; without deviation the tails are 0, and one half each
 *   where spot and strike are equal.
 * @see as {@link outOfTheMoneyPrice}.
 */
export function outOfTheMoneyTerms(
  presentSpot: number,
  presentStrike: number,
  totalDeviation: number,
): OutOfTheMoneyTerms {
  const isSpotLarger = presentSpot > presentStrike;
  const larger = isSpotLarger ? presentSpot : presentStrike;
  const smaller = isSpotLarger ? presentStrike : presentSpot;
  const logOfRatio = logRatio(larger, smaller);
  const logMoneyness = isSpotLarger ? logOfRatio : -logOfRatio;
  if (!(totalDeviation > 0)) {
    const tail = larger === smaller ? 0.5 : 0;
    return { price: 0, spotTail: tail, strikeTail: tail, spotDensity: 0, logMoneyness };
  }
  const moneyness = logOfRatio / totalDeviation;
  const near = moneyness - totalDeviation / 2;
  const far = moneyness + totalDeviation / 2;
  const bell = expMinusHalfSquare(near);
  const farBell = bell * (smaller / larger);
  let nearTail: number;
  let farTail: number;
  let price: number;
  if (near > TAIL_STARTS) {
    const nearRatio = scaledUpperTail(near);
    const farRatio = scaledUpperTail(far);
    nearTail = bell * nearRatio;
    farTail = farBell * farRatio;
    price = smaller * bell * (nearRatio - farRatio);
  } else {
    nearTail = upperTailWithBell(near, bell);
    farTail = upperTailWithBell(far, farBell);
    price = smaller * nearTail - larger * farTail;
  }
  return {
    price: price > 0 ? price : 0,
    spotTail: isSpotLarger ? farTail : nearTail,
    strikeTail: isSpotLarger ? nearTail : farTail,
    spotDensity: smaller * bell * ONE_OVER_ROOT_TWO_PI,
    logMoneyness,
  };
}

/** ln(larger / smaller), with all digits where the two are close. */
function logRatio(larger: number, smaller: number): number {
  const excess = (larger - smaller) / smaller;
  return excess < 0.5 ? Math.log1p(excess) : Math.log(larger / smaller);
}
