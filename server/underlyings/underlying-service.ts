import { toModelNumber } from '@/journal/money/decimal';
import { countSessions } from '@/journal/sessions/exchange-calendar';
import { latestCloseAt } from '@/journal/sessions/session-clock';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type DeskScope } from '@/server/database/desk-scope';
import { ConflictError } from '@/server/errors/conflict-error';
import { BarStore } from '@/server/prices/bar-store';
import { type Clock } from '@/server/runtime/clock';
import { ownYearVolatility } from '@/server/underlyings/own-year-volatility';
import { UnderlyingStore, type UnderlyingFields } from '@/server/underlyings/underlying-store';
import { type Underlying } from '@/shared/underlyings/underlying';
import { type ListedUnderlying, type UnderlyingDetail } from '@/shared/underlyings/underlying-endpoints';

export class UnderlyingService {
  constructor(private readonly deps: { readonly clock: Clock }) {}

  async list(scope: DeskScope): Promise<ListedUnderlying[]> {
    const bars = new BarStore(scope);
    const [underlyings, summaries] = await Promise.all([new UnderlyingStore(scope).list(), bars.summaries()]);
    const recent = await bars.recent(summaries);
    return underlyings.map((underlying) => {
      const own = recent.get(underlying.id) ?? [];
      const lastBar = own.at(-1) ?? null;
      return {
        underlying,
        barCount: summaries.find(({ underlyingId }) => underlyingId === underlying.id)?.barCount ?? 0,
        lastBar,
        previousClose: own.at(-2)?.close ?? null,
        sessionsBehind: this.sessionsSince(lastBar?.sessionDate ?? null),
        volatility: ownYearVolatility(own.map(({ close }) => toModelNumber(close))),
      };
    });
  }

  /** The same request again gives the row it made. */
  create(scope: DeskScope, { id, ...fields }: UnderlyingFields & { readonly id: string }): Promise<Underlying> {
    return scope.inTransaction(async (inner) => {
      const store = new UnderlyingStore(inner);
      const existing = await store.find(id);
      if (existing === null) {
        await store.insert({ id, createdAt: this.deps.clock.now(), fields });
        return store.get(id);
      }
      if (isSameUnderlying(existing, fields)) return existing;
      throw new ConflictError('already-exists', `${existing.symbol} was already added with other details.`);
    });
  }

  async detail(scope: DeskScope, underlyingId: string, newestBars: number): Promise<UnderlyingDetail> {
    const underlying = await new UnderlyingStore(scope).get(underlyingId);
    const store = new BarStore(scope);
    const [bars, barCount] = await Promise.all([store.newest(underlyingId, newestBars), store.countOf(underlyingId)]);
    return { underlying, bars, barCount, sessionsBehind: this.sessionsSince(bars.at(-1)?.sessionDate ?? null) };
  }

  edit(scope: DeskScope, change: { id: string; version: number; fields: UnderlyingFields }): Promise<Underlying> {
    return scope.inTransaction((inner) => new UnderlyingStore(inner).edit(change));
  }

  private sessionsSince(lastSessionDate: string | null): number {
    if (lastSessionDate === null) return 0;
    const latest = latestCloseAt({ calendar: usOptionsCalendar, at: this.deps.clock.now().toISOString() }).date;
    return latest > lastSessionDate ? countSessions(usOptionsCalendar, { after: lastSessionDate, through: latest }) : 0;
  }
}

function isSameUnderlying(existing: Underlying, fields: UnderlyingFields): boolean {
  return (
    existing.symbol === fields.symbol &&
    existing.name === fields.name &&
    existing.style === fields.style &&
    existing.settlement === fields.settlement &&
    existing.settlementTime === fields.settlementTime &&
    toModelNumber(existing.multiplier) === toModelNumber(fields.multiplier) &&
    existing.dividendYield === fields.dividendYield &&
    existing.currency === fields.currency
  );
}
