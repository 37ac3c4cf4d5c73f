import { type AttributedLeg, type LegEnd } from '@/journal/attribution/attributed-leg';
import { DomainError } from '@/journal/errors/domain-error';
import { toModelNumber } from '@/journal/money/decimal';
import { impliedDailyVolatility } from '@/journal/pricing/implied-daily-volatility';

export interface EndVolatility {
  /** Fraction per session, above 0. */
  readonly dailyVolatility: number;
  /** 'other-end' and 'fallback' where the middle price implies none. */
  readonly source: 'given' | 'implied' | 'other-end' | 'fallback';
}

/**
 * The volatility at both ends of an option leg. Where an end has none, that of the other end stands in, so that nothing is put down
 * to volatility that is not known to have changed; what is wrong with that shows in the mark residual.
 * @param fallbackDailyVolatility for when neither end has one.
 * @throws {DomainError} `volatility-not-positive`, `decimal-invalid`, and as impliedDailyVolatility.
 */
export function legVolatilities(
  leg: AttributedLeg,
  fallbackDailyVolatility: number,
): { readonly entry: EndVolatility; readonly exit: EndVolatility } {
  requirePositive(fallbackDailyVolatility);
  const [entry, exit] = [ownVolatility(leg, leg.entry), ownVolatility(leg, leg.exit)];
  const fallback: EndVolatility = { dailyVolatility: fallbackDailyVolatility, source: 'fallback' };
  return { entry: entry ?? otherEnd(exit) ?? fallback, exit: exit ?? otherEnd(entry) ?? fallback };
}

function otherEnd(end: EndVolatility | null): EndVolatility | null {
  return end === null ? null : { ...end, source: 'other-end' };
}

function ownVolatility({ instrument }: AttributedLeg, end: LegEnd): EndVolatility | null {
  if (instrument.kind === 'stock') return null;
  if (end.dailyVolatility !== null) {
    requirePositive(end.dailyVolatility);
    return { dailyVolatility: end.dailyVolatility, source: 'given' };
  }
  const { type, strikePrice } = instrument;
  const price = toModelNumber(end.midPrice ?? end.fillPrice);
  const implied = impliedDailyVolatility({ ...end.state, type, strikePrice, price });
  // A price at its lower bound has no time value, so no volatility worth the name.
  const isFound = implied.kind === 'found' && implied.dailyVolatility > 0;
  return isFound ? { dailyVolatility: implied.dailyVolatility, source: 'implied' } : null;
}

function requirePositive(dailyVolatility: number): void {
  if (!(dailyVolatility > 0 && dailyVolatility < Infinity)) {
    throw new DomainError('volatility-not-positive', { dailyVolatility });
  }
}
