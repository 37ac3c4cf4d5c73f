import { AuditLog } from '@/server/database/audit-log';
import { isDuplicate } from '@/server/database/transaction';
import { type DeskScope } from '@/server/database/desk-scope';
import { draftSummary } from '@/server/entries/draft-summary';
import { type EntryDescriber } from '@/server/entries/describe-entry';
import { type EntryEntity } from '@/server/entries/entry-entity';
import { assertDraft, type EntryListQuery, EntryStore } from '@/server/entries/entry-store';
import { loadPlan } from '@/server/entries/plan-loader';
import { ConflictError } from '@/server/errors/conflict-error';
import { FillStore } from '@/server/fills/fill-store';
import { type Clock } from '@/server/runtime/clock';
import { type Ids } from '@/server/runtime/ids';
import { type DraftPlan } from '@/shared/entries/draft-plan';
import { type Entry, type EntryRow } from '@/shared/entries/entry';

interface Dependencies {
  readonly clock: Clock;
  readonly ids: Ids;
  readonly describer: EntryDescriber;
}
interface Versioned {
  readonly entryId: string;
  readonly version: number;
  readonly requestId: string;
}

/** Drafts from the first letter to the seal, and what is said of an entry afterwards. */
export class EntryService {
  constructor(private readonly dependencies: Dependencies) {}

  async list(scope: DeskScope, query: EntryListQuery): Promise<{ entries: EntryRow[]; next: string | null }> {
    const found = await new EntryStore(scope).list({ ...query, limit: query.limit + 1 });
    const page = found.slice(0, query.limit);
    const next = found.length > query.limit ? (page.at(-1)?.id ?? null) : null;
    return { entries: await this.dependencies.describer.rows(scope, page), next };
  }

  async read(scope: DeskScope, entryId: string): Promise<Entry> {
    return this.dependencies.describer.entry(scope, await new EntryStore(scope).getReadable(entryId));
  }

  describe(scope: DeskScope, entry: EntryEntity): Promise<Entry> {
    return this.dependencies.describer.entry(scope, entry);
  }

  /** Starts a draft; the same id again gives the draft that is there, also when both requests come at once. */
  async create(scope: DeskScope, { id, plan }: { id: string; plan: DraftPlan }): Promise<Entry> {
    try {
      return await this.insert(scope, { id, plan });
    } catch (error) {
      if (!isDuplicate(error)) throw error;
      const known = await new EntryStore(scope).findOwn(id);
      if (known === null) throw new ConflictError('already-exists', 'Another entry has this id.');
      return this.describe(scope, known);
    }
  }

  private insert(scope: DeskScope, { id, plan }: { id: string; plan: DraftPlan }): Promise<Entry> {
    return scope.inTransaction(async (inner) => {
      const entries = new EntryStore(inner);
      const known = await entries.findOwn(id);
      if (known !== null) return this.describe(inner, known);
      const now = this.dependencies.clock.now();
      await entries.insert({
        id,
        traderId: inner.actor.personId,
        underlyingId: plan.underlyingId,
        version: 1,
        state: 'draft',
        plan,
        planSavedAt: now,
        structureName: '',
        searchText: '',
        strip: null,
        expirySessionDate: null,
        exitSessionDate: null,
        holdingSessions: null,
        expectedMean: null,
        sealedAt: null,
        isLateSeal: false,
        firstFillAt: null,
        lastFillAt: null,
        realisedProfit: null,
        lesson: '',
        createdAt: now,
        ...draftSummary(plan, await loadPlan(inner, plan)),
      });
      return this.describe(inner, await entries.getOwn(id));
    });
  }

  saveDraft(
    scope: DeskScope,
    { entryId, version, plan }: { entryId: string; version: number; plan: DraftPlan },
  ): Promise<Entry> {
    return scope.inTransaction(async (inner) => {
      const entries = new EntryStore(inner);
      const entry = await entries.getOwn(entryId);
      const summary = draftSummary(plan, await loadPlan(inner, plan));
      if (entry.state !== 'draft') await this.refuseStale(inner, entryId, () => assertDraft(entry));
      const changes = { ...summary, plan, underlyingId: plan.underlyingId, planSavedAt: this.dependencies.clock.now() };
      const isWritten = await entries.replace({ id: entryId, version }, changes);
      if (!isWritten) await this.refuseStale(inner, entryId);
      return this.describe(inner, await entries.getOwn(entryId));
    });
  }

  discard(scope: DeskScope, { entryId, version, requestId }: Versioned): Promise<void> {
    return scope.inTransaction(async (inner) => {
      const entries = new EntryStore(inner);
      assertDraft(await entries.getOwn(entryId));
      const isRemoved = await entries.removeDraft({ id: entryId, version });
      if (!isRemoved) await this.refuseStale(inner, entryId);
      await this.audit(inner, requestId).note('draft-discarded', entryId);
    });
  }

  /** A sealed plan that will not be traded; its odds go on being scored. */
  abandon(scope: DeskScope, { entryId, version, requestId }: Versioned): Promise<Entry> {
    return scope.inTransaction(async (inner) => {
      const entries = new EntryStore(inner);
      const entry = await entries.getOwn(entryId, { locked: true });
      if (entry.state === 'draft')
        throw new ConflictError('step-out-of-order', 'A draft that is not wanted is discarded.');
      if ((await new FillStore(inner).list(entryId)).length > 0)
        throw new ConflictError('fills-exist', 'This plan was traded.');
      const isWritten = await entries.replace({ id: entryId, version }, { state: 'abandoned' });
      if (!isWritten) await this.refuseStale(inner, entryId);
      await this.audit(inner, requestId).note('entry-abandoned', entryId);
      return this.describe(inner, await entries.getOwn(entryId));
    });
  }

  /** The lesson of an entry; a closed one with a lesson counts as reviewed. */
  saveLesson(
    scope: DeskScope,
    { entryId, version, lesson }: { entryId: string; version: number; lesson: string },
  ): Promise<Entry> {
    return scope.inTransaction(async (inner) => {
      const entries = new EntryStore(inner);
      const entry = await entries.getOwn(entryId, { locked: true });
      if (entry.state === 'draft') throw new ConflictError('step-out-of-order', 'A lesson comes after the seal.');
      const text = lesson.trim();
      const state =
        entry.state === 'closed' && text !== ''
          ? 'reviewed'
          : entry.state === 'reviewed' && text === ''
            ? 'closed'
            : entry.state;
      const isWritten = await entries.replace({ id: entryId, version }, { lesson: text, state });
      if (!isWritten) await this.refuseStale(inner, entryId);
      return this.describe(inner, await entries.getOwn(entryId));
    });
  }

  private audit(scope: DeskScope, requestId: string): AuditLog {
    return new AuditLog(scope, { ...this.dependencies, requestId });
  }

  /** @throws always: by `first` when it does, else {ConflictError} with the entry as it stands. */
  private async refuseStale(scope: DeskScope, entryId: string, first: () => void = () => undefined): Promise<never> {
    const current = await this.describe(scope, await new EntryStore(scope).getOwn(entryId));
    if (current.row.state === 'draft') first();
    throw new ConflictError(
      current.row.state === 'draft' ? 'changed-elsewhere' : 'entry-sealed',
      'This entry was changed elsewhere.',
      [],
      current,
    );
  }
}
