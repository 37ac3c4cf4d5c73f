import { Brackets } from 'typeorm';
import { type DeskScope } from '@/server/database/desk-scope';
import { EntryEntity } from '@/server/entries/entry-entity';
import { ConflictError } from '@/server/errors/conflict-error';
import { NotFoundError } from '@/server/errors/not-found-error';
import { MembershipEntity } from '@/server/people/membership-entity';
import { MentorshipEntity } from '@/server/people/mentorship-entity';
import { type EntryState } from '@/shared/entries/entry';

export interface EntryListQuery {
  readonly state?: EntryState;
  readonly underlyingId?: string;
  readonly tag?: string;
  readonly search?: string;
  /** Id of the last entry of the page before. */
  readonly after?: string;
  readonly limit: number;
}
export type EntryChanges = Partial<Omit<EntryEntity, 'id' | 'deskId' | 'traderId' | 'version'>>;

/** The entries of one desk, and who may see which. */
export class EntryStore {
  constructor(private readonly scope: DeskScope) {}

  private get rows() {
    return this.scope.repository(EntryEntity);
  }

  /** An entry of the caller's own. @throws {NotFoundError} for anyone else's. */
  async getOwn(id: string, { locked = false }: { locked?: boolean } = {}): Promise<EntryEntity> {
    const row = await this.rows.findOne({ id, traderId: this.scope.actor.personId }, { locked });
    if (row === null) throw new NotFoundError();
    return row;
  }

  findOwn(id: string): Promise<EntryEntity | null> {
    return this.rows.findOne({ id, traderId: this.scope.actor.personId });
  }

  /** An entry the caller may read: their own, or a sealed one of a trader they mentor. @throws {NotFoundError} */
  async getReadable(id: string): Promise<EntryEntity> {
    const row = await this.rows.findOne({ id });
    if (row === null) throw new NotFoundError();
    if (row.traderId === this.scope.actor.personId) return row;
    const isShared = row.state !== 'draft' && (await this.mentoredTraderIds()).includes(row.traderId);
    if (!isShared) throw new NotFoundError();
    return row;
  }

  async insert(entry: Omit<EntryEntity, 'deskId'>): Promise<void> {
    await this.rows.insert(entry);
  }

  /** Writes if the version is still the one the caller saw; gives the next version. */
  async replace({ id, version }: { id: string; version: number }, changes: EntryChanges): Promise<boolean> {
    return (await this.rows.update({ id, version }, { ...changes, version: version + 1 })) === 1;
  }

  /** For what the server itself works out; a person's edits name a version. */
  async note(id: string, changes: EntryChanges): Promise<void> {
    await this.rows.update({ id }, changes);
  }

  async removeDraft({ id, version }: { id: string; version: number }): Promise<boolean> {
    return (await this.rows.remove({ id, version, state: 'draft' })) === 1;
  }

  /** Entries the caller may read, newest first (ids sort by time). */
  async list({ state, underlyingId, tag, search, after, limit }: EntryListQuery): Promise<EntryEntity[]> {
    const query = this.rows.query('entry');
    await this.restrictToReadable(query);
    if (state !== undefined) query.andWhere('entry.state = :state', { state });
    if (underlyingId !== undefined) query.andWhere('entry.underlyingId = :underlyingId', { underlyingId });
    if (tag !== undefined) query.andWhere("JSON_CONTAINS(entry.plan, JSON_QUOTE(:tag), '$.tags')", { tag });
    if (search !== undefined && search.trim() !== '') {
      const escaped = search.trim().replace(/[\\%_]/g, (sign) => `\\${sign}`);
      query.andWhere('entry.searchText LIKE :search', { search: `%${escaped}%` });
    }
    if (after !== undefined) query.andWhere('entry.id < :after', { after });
    return query.orderBy('entry.id', 'DESC').take(limit).getMany();
  }

  /** Sealed, open and closed entries on an underlying: those a new bar can say something about. */
  listSealedOn(underlyingId: string): Promise<EntryEntity[]> {
    return this.rows
      .query('entry')
      .andWhere('entry.underlyingId = :underlyingId', { underlyingId })
      .andWhere("entry.state <> 'draft'")
      .orderBy('entry.id')
      .getMany();
  }

  /** An entry of anyone's, held until the transaction ends. */
  hold(id: string): Promise<EntryEntity> {
    return this.rows.get(id, { locked: true });
  }

  private async restrictToReadable(query: ReturnType<typeof this.rows.query>): Promise<void> {
    const me = this.scope.actor.personId;
    const mentored = await this.mentoredTraderIds();
    query.andWhere(
      new Brackets((either) => {
        either.where('entry.traderId = :me', { me });
        if (mentored.length > 0)
          either.orWhere("(entry.traderId IN (:...mentored) AND entry.state <> 'draft')", { mentored });
      }),
    );
  }

  /** Traders whose accepted, unrevoked mentor the caller is. */
  async mentoredTraderIds(): Promise<string[]> {
    const rows = await this.scope.repository(MentorshipEntity).find({ mentorId: this.scope.actor.personId });
    const linked = rows
      .filter(({ acceptedAt, revokedAt }) => acceptedAt !== null && revokedAt === null)
      .map(({ traderId }) => traderId);
    if (linked.length === 0) return [];
    const members = await this.scope.repository(MembershipEntity).find();
    return linked.filter((traderId) => members.some(({ personId }) => personId === traderId));
  }
}

/** A sealed entry stays as it is. @throws {ConflictError} `entry-sealed`. */
export function assertDraft({ state }: Pick<EntryEntity, 'state'>): void {
  if (state !== 'draft') throw new ConflictError('entry-sealed', 'This forecast is sealed.');
}
