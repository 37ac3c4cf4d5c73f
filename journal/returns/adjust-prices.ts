import { DomainError } from '@/journal/errors/domain-error';
import { actionsBySession, type CorporateAction } from '@/journal/returns/corporate-action';
import { logRatio } from '@/journal/returns/log-ratio';
import { type PriceBar, requireBars } from '@/journal/returns/price-bar';
import { type SessionDate } from '@/journal/sessions/session-date';

export interface DatedClose {
  readonly sessionDate: SessionDate;
  /** As it was traded, above 0 and finite. */
  readonly close: number;
}

/**
 * Log returns with splits undone and dividends added back, so that neither is read as a move: ln((P + D)·shares/P′), P′ the close before.
 * @param closes as traded, by rising session; at least 2. @param actions in any order.
 * @returns one fewer than closes.
 * @throws {DomainError} `too-few-closes`, `close-invalid`, `session-dates-not-rising`, `action-invalid`, each of these with the index, or
 *   `adjustment-out-of-range` where an adjusted price is no double.
 * @see common practice (total return); e.g. Campbell, Lo and MacKinlay (1997), The Econometrics of Financial Markets, 1.4.
 */
export function adjustedLogReturns(closes: readonly DatedClose[], actions: readonly CorporateAction[]): number[] {
  if (closes.length < 2) throw new DomainError('too-few-closes', { required: 2, received: closes.length });
  return valuesForOne(closes, actions)
    .slice(1)
    .map((value, at) => logRatio(value, closes[at]?.close ?? value));
}

/**
 * What each price is multiplied by so that it compares with the last: 1 for the last, for earlier ones the product of
 * P/((P + D)·shares) over the sessions after them, P the close of the ex-session.
 * @param closes as traded, by rising session.
 * @returns one a close, above 0; returns of the adjusted closes are those of {@link adjustedLogReturns}.
 * @throws {DomainError} as adjustedLogReturns, but for `too-few-closes`.
 * @see common practice (prices adjusted backwards, a dividend reinvested at the close of its ex-session).
 */
export function adjustmentFactors(closes: readonly DatedClose[], actions: readonly CorporateAction[]): number[] {
  const values = valuesForOne(closes, actions);
  const factors = new Array<number>(closes.length).fill(1);
  for (let at = closes.length - 2; at >= 0; at -= 1) {
    const later = at + 1;
    const step = (closes[later]?.close ?? Number.NaN) / (values[later] ?? Number.NaN);
    const factor = (factors[later] ?? Number.NaN) * step;
    const adjusted = (closes[at]?.close ?? Number.NaN) * factor;
    if (!(factor > 0 && adjusted > 0 && adjusted < Infinity))
      throw new DomainError('adjustment-out-of-range', { index: at });
    factors[at] = factor;
  }
  return factors;
}

/** Closes by {@link adjustmentFactors}; parameters, errors and source as there. */
export function adjustCloses(closes: readonly DatedClose[], actions: readonly CorporateAction[]): number[] {
  const factors = adjustmentFactors(closes, actions);
  return closes.map(({ close }, at) => close * (factors[at] ?? Number.NaN));
}

/**
 * Bars by {@link adjustmentFactors}, all four prices of a session alike. A dividend is taken in at the close of its ex-session, so that
 * the night before is off by the dividend's share of that day's move: second order.
 * @throws {DomainError} as there, and `bar-invalid` with the row.
 */
export function adjustBars<Bar extends PriceBar & DatedClose>(
  bars: readonly Bar[],
  actions: readonly CorporateAction[],
): Bar[] {
  requireBars(bars, 0);
  const factors = adjustmentFactors(bars, actions);
  return bars.map((bar, at) => {
    const factor = factors[at] ?? Number.NaN;
    const adjusted = {
      ...bar,
      open: bar.open * factor,
      high: bar.high * factor,
      low: bar.low * factor,
      close: bar.close * factor,
    };
    if (!(adjusted.low > 0 && adjusted.high < Infinity))
      throw new DomainError('adjustment-out-of-range', { index: at });
    return adjusted;
  });
}

/** What one share held since the close before is worth at each close, with the cash paid on it. */
function valuesForOne(closes: readonly DatedClose[], actions: readonly CorporateAction[]): number[] {
  const bySession = actionsBySession(
    closes.map(({ sessionDate }) => sessionDate),
    actions,
  );
  return closes.map(({ close }, index) => {
    if (!(close > 0 && close < Infinity)) throw new DomainError('close-invalid', { index, close });
    const { shares, cash } = bySession[index] ?? { shares: 1, cash: 0 };
    const value = (close + cash) * shares;
    if (!(value > 0 && value < Infinity)) throw new DomainError('adjustment-out-of-range', { index });
    return value;
  });
}
