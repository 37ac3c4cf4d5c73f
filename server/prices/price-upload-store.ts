import { type DeskScope } from '@/server/database/desk-scope';
import { NotFoundError } from '@/server/errors/not-found-error';
import { PriceUploadEntity } from '@/server/prices/price-upload-entity';

type Changes = Partial<Pick<PriceUploadEntity, 'state' | 'content' | 'settledReading' | 'preview'>>;

/** The caller's own uploads on one desk; someone else's is simply not found. */
export class PriceUploadStore {
  constructor(private readonly scope: DeskScope) {}

  private get rows() {
    return this.scope.repository(PriceUploadEntity);
  }

  private get personId(): string {
    return this.scope.actor.personId;
  }

  insert(row: Omit<PriceUploadEntity, 'deskId' | 'personId'>): Promise<void> {
    return this.rows.insert({ ...row, personId: this.personId });
  }

  /** @throws {NotFoundError} */
  async get(id: string, { locked = false }: { locked?: boolean } = {}): Promise<PriceUploadEntity> {
    const row = await this.rows.findOne({ id, personId: this.personId }, { locked });
    if (row === null) throw new NotFoundError();
    return row;
  }

  /** The file as it came; null once it was stored or cleared away. */
  async content(id: string): Promise<Buffer | null> {
    const row = await this.rows
      .query('upload')
      .select(['upload.id', 'upload.content'])
      .andWhere('upload.id = :id AND upload.personId = :personId', { id, personId: this.personId })
      .getOne();
    return row?.content ?? null;
  }

  async update(id: string, changes: Changes): Promise<void> {
    await this.rows.update({ id, personId: this.personId }, changes);
  }

  /** Lets go of the files that anyone on the desk left lying since before an instant. */
  async clearOlderThan(instant: Date): Promise<void> {
    const old = await this.rows
      .query('upload')
      .select(['upload.id'])
      .andWhere('upload.content IS NOT NULL AND upload.uploadedAt < :instant', { instant })
      .getMany();
    for (const { id } of old) await this.rows.update({ id }, { content: null });
  }
}
