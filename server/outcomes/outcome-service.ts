import { type EntryOutcome, type OutcomeBar } from '@/journal/outcome/entry-outcome';
import { resolveEntry } from '@/journal/outcome/resolve-entry';
import { toModelNumber } from '@/journal/money/decimal';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { type DeskScope } from '@/server/database/desk-scope';
import { EntryEntity } from '@/server/entries/entry-entity';
import { EntryStore } from '@/server/entries/entry-store';
import { FillStore } from '@/server/fills/fill-store';
import { OutcomeChangeStore } from '@/server/outcomes/outcome-change-store';
import { pricesCause } from '@/server/outcomes/outcome-cause';
import { OutcomeEntity } from '@/server/outcomes/outcome-entity';
import { ScoredEntryStore } from '@/server/outcomes/scored-entry-store';
import { ScoredOddsEntity } from '@/server/outcomes/scored-odds-entity';
import { BarStore } from '@/server/prices/bar-store';
import { type BarsChange } from '@/server/prices/bars-changed';
import { type Clock } from '@/server/runtime/clock';
import { type Ids } from '@/server/runtime/ids';
import { sealedAtOf, SealStore, type StoredSeal } from '@/server/seals/seal-store';
import { type Bar } from '@/shared/underlyings/underlying';
import { type OutcomeCause } from '@/shared/entries/outcome-history';
import { oddsStatement } from '@/shared/entries/odds-statement';

/** A hold and what follows its expiry fits in this many sessions many times over. */
const BARS = 520;

/** Sets expected against realised, again whenever a seal, a fill or a bar changes what is known. */
export class OutcomeService {
  constructor(private readonly dependencies: { readonly clock: Clock; readonly ids: Ids }) {}

  /** Every sealed entry on an underlying whose story the new bars go on telling. */
  async onBarsChanged(scope: DeskScope, { underlyingId, fromSessionDate, prices }: BarsChange): Promise<void> {
    const entries = await new EntryStore(scope).listSealedOn(underlyingId);
    const ids = entries
      .filter(({ expirySessionDate }) => expirySessionDate === null || expirySessionDate >= fromSessionDate)
      .map(({ id }) => id);
    if (ids.length === 0) return;
    await scope.inTransaction(async (inner) => {
      // The entries are held first, one by one in order: the bars read afterwards are then no older than those of whoever held
      // them before, and no two wait for each other.
      const touched: EntryEntity[] = [];
      for (const id of ids) touched.push(await new EntryStore(inner).hold(id));
      const bars = await new BarStore(inner).newest(underlyingId, BARS);
      for (const entry of touched)
        await this.recomputeWith(inner, entry, bars, ({ content: { input } }) =>
          pricesCause(prices, { input, expirySessionDate: entry.expirySessionDate }),
        );
    });
  }

  async recompute(scope: DeskScope, entryId: string, cause: OutcomeCause): Promise<void> {
    const entry = await scope.repository(EntryEntity).get(entryId);
    await this.recomputeWith(scope, entry, await new BarStore(scope).newest(entry.underlyingId, BARS), () => cause);
  }

  private async recomputeWith(
    scope: DeskScope,
    entry: EntryEntity,
    bars: readonly Bar[],
    causeFor: (seal: StoredSeal) => OutcomeCause,
  ): Promise<void> {
    const seal = await new SealStore(scope).findByEntry(entry.id);
    if (seal === null) return;
    const { input, forecast } = seal.content;
    const stored = await new FillStore(scope).list(entry.id);
    const fills = stored.map(({ fill }) => fill);
    const marks = new Map(
      stored.map(({ fill, underlyingPrice, midPrice }) => [fill.id, { underlyingPrice, midPrice }]),
    );
    const now = this.dependencies.clock.now();
    const barsSince = bars.filter((bar) => isBetween(bar, input.spot.at, now.toISOString())).map(outcomeBar);
    const outcome = resolveEntry(
      { input, forecast, fills, barsSince, marks, sealedAt: sealedAtOf(seal.link) },
      usOptionsCalendar,
    );
    const before = await scope.repository(OutcomeEntity).findOne({ entryId: entry.id });
    await new OutcomeChangeStore(scope).keep({
      id: this.dependencies.ids.next(),
      entryId: entry.id,
      input,
      before: before?.outcome ?? null,
      after: outcome,
      cause: causeFor(seal),
      at: now,
    });
    await this.store(scope, entry, seal, outcome);
    const landed = outcome.move?.inSigmas ?? null;
    const soFar = outcome.moveSoFar?.inSigmas ?? null;
    await new EntryStore(scope).note(entry.id, {
      strip: entry.strip === null ? null : { ...entry.strip, landed, now: soFar },
      realisedProfit: outcome.profit?.realised ?? null,
    });
  }

  private async store(scope: DeskScope, entry: EntryEntity, seal: StoredSeal, outcome: EntryOutcome): Promise<void> {
    const { clock, ids } = this.dependencies;
    await scope
      .repository(OutcomeEntity)
      .upsert(
        [{ id: ids.next(), entryId: entry.id, outcome, isComplete: outcome.isComplete, computedAt: clock.now() }],
        { key: ['desk_id', 'entry_id'], overwrite: ['outcome', 'is_complete', 'computed_at'] },
      );
    await scope.repository(ScoredOddsEntity).upsert(
      outcome.odds.map(({ odds, happened, cannotTell }) => ({
        id: ids.next(),
        entryId: entry.id,
        traderId: entry.traderId,
        oddsKey: odds.key,
        statement: oddsStatement(odds, seal.content.input),
        dueSessionDate: odds.dueSessionDate,
        probability: odds.probability.base,
        marketImplied: odds.marketImplied,
        happened,
        cannotTell: cannotTell !== null,
        isLateSeal: entry.isLateSeal,
      })),
      { key: ['desk_id', 'entry_id', 'odds_key'], overwrite: ['happened', 'cannot_tell', 'is_late_seal'] },
    );
    await new ScoredEntryStore(scope).keep(ids.next(), entry, seal, outcome);
  }
}

/** Whether a bar's session closed after the one instant and by the other. */
function isBetween({ sessionDate }: Bar, after: string, by: string): boolean {
  const closesAt = usOptionsCalendar.sessionOn(sessionDate)?.closesAt;
  return closesAt !== undefined && closesAt > after && closesAt <= by;
}

function outcomeBar({ sessionDate, open, close, high, low, settlement }: Bar): OutcomeBar {
  const numberOrNull = (text: string | null) => (text === null ? null : toModelNumber(text));
  return {
    sessionDate,
    open: numberOrNull(open),
    close: toModelNumber(close),
    high: numberOrNull(high),
    low: numberOrNull(low),
    settlement: numberOrNull(settlement),
  };
}
