import { expMinusHalfSquare, normalUpperTail, scaledUpperTail } from '@/journal/distributions/normal-distribution';
import { TAIL_SERIES } from '@/journal/distributions/tail-series';
import { logRatio } from '@/journal/pricing/log-ratio';

/**
 * Places within one row of {@link outOfTheMoneyRows}. Rows lie in one typed array, so that numbers pass between functions without
 * an object each and an option fills one line of the cache.
 */
export const enum Term {
  /** In: spot less the yield to expiry, above 0. */
  PresentSpot,
  /** In: the strike discounted, above 0. */
  PresentStrike,
  /** In: ln(present spot / present strike), which may have more digits than those two. */
  LogMoneyness,
  /** In: standard deviation of the log price to expiry, 0 or more. */
  TotalDeviation,
  /** Out: value of whichever of call and put is out of the money, currency per share. */
  Price,
  /** Out: Φ(d1) of the call or Φ(−d1) of the put, whichever is out of the money. */
  SpotTail,
  /** Out: Φ(d2) of the call or Φ(−d2) of the put, whichever is out of the money: its chance of ending in the money. */
  StrikeTail,
  /** Out: present spot times φ(d1), which equals present strike times φ(d2). */
  SpotDensity,
  RowLength,
}

/** Room for `count` options. */
export function outOfTheMoneyRows(count: number): Float64Array {
  return new Float64Array(count * Term.RowLength);
}

/**
 * Fills the places marked Out of the first `count` rows.
 *
 * By symmetry the option depends on the larger and the smaller of the present values only. With m = |ln moneyness|/deviation,
 * near = m − deviation/2 and far = m + deviation/2 it is worth smaller·P(Z > near) − larger·P(Z > far), and
 * smaller·φ(near) = larger·φ(far), so that one exponential serves both. What is left of the tails is subtracted as a divided
 * difference of their series (two rows of Horner's scheme) where the deviation is small, so that no digit cancels.
 *
 * Relative error a few roundings times 1 + near², the most that a logarithm in doubles allows, down to 1e-300. Without deviation
 * prices and tails are 0, the tails one half where the logarithm is 0 too; at equal present values the call is taken to be the one
 * out of the money.
 * @see Black and Scholes (1973), J. Political Economy 81; Jäckel (2015), Let's be rational, Wilmott, on the cancellation; the way
 *   round it is our own.
 */
export function fillOutOfTheMoney(rows: Float64Array, count: number): void {
  const c = TAIL_SERIES;
  for (let at = 0; at < count * Term.RowLength; at += Term.RowLength) {
    const spot = rows[at + Term.PresentSpot] ?? NaN;
    const strike = rows[at + Term.PresentStrike] ?? NaN;
    const deviation = rows[at + Term.TotalDeviation] ?? NaN;
    const moneyness = Math.abs(rows[at + Term.LogMoneyness] ?? NaN) / deviation;
    const near = moneyness - deviation / 2;
    const bell = expMinusHalfSquare(near);
    let ratio: number;
    let farRatio: number;
    let drop: number;
    if (deviation <= 1 / 16 && near < 39) {
      const node = (moneyness * 16 + 16.5) | 0; // nodes lie a sixteenth apart, from -1
      const y = node / 16 - 1 - near;
      const z = y - deviation;
      const row = node * 12;
      const b10 = c[row + 10] ?? NaN;
      const b9 = (c[row + 9] ?? NaN) + y * b10;
      const b8 = (c[row + 8] ?? NaN) + y * b9;
      const b7 = (c[row + 7] ?? NaN) + y * b8;
      const b6 = (c[row + 6] ?? NaN) + y * b7;
      const b5 = (c[row + 5] ?? NaN) + y * b6;
      const b4 = (c[row + 4] ?? NaN) + y * b5;
      const b3 = (c[row + 3] ?? NaN) + y * b4;
      const b2 = (c[row + 2] ?? NaN) + y * b3;
      const b1 = (c[row + 1] ?? NaN) + y * b2;
      const slope =
        b1 + z * (b2 + z * (b3 + z * (b4 + z * (b5 + z * (b6 + z * (b7 + z * (b8 + z * (b9 + z * b10))))))));
      ratio = (c[row] ?? NaN) + y * b1;
      drop = deviation * slope;
      farRatio = ratio - drop;
    } else if (near >= -1 && near < 39) {
      ratio = scaledUpperTail(near);
      farRatio = scaledUpperTail(moneyness + deviation / 2);
      drop = ratio - farRatio;
    } else {
      fillExtreme(rows, at);
      continue;
    }
    const isSpotLarger = spot > strike;
    const smaller = isSpotLarger ? strike : spot;
    const larger = isSpotLarger ? spot : strike;
    const nearTail = bell * ratio;
    const farTail = bell * farRatio * (smaller / larger);
    rows[at + Term.Price] = smaller * bell * drop;
    rows[at + Term.SpotTail] = isSpotLarger ? farTail : nearTail;
    rows[at + Term.StrikeTail] = isSpotLarger ? nearTail : farTail;
    rows[at + Term.SpotDensity] = smaller * bell * 0.3989422804014327; // 1/sqrt(2π)
  }
}

/** No deviation, none to speak of against the distance, or several: here tails are whole, not ratios. */
function fillExtreme(rows: Float64Array, at: number): void {
  const spot = rows[at + Term.PresentSpot] ?? NaN;
  const strike = rows[at + Term.PresentStrike] ?? NaN;
  const deviation = rows[at + Term.TotalDeviation] ?? NaN;
  const distance = Math.abs(rows[at + Term.LogMoneyness] ?? NaN);
  const isSpotLarger = spot > strike;
  const smaller = Math.min(spot, strike);
  const near = deviation > 0 ? distance / deviation - deviation / 2 : distance > 0 ? Infinity : 0;
  const bell = deviation > 0 ? expMinusHalfSquare(near) : 0;
  const nearTail = normalUpperTail(near);
  const farShare = deviation > 0 ? bell * scaledUpperTail(distance / deviation + deviation / 2) : nearTail;
  const farTail = farShare > 0 ? farShare * (smaller / Math.max(spot, strike)) : farShare;
  rows[at + Term.Price] = smaller * (nearTail - farShare);
  rows[at + Term.SpotTail] = isSpotLarger ? farTail : nearTail;
  rows[at + Term.StrikeTail] = isSpotLarger ? nearTail : farTail;
  rows[at + Term.SpotDensity] = smaller * bell * 0.3989422804014327;
}

const one = outOfTheMoneyRows(1);

/**
 * Value of whichever of call and put is out of the money.
 * @param presentSpot spot less the yield to expiry, above 0; `presentStrike` the strike discounted, above 0;
 *   `totalDeviation` standard deviation of the log price to expiry, 0 or more.
 * @returns currency per share, 0 or more; relative accuracy as good as the inputs allow, down to 1e-300.
 * @see as {@link fillOutOfTheMoney}.
 */
export function outOfTheMoneyPrice(presentSpot: number, presentStrike: number, totalDeviation: number): number {
  one[Term.PresentSpot] = presentSpot;
  one[Term.PresentStrike] = presentStrike;
  one[Term.LogMoneyness] = logRatio(presentSpot, presentStrike);
  one[Term.TotalDeviation] = totalDeviation;
  fillOutOfTheMoney(one, 1);
  return one[Term.Price] ?? NaN;
}
