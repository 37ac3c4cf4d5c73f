import { DomainError } from '@/journal/errors/domain-error';
import {
  impliedDailyVolatility,
  type ImpliedQuestion,
  type ImpliedVolatility,
} from '@/journal/pricing/implied-daily-volatility';

export interface QuoteQuestion extends Omit<ImpliedQuestion, 'price'> {
  /** Currency per share, 0 (no bid) or more. */
  readonly bidPrice: number;
  /** Currency per share, at least the bid. */
  readonly askPrice: number;
  /** The smallest step of the price, currency per share, above 0. */
  readonly tickSize: number;
}

export interface ImpliedQuote {
  readonly bid: ImpliedVolatility;
  /** Of the mean of bid and ask. */
  readonly mid: ImpliedVolatility;
  readonly ask: ImpliedVolatility;
  /** How far one tick of the price moves the implied volatility about the mid; null where the mid has none. */
  readonly perTick: {
    /** Per cent per session. */
    readonly dailyPoints: number;
    /** Per cent per year of sessions. */
    readonly annualPoints: number;
  } | null;
}

/**
 * Daily volatilities of bid, mid and ask, and what one tick is worth in volatility: near expiry a tick can be more than any opinion.
 * The step of a tick is a full solution half a tick above the mid less one half a tick below; where one of them has no volatility,
 * the other half is doubled.
 * @param question see {@link QuoteQuestion}.
 * @param sessionsPerYear sessions a year has, for annual points; above 0, 252 by default.
 * @throws {DomainError} `quote-crossed` when the bid is above the ask; `quote-invalid` for a negative or infinite price or a tick not
 *   above 0; as {@link impliedDailyVolatility} for the rest.
 * @see common practice; the solutions as {@link impliedDailyVolatility}.
 */
export function impliedQuote(question: QuoteQuestion, sessionsPerYear = 252): ImpliedQuote {
  const { bidPrice, askPrice, tickSize, ...option } = question;
  const isValid =
    bidPrice >= 0 &&
    askPrice >= 0 &&
    askPrice < Infinity &&
    tickSize > 0 &&
    tickSize < Infinity &&
    sessionsPerYear > 0 &&
    sessionsPerYear < Infinity;
  if (!isValid) throw new DomainError('quote-invalid', { bidPrice, askPrice, tickSize, sessionsPerYear });
  if (!(bidPrice <= askPrice)) throw new DomainError('quote-crossed', { bidPrice, askPrice });
  const midPrice = bidPrice + (askPrice - bidPrice) / 2;
  const at = (price: number) => impliedDailyVolatility({ ...option, price });
  const mid = at(midPrice);
  const dailyChange =
    mid.kind === 'found'
      ? tickChange(mid.dailyVolatility, at(midPrice - tickSize / 2), at(midPrice + tickSize / 2))
      : null;
  return {
    bid: at(bidPrice),
    mid,
    ask: at(askPrice),
    perTick:
      dailyChange === null
        ? null
        : { dailyPoints: 100 * dailyChange, annualPoints: 100 * dailyChange * Math.sqrt(sessionsPerYear) },
  };
}

function tickChange(mid: number, lower: ImpliedVolatility, upper: ImpliedVolatility): number | null {
  if (lower.kind === 'found' && upper.kind === 'found') return upper.dailyVolatility - lower.dailyVolatility;
  if (upper.kind === 'found') return 2 * (upper.dailyVolatility - mid);
  return lower.kind === 'found' ? 2 * (mid - lower.dailyVolatility) : null;
}
