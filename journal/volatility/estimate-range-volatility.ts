import { DomainError } from '@/journal/errors/domain-error';
import { type PriceBar, requireBars } from '@/journal/returns/price-bar';
import { defaultConfidence } from '@/journal/volatility/estimate-close-volatility';
import { garmanKlassDailyVolatility } from '@/journal/volatility/garman-klass-daily-volatility';
import { garmanKlassYangZhangParts } from '@/journal/volatility/garman-klass-yang-zhang-daily-volatility';
import { parkinsonDailyVolatility } from '@/journal/volatility/parkinson-daily-volatility';
import {
  garmanKlassYangZhangReturns,
  rangeReturnsPerSession,
  yangZhangReturns,
} from '@/journal/volatility/range-effective-returns';
import { rogersSatchellDailyVolatility } from '@/journal/volatility/rogers-satchell-daily-volatility';
import { volatilityInterval } from '@/journal/volatility/volatility-interval';
import { type RangeMethod, requireWindow, type VolatilityEstimate } from '@/journal/volatility/volatility-method';
import { yangZhangParts } from '@/journal/volatility/yang-zhang-daily-volatility';

/** Sessions the window must hold, and whether the close before it is needed. */
const needs: Readonly<Record<RangeMethod['kind'], { readonly least: number; readonly isCloseBeforeNeeded: boolean }>> =
  {
    parkinson: { least: 1, isCloseBeforeNeeded: false },
    garmanKlass: { least: 1, isCloseBeforeNeeded: false },
    rogersSatchell: { least: 1, isCloseBeforeNeeded: false },
    garmanKlassYangZhang: { least: 1, isCloseBeforeNeeded: true },
    yangZhang: { least: 2, isCloseBeforeNeeded: true },
  };

/** Sessions that so many bars give a range method: all of them, or one less where the close before is needed. */
export function rangeSessions(kind: RangeMethod['kind'], barCount: number): number {
  return needs[kind].isCloseBeforeNeeded ? barCount - 1 : barCount;
}

/**
 * Daily volatility from the ranges of the last sessions, with an interval: chi-square, with the effective number of returns that the
 * published variance of the estimator stands for.
 * @param bars oldest first, adjusted alike; `window` of them, and one more for garmanKlassYangZhang and yangZhang, whose night begins at
 *   the close before. Only those used are checked.
 * @param confidence strictly between 0 and 1.
 * @returns parkinson, garmanKlass and rogersSatchell cover open to close only, the others a whole session. `mean` is the mean return
 *   removed by yangZhang, 0 otherwise. The interval holds for prices seen all through the session: where few trades are seen, the
 *   estimate reads low, and so does its interval.
 * @throws {DomainError} `window-invalid`, `too-few-bars` with what is required, `bar-invalid` with the row among the bars given,
 *   `confidence-out-of-range`.
 * @see the methods' own files, and range-effective-returns for the interval.
 */
export function estimateRangeVolatility(
  bars: readonly PriceBar[],
  method: RangeMethod,
  confidence: number = defaultConfidence,
): VolatilityEstimate<RangeMethod> {
  const { least, isCloseBeforeNeeded } = needs[method.kind];
  const sessions = method.window;
  requireWindow(sessions);
  const before = isCloseBeforeNeeded ? 1 : 0;
  if (sessions < least)
    throw new DomainError('too-few-bars', { required: least + before, received: sessions + before });
  const required = sessions + before;
  if (bars.length < required) throw new DomainError('too-few-bars', { required, received: bars.length });
  const first = bars.length - required;
  requireBars(bars, 1, first);
  const { dailyVolatility, mean, degreesOfFreedom } = estimateOf(method.kind, bars.slice(first), sessions);
  return {
    method,
    dailyVolatility,
    mean,
    ...volatilityInterval({ dailyVolatility, degreesOfFreedom, confidence }),
    confidence,
    degreesOfFreedom,
    returnsUsed: sessions,
  };
}

function estimateOf(
  kind: RangeMethod['kind'],
  bars: readonly PriceBar[],
  sessions: number,
): { dailyVolatility: number; mean: number; degreesOfFreedom: number } {
  const inSession = (dailyVolatility: number, returnsPerSession: number) => ({
    dailyVolatility,
    mean: 0,
    degreesOfFreedom: returnsPerSession * sessions,
  });
  switch (kind) {
    case 'parkinson':
      return inSession(parkinsonDailyVolatility(bars), rangeReturnsPerSession.parkinson);
    case 'garmanKlass':
      return inSession(garmanKlassDailyVolatility(bars), rangeReturnsPerSession.garmanKlass);
    case 'rogersSatchell':
      return inSession(rogersSatchellDailyVolatility(bars), rangeReturnsPerSession.rogersSatchell);
    case 'garmanKlassYangZhang': {
      const parts = garmanKlassYangZhangParts(bars);
      const dailyVolatility = Math.sqrt(parts.nightVariance + parts.dayVariance);
      return { dailyVolatility, mean: 0, degreesOfFreedom: garmanKlassYangZhangReturns(parts, sessions) };
    }
    case 'yangZhang': {
      const parts = yangZhangParts(bars);
      const dailyVolatility = Math.sqrt(parts.nightVariance + parts.dayVariance);
      return { dailyVolatility, mean: parts.mean, degreesOfFreedom: yangZhangReturns(parts, sessions) };
    }
  }
}
