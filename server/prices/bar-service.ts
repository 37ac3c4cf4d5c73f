import { toDecimal } from '@/journal/money/decimal';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type DeskScope } from '@/server/database/desk-scope';
import { InputError } from '@/server/errors/input-error';
import { BarStore } from '@/server/prices/bar-store';
import { type OnBarsChanged, priceChanges } from '@/server/prices/bars-changed';
import { rangeProblem, sessionProblem } from '@/server/prices/reading/read-bars';
import { type Clock } from '@/server/runtime/clock';
import { type Ids } from '@/server/runtime/ids';
import { UnderlyingStore } from '@/server/underlyings/underlying-store';
import { type Bar } from '@/shared/underlyings/underlying';

export type TypedPrices = Pick<Bar, 'close' | 'open' | 'high' | 'low' | 'settlement'>;

const plain = (price: string): string => toDecimal(price).toFixed();
const plainOrNull = (price: string | null): string | null => (price === null ? null : plain(price));

export class BarService {
  constructor(
    private readonly deps: { readonly clock: Clock; readonly ids: Ids; readonly onBarsChanged: OnBarsChanged },
  ) {}

  /** Stores the bar of one session; the same prices again change nothing, not even its source. */
  async put(
    scope: DeskScope,
    { underlyingId, sessionDate, typed }: { underlyingId: string; sessionDate: string; typed: TypedPrices },
  ): Promise<Bar> {
    const now = this.deps.clock.now();
    const prices = {
      close: plain(typed.close),
      open: plainOrNull(typed.open),
      high: plainOrNull(typed.high),
      low: plainOrNull(typed.low),
      settlement: plainOrNull(typed.settlement),
    };
    refuseImpossible(sessionDate, prices, now);
    const { bar, before } = await scope.inTransaction(async (inner) => {
      await new UnderlyingStore(inner).hold(underlyingId);
      const store = new BarStore(inner);
      const before = await store.find(underlyingId, sessionDate);
      if (before !== null && isSameBar(before, prices)) return { bar: before, before };
      const row = {
        id: this.deps.ids.next(),
        underlyingId,
        sessionDate,
        ...prices,
        source: 'typed',
        storedAt: now,
      } as const;
      await store.write([row], { withSettlement: true });
      return { bar: { sessionDate, ...prices, source: row.source, storedAt: now.toISOString() }, before };
    });
    const changes = priceChanges(sessionDate, before, bar);
    if (changes.length > 0)
      await this.deps.onBarsChanged(scope, { underlyingId, fromSessionDate: sessionDate, prices: changes });
    return bar;
  }
}

function refuseImpossible(sessionDate: string, prices: TypedPrices, now: Date): void {
  const dateProblem = sessionProblem(sessionDate, { calendar: usOptionsCalendar, now: now.toISOString() });
  if (dateProblem !== null) {
    throw new InputError([
      { field: 'sessionDate', message: `The date ${sessionDate} ${dateProblem}. Choose a closed session.` },
    ]);
  }
  const range = rangeProblem(prices);
  if (range !== null) {
    throw new InputError([
      { field: range.column, message: `In the bar of ${sessionDate}, ${range.message}. Correct one of them.` },
    ]);
  }
}

const isSameBar = (bar: Bar, prices: TypedPrices): boolean =>
  bar.close === prices.close &&
  bar.open === prices.open &&
  bar.high === prices.high &&
  bar.low === prices.low &&
  bar.settlement === prices.settlement;
