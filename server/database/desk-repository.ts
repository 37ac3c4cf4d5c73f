import {
  type EntityManager,
  type EntityTarget,
  type FindOptionsOrder,
  type FindOptionsWhere,
  type QueryDeepPartialEntity,
  type SelectQueryBuilder,
} from 'typeorm';
import { NotFoundError } from '@/server/errors/not-found-error';

/** A row that belongs to a desk. */
export interface DeskRow {
  id: string;
  deskId: string;
}

export interface FindOptions<E> {
  readonly order?: FindOptionsOrder<E>;
  readonly take?: number;
  /** Holds the rows until the transaction ends. */
  readonly locked?: boolean;
}

/**
 * Rows of one table on one desk. Every statement carries the desk; there is no other way to a desk's tables, so that a
 * forgotten condition cannot show one desk's rows to another.
 */
export class DeskRepository<E extends DeskRow> {
  constructor(
    private readonly manager: EntityManager,
    private readonly entity: EntityTarget<E>,
    private readonly deskId: string,
  ) {}

  find(where: FindOptionsWhere<E> | readonly FindOptionsWhere<E>[] = {}, options: FindOptions<E> = {}): Promise<E[]> {
    return this.manager.find(this.entity, {
      where: Array.isArray(where) ? where.map((part) => this.scoped(part)) : this.scoped(where as FindOptionsWhere<E>), // narrowed by isArray, which readonly lists escape
      order: options.order,
      take: options.take,
      lock: options.locked === true ? { mode: 'pessimistic_write' } : undefined,
    });
  }

  async findOne(where: FindOptionsWhere<E>, options: Omit<FindOptions<E>, 'take'> = {}): Promise<E | null> {
    const [row = null] = await this.find(where, { ...options, take: 1 });
    return row;
  }

  /** @throws {NotFoundError} when the desk has no such row. */
  async get(id: string, options: Omit<FindOptions<E>, 'take'> = {}): Promise<E> {
    const row = await this.findOne({ id } as FindOptionsWhere<E>, options); // every E has an id
    if (row === null) throw new NotFoundError();
    return row;
  }

  async insert(rows: Omit<E, 'deskId'> | readonly Omit<E, 'deskId'>[]): Promise<void> {
    const list = Array.isArray(rows) ? rows : [rows];
    if (list.length === 0) return;
    await this.manager
      .createQueryBuilder()
      .insert()
      .into(this.entity)
      .values(list.map((row: object) => ({ ...row, deskId: this.deskId })) as unknown as QueryDeepPartialEntity<E>[]) // rows are whole entities but for the desk
      .updateEntity(false)
      .execute();
  }

  /** Inserts rows, or overwrites the named columns of those that are there. */
  async upsert(
    rows: readonly Omit<E, 'deskId'>[],
    { key, overwrite }: { key: readonly string[]; overwrite: readonly string[] },
  ): Promise<void> {
    if (rows.length === 0) return;
    await this.manager
      .createQueryBuilder()
      .insert()
      .into(this.entity)
      .values(rows.map((row: object) => ({ ...row, deskId: this.deskId })) as unknown as QueryDeepPartialEntity<E>[]) // as in insert
      .orUpdate([...overwrite], [...key])
      .updateEntity(false)
      .execute();
  }

  /** Changes the rows that fit; gives their number. */
  async update(where: FindOptionsWhere<E>, changes: QueryDeepPartialEntity<E>): Promise<number> {
    const result = await this.manager.update(this.entity, this.scoped(where), changes);
    return result.affected ?? 0;
  }

  /** Removes the rows that fit; gives their number. */
  async remove(where: FindOptionsWhere<E>): Promise<number> {
    const result = await this.manager.delete(this.entity, this.scoped(where));
    return result.affected ?? 0;
  }

  /** A query over this desk's rows; conditions are added with `andWhere` only. */
  query(alias: string): SelectQueryBuilder<E> {
    return this.manager
      .createQueryBuilder(this.entity, alias)
      .where(`${alias}.deskId = :deskId`, { deskId: this.deskId });
  }

  private scoped(where: FindOptionsWhere<E>): FindOptionsWhere<E> {
    return { ...where, deskId: this.deskId };
  }
}
