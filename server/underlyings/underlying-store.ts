import { toDecimal } from '@/journal/money/decimal';
import { type DeskScope } from '@/server/database/desk-scope';
import { isDuplicate } from '@/server/database/transaction';
import { ConflictError } from '@/server/errors/conflict-error';
import { UnderlyingEntity } from '@/server/underlyings/underlying-entity';
import { type Underlying } from '@/shared/underlyings/underlying';

export type UnderlyingFields = Omit<Underlying, 'id' | 'version'>;

const underlyingOf = (row: UnderlyingEntity): Underlying => ({
  id: row.id,
  version: row.version,
  symbol: row.symbol,
  name: row.name,
  style: row.style,
  settlement: row.settlement,
  settlementTime: row.settlementTime,
  multiplier: toDecimal(row.multiplier).toFixed(),
  dividendYield: row.dividendYield,
  currency: row.currency,
});

/** A write that met another row with the same symbol; anything else is thrown on. */
const symbolTaken = (error: unknown, symbol: string): unknown =>
  isDuplicate(error)
    ? new ConflictError('symbol-taken', `Your desk already has an underlying ${symbol}.`, [
        { field: 'symbol', message: `${symbol} is taken on this desk.` },
      ])
    : error;

/** The underlyings of one desk. */
export class UnderlyingStore {
  constructor(private readonly scope: DeskScope) {}

  private get rows() {
    return this.scope.repository(UnderlyingEntity);
  }

  async list(): Promise<Underlying[]> {
    return (await this.rows.find({}, { order: { symbol: 'ASC' } })).map(underlyingOf);
  }

  async find(id: string): Promise<Underlying | null> {
    const row = await this.rows.findOne({ id });
    return row === null ? null : underlyingOf(row);
  }

  /** @throws {NotFoundError} when the desk has none with this id. */
  async get(id: string): Promise<Underlying> {
    return underlyingOf(await this.rows.get(id));
  }

  /** Lets one writer of this underlying's bars in at a time. @throws {NotFoundError} */
  async hold(id: string): Promise<void> {
    await this.rows.get(id, { locked: true });
  }

  async insert({ id, createdAt, fields }: { id: string; createdAt: Date; fields: UnderlyingFields }): Promise<void> {
    await this.rows.insert({ id, version: 1, createdAt, ...fields }).catch((error: unknown) => {
      throw symbolTaken(error, fields.symbol);
    });
  }

  /** @throws {ConflictError} `changed-elsewhere` with the row as it stands. */
  async edit({ id, version, fields }: { id: string; version: number; fields: UnderlyingFields }): Promise<Underlying> {
    const changed = await this.rows
      .update({ id, version }, { ...fields, version: version + 1 })
      .catch((error: unknown) => {
        throw symbolTaken(error, fields.symbol);
      });
    const current = await this.get(id);
    if (changed !== 1) {
      throw new ConflictError('changed-elsewhere', `${current.symbol} was changed since you opened it.`, [], current);
    }
    return current;
  }
}
