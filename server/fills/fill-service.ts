import { DomainError } from '@/journal/errors/domain-error';
import { type Fill } from '@/journal/fills/fill';
import { isFlat, openPositions } from '@/journal/fills/position';
import { sharesFromExercise } from '@/journal/fills/underlying-shares';
import { AuditLog } from '@/server/database/audit-log';
import { isDuplicate } from '@/server/database/transaction';
import { type DeskScope } from '@/server/database/desk-scope';
import { type EntryEntity } from '@/server/entries/entry-entity';
import { EntryStore } from '@/server/entries/entry-store';
import { ApiFailure } from '@/server/errors/api-failure';
import { ConflictError } from '@/server/errors/conflict-error';
import { NotFoundError } from '@/server/errors/not-found-error';
import { fillProblemOf } from '@/server/fills/fill-problem';
import { FillStore } from '@/server/fills/fill-store';
import { refuseUnkeepable } from '@/server/fills/refuse-unkeepable';
import { fillCause } from '@/server/outcomes/outcome-cause';
import { type OutcomeService } from '@/server/outcomes/outcome-service';
import { type Clock } from '@/server/runtime/clock';
import { type Ids } from '@/server/runtime/ids';
import { UnderlyingStore } from '@/server/underlyings/underlying-store';
import { type OutcomeCause } from '@/shared/entries/outcome-history';
import { type NewFill } from '@/shared/entries/fill-form';

interface Dependencies {
  readonly clock: Clock;
  readonly ids: Ids;
  readonly outcomes: OutcomeService;
}
interface FillAddition {
  readonly entryId: string;
  readonly fill: NewFill;
  readonly requestId: string;
}
const MOST_AHEAD_MS = 24 * 3_600_000;

/** Fills typed by hand: they move an entry from sealed to open to closed. */
export class FillService {
  constructor(private readonly dependencies: Dependencies) {}

  /** Adds a fill; the same id again gives the entry as it is. */
  async add(scope: DeskScope, addition: FillAddition): Promise<EntryEntity> {
    try {
      return await this.insert(scope, addition);
    } catch (error) {
      // A fill of this entry would have been found under the entry's lock, so the id is taken elsewhere.
      throw isDuplicate(error) ? new ConflictError('already-exists', 'Another fill has this id.') : error;
    }
  }

  private insert(scope: DeskScope, { entryId, fill, requestId }: FillAddition): Promise<EntryEntity> {
    return scope.inTransaction(async (inner) => {
      const entries = new EntryStore(inner);
      const entry = await entries.getOwn(entryId, { locked: true });
      if (entry.state === 'draft')
        throw new ConflictError('step-out-of-order', 'Seal the plan before its fills are added.');
      if (entry.state === 'abandoned')
        throw new ConflictError('step-out-of-order', 'This plan was given up; it takes no fills.');
      const store = new FillStore(inner);
      const known = await store.find(fill.id);
      if (known !== null) {
        if (known.entryId !== entryId) throw new NotFoundError();
        return entry;
      }
      await this.refuseImpossible(inner, entry, fill);
      const before = await store.list(entryId);
      const sequence = before.reduce((last, { fill: { sequence: own } }) => Math.max(last, own), 0) + 1;
      const added = await this.withShares(inner, entry, { ...fill, sequence });
      const together = [...before.map(({ fill: stored }) => stored), ...added.map(({ fill: made }) => made)];
      assertPossible(together);
      refuseUnkeepable(together);
      const addedAt = this.dependencies.clock.now();
      await store.insert(
        added.map(({ fill: { tradedAt, ...made }, madeBy }) => ({
          ...made,
          entryId,
          tradedAt: new Date(tradedAt),
          timeZone: fill.timeZone,
          // Shares from an exercise change hands at the strike: no price stands beside them.
          underlyingPrice: madeBy === null ? fill.underlyingPrice : null,
          midPrice: madeBy === null ? fill.midPrice : null,
          madeBy,
          addedAt,
        })),
      );
      await this.settle(inner, entry, fillCause('added', fill));
      await new AuditLog(inner, { ...this.dependencies, requestId }).note('fill-added', fill.id, {
        entryId,
        kind: fill.kind,
      });
      return entries.getOwn(entryId);
    });
  }

  /** Takes a mistyped fill out, with the shares it made; the audit trail keeps what it was. */
  remove(
    scope: DeskScope,
    { entryId, fillId, requestId }: { entryId: string; fillId: string; requestId: string },
  ): Promise<EntryEntity> {
    return scope.inTransaction(async (inner) => {
      const entries = new EntryStore(inner);
      const entry = await entries.getOwn(entryId, { locked: true });
      const store = new FillStore(inner);
      const fills = await store.list(entryId);
      const target = fills.find(({ fill }) => fill.id === fillId);
      if (target === undefined) throw new NotFoundError();
      if (target.madeBy !== null)
        throw new ConflictError('step-out-of-order', 'These shares came from an exercise. Take that out instead.');
      assertPossible(
        fills.filter(({ fill, madeBy }) => fill.id !== fillId && madeBy !== fillId).map(({ fill }) => fill),
      );
      await store.remove(entryId, fillId);
      await this.settle(inner, entry, fillCause('taken-out', target.fill));
      await new AuditLog(inner, { ...this.dependencies, requestId }).note('fill-removed', fillId, {
        entryId,
        fill: target.fill,
      });
      return entries.getOwn(entryId);
    });
  }

  /** State, dates and lateness follow from the fills; then the outcome is computed again. */
  private async settle(scope: DeskScope, entry: EntryEntity, cause: OutcomeCause): Promise<void> {
    const fills = (await new FillStore(scope).list(entry.id)).map(({ fill }) => fill);
    const times = fills.map(({ tradedAt }) => tradedAt).sort();
    const [first] = times;
    const last = times.at(-1);
    const state =
      first === undefined ? 'sealed' : isFlat(fills) ? (entry.lesson === '' ? 'closed' : 'reviewed') : 'open';
    const isLateSeal = first !== undefined && entry.sealedAt !== null && entry.sealedAt.toISOString() > first;
    await new EntryStore(scope).replace(entry, {
      state,
      isLateSeal,
      firstFillAt: first === undefined ? null : new Date(first),
      lastFillAt: last === undefined ? null : new Date(last),
    });
    await this.dependencies.outcomes.recompute(scope, entry.id, cause);
  }

  private async refuseImpossible(
    scope: DeskScope,
    entry: EntryEntity,
    { instrument, tradedAt, kind, price }: NewFill,
  ): Promise<void> {
    const refuse = (field: string, message: string) => new ApiFailure('fill-impossible', message, [{ field, message }]);
    const underlying = await new UnderlyingStore(scope).get(entry.underlyingId);
    const symbol = instrument.kind === 'stock' ? instrument.symbol : instrument.underlyingSymbol;
    if (symbol !== underlying.symbol)
      throw refuse('contract', `This entry is on ${underlying.symbol}, the fill on ${symbol}.`);
    if (Date.parse(tradedAt) > this.dependencies.clock.now().getTime() + MOST_AHEAD_MS)
      throw refuse('date', 'The time of the fill is in the future. Correct date and time.');
    if (kind === 'expiry' && underlying.settlement === 'physical' && Number(price) !== 0) {
      throw refuse(
        'price',
        'An option that expires ends at price 0; one that is exercised is added as exercised or assigned.',
      );
    }
  }

  /** An exercise or assignment of an option with delivery also makes the shares, at the strike. */
  private async withShares(
    scope: DeskScope,
    entry: EntryEntity,
    { timeZone: _, underlyingPrice: __, midPrice: ___, ...fill }: NewFill & { sequence: number },
  ) {
    const underlying = await new UnderlyingStore(scope).get(entry.underlyingId);
    const isDelivery = (fill.kind === 'exercise' || fill.kind === 'assignment') && underlying.settlement === 'physical';
    const own = { fill, madeBy: null };
    if (!isDelivery) return [own];
    try {
      const { instrument, ...shares } = sharesFromExercise(fill, { id: this.dependencies.ids.next() });
      if (instrument.kind !== 'stock') throw new TypeError('Delivery makes shares.');
      return [own, { fill: { ...shares, instrument, sequence: fill.sequence + 1 }, madeBy: fill.id }];
    } catch (error) {
      throw error instanceof DomainError ? fillProblemOf(error) : error;
    }
  }
}

/** @throws {ApiFailure} `fill-impossible` when the fills together cannot have happened. */
function assertPossible(fills: readonly Fill[]): void {
  try {
    openPositions(fills);
  } catch (error) {
    throw error instanceof DomainError ? fillProblemOf(error) : error;
  }
}
