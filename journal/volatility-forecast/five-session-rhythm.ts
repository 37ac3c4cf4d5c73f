const CYCLE = 5;
/** Sessions of a place in the cycle without any rhythm that are thought to have come before: as if its effect were 0 ± 10 %. */
const DOUBT_SESSIONS = 252;

/**
 * How much more or less than usual the series moves at each place of a cycle of five sessions. With five sessions a week a place is a
 * weekday, and the one after a weekend moves more; where holidays break the cycle the places mix and the factors come near 1.
 * @param returns log returns, oldest first, at least 5. @param variances of each as forecast before it (index t for return t), above 0
 *   from `from` on. @param from first return to look at.
 * @returns five factors of variance with a mean of 1; that of return t is at t mod 5.
 * @see variance by weekday: French and Roll (1986), J. of Financial Economics 17, 5-26. By mean absolute moves, which outliers sway
 *   little; the shrinkage toward 1 is from experience.
 */
export function fiveSessionRhythm(
  returns: readonly number[],
  variances: ArrayLike<number>,
  from: number,
): readonly number[] {
  const sizes = new Array<number>(CYCLE).fill(0);
  const counts = new Array<number>(CYCLE).fill(0);
  for (let index = from; index < returns.length; index += 1) {
    const place = index % CYCLE;
    sizes[place] = (sizes[place] ?? 0) + Math.abs(returns[index] ?? 0) / Math.sqrt(variances[index] ?? 1);
    counts[place] = (counts[place] ?? 0) + 1;
  }
  const usual = sizes.reduce((sum, size) => sum + size, 0) / Math.max(1, returns.length - from);
  const factors = sizes.map((size, place) => {
    const count = counts[place] ?? 0;
    if (count === 0 || !(usual > 0)) return 1;
    const ratio = (size / count / usual) ** 2;
    return (count * ratio + DOUBT_SESSIONS) / (count + DOUBT_SESSIONS);
  });
  const mean = factors.reduce((sum, factor) => sum + factor, 0) / CYCLE;
  return factors.map((factor) => factor / mean);
}

/**
 * Mean factor over the coming sessions.
 * @param knownReturns before them. @param sessions above 0; a fraction takes its share of its session.
 */
export function rhythmOver(factors: readonly number[], knownReturns: number, sessions: number): number {
  const cycles = Math.floor(sessions / CYCLE);
  let sum = cycles * CYCLE;
  for (let ahead = 0; ahead < sessions - cycles * CYCLE; ahead += 1) {
    sum += (factors[(knownReturns + ahead) % CYCLE] ?? 1) * Math.min(1, sessions - cycles * CYCLE - ahead);
  }
  return sum / sessions;
}
