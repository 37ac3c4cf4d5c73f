import { type YangZhangParts, yangZhangWeight } from '@/journal/volatility/yang-zhang-daily-volatility';

const ZETA_OF_3 = 1.2020569031595942;

/**
 * How many squared normal returns of known mean tell as much about a variance as one session does, for a log price that moves without
 * drift and is seen all the time: 2 over the relative variance of the estimate.
 * @see parkinson: E[ln(H/L)⁴] = 9·ζ(3)·σ⁴, Parkinson (1980), 4.91; garmanKlass: 7.4, Garman and Klass (1980), practical form;
 *   rogersSatchell: relative variance 0.331, Rogers and Satchell (1991), 6.04 (both from memory, held by the simulation in the tests).
 */
export const rangeReturnsPerSession = {
  parkinson: 2 / ((9 * ZETA_OF_3) / (4 * Math.LN2) ** 2 - 1),
  garmanKlass: 7.4,
  rogersSatchell: 2 / 0.331,
} as const;

interface Parts {
  readonly nightVariance: number;
  readonly dayVariance: number;
}

/**
 * Effective returns of a Garman-Klass estimate with the night added, by the share of the night that it found itself.
 * @param sessions n, from 1.
 * @returns from n, all variance by night, to 7.4 n, none.
 * @see relative variances of independent parts add, weighted by the squares of their shares (Satterthwaite 1946, Biometrics Bulletin 2).
 */
export function garmanKlassYangZhangReturns(parts: Parts, sessions: number): number {
  const night = nightShare(parts);
  const dayVariance = 2 / rangeReturnsPerSession.garmanKlass;
  return sessions / (night ** 2 + ((1 - night) ** 2 * dayVariance) / 2);
}

/**
 * Effective returns of a Yang-Zhang estimate, by the share of the night that it found itself: the night's variance has n − 1 degrees,
 * that of the day's moves too, that of Rogers and Satchell n sessions, and the three are uncorrelated.
 * @param sessions n, from 2.
 * @returns 44 at 20 sessions with 30 % by night, where the deviation of closes has 19.
 * @see Yang and Zhang (2000), J. Business 73(3); Satterthwaite (1946), Biometrics Bulletin 2.
 */
export function yangZhangReturns(parts: Pick<YangZhangParts, keyof Parts>, sessions: number): number {
  const night = nightShare(parts);
  const weight = yangZhangWeight(sessions);
  const dayHalfVariance =
    weight ** 2 / (sessions - 1) + (1 - weight) ** 2 / (rangeReturnsPerSession.rogersSatchell * sessions);
  return 1 / (night ** 2 / (sessions - 1) + (1 - night) ** 2 * dayHalfVariance);
}

function nightShare({ nightVariance, dayVariance }: Parts): number {
  const variance = nightVariance + dayVariance;
  return variance > 0 ? nightVariance / variance : 0;
}
