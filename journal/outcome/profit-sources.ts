import { attributeProfit, type ProfitParts } from '@/journal/attribution/attribute-profit';
import { type AttributedLeg } from '@/journal/attribution/attributed-leg';
import { attributedLot, type KnownAtEnd } from '@/journal/attribution/attributed-lot';
import { type Fill } from '@/journal/fills/fill';
import { type ClosedLot } from '@/journal/fills/lot';
import { matchLots } from '@/journal/fills/lots';
import { type FillMarks, marketState, type MarketQuestion, underlyingAtFill } from '@/journal/outcome/market-at';

/** Where the profit of what was closed came from; the parts add up to it exactly. */
export interface ProfitSources extends ProfitParts {
  /** 'noted' when every fill came with the price of the underlying; else closes of the fills' sessions stand in for some. */
  readonly underlyingFrom: 'noted' | 'close';
  /** False when a middle price was not noted with some trade: its slippage then hides in the marks. */
  readonly isSlippageKnown: boolean;
}

/** Values at the settlement are no trades: nothing is lost against a middle price. */
const isTrade = ({ kind }: Fill) => kind === 'buy' || kind === 'sell';

/**
 * Attributes the profit of an entry's closed lots (oldest first) to move, time, volatility, marks, slippage and fees.
 * @param fills effective fills. @param marks what was noted with a fill, by its id.
 * @returns null while nothing is closed, or while a price of the underlying is not there yet.
 * @throws {DomainError} as matchLots, attributeProfit and marketState.
 * @see attributeProfit for the method and its sources.
 */
export function profitSources(
  question: MarketQuestion & { readonly fills: readonly Fill[]; readonly marks: ReadonlyMap<string, FillMarks> },
): ProfitSources | null {
  const { fills, marks, input } = question;
  const byId = new Map(fills.map((fill) => [fill.id, fill]));
  const { closed } = matchLots(fills, { method: 'fifo' });
  const sources = new Set<string>();
  let hasEveryMid = true;
  const legs: AttributedLeg[] = [];
  for (const [index, lot] of closed.entries()) {
    const ends = [endOf(lot, 'open'), endOf(lot, 'close')].map((end) => {
      const fill = byId.get(end.fillId);
      const noted = marks.get(end.fillId);
      const seen = fill === undefined ? null : underlyingAtFill(question, fill, noted?.underlyingPrice ?? null);
      if (fill === undefined || seen === null) return null;
      sources.add(seen.source);
      const midPrice = isTrade(fill) && fill.instrument.kind === 'option' ? (noted?.midPrice ?? null) : end.fillPrice;
      hasEveryMid &&= midPrice !== null;
      const state = marketState(question, { at: end.at, spotPrice: seen.price, instrument: lot.instrument });
      return { state, midPrice, dailyVolatility: null } satisfies KnownAtEnd;
    });
    const [entry, exit] = ends;
    if (entry == null || exit == null) return null;
    legs.push(attributedLot(lot, { legId: String(index), entry, exit }));
  }
  if (legs.length === 0) return null;
  const { total } = attributeProfit(legs, { fallbackDailyVolatility: input.volatility.base });
  const { modelChange: _, ...parts } = total;
  return { ...parts, underlyingFrom: sources.has('close') ? 'close' : 'noted', isSlippageKnown: hasEveryMid };
}

interface LotEnd {
  readonly fillId: string;
  readonly at: string;
  readonly fillPrice: string;
}

function endOf(lot: ClosedLot, which: 'open' | 'close'): LotEnd {
  return which === 'open'
    ? { fillId: lot.openFillId ?? '', at: lot.openedAt, fillPrice: lot.openPrice }
    : { fillId: lot.closeFillId, at: lot.closedAt, fillPrice: lot.closePrice };
}
