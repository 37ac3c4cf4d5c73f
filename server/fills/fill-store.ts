import { type Fill } from '@/journal/fills/fill';
import { toDecimal, toDecimalText } from '@/journal/money/decimal';
import { type DeskScope } from '@/server/database/desk-scope';
import { FillEntity } from '@/server/fills/fill-entity';

export interface StoredFill {
  readonly fill: Fill & Pick<FillEntity, 'instrument'>;
  readonly timeZone: string;
  /** Decimal text; null where it was not noted. */
  readonly underlyingPrice: string | null;
  readonly midPrice: string | null;
  readonly madeBy: string | null;
}

const plain = (text: string) => toDecimalText(toDecimal(text));

/** The fills of one desk's entries. */
export class FillStore {
  constructor(private readonly scope: DeskScope) {}

  private get rows() {
    return this.scope.repository(FillEntity);
  }

  /** Oldest first. */
  async list(entryId: string): Promise<StoredFill[]> {
    const rows = await this.rows.find({ entryId }, { order: { tradedAt: 'ASC', sequence: 'ASC' } });
    return rows.map(storedFill);
  }

  /** The fills of several entries by the entry's id, oldest first. */
  async listOf(entryIds: readonly string[]): Promise<Map<string, StoredFill[]>> {
    const rows = await this.rows
      .query('fill')
      .andWhere('fill.entryId IN (:...entryIds)', { entryIds })
      .orderBy('fill.tradedAt')
      .addOrderBy('fill.sequence')
      .getMany();
    const byEntry = new Map(entryIds.map((id) => [id, new Array<StoredFill>()]));
    for (const row of rows) byEntry.get(row.entryId)?.push(storedFill(row));
    return byEntry;
  }

  find(id: string): Promise<FillEntity | null> {
    return this.rows.findOne({ id });
  }

  async insert(fills: readonly Omit<FillEntity, 'deskId'>[]): Promise<void> {
    await this.rows.insert(fills);
  }

  /** Removes a fill with the shares it made; gives the number of rows. */
  async remove(entryId: string, id: string): Promise<number> {
    return (await this.rows.remove({ entryId, madeBy: id })) + (await this.rows.remove({ entryId, id }));
  }
}

function storedFill(row: FillEntity): StoredFill {
  return {
    fill: {
      id: row.id,
      kind: row.kind,
      instrument: row.instrument,
      quantity: plain(row.quantity),
      price: plain(row.price),
      fees: plain(row.fees),
      tradedAt: row.tradedAt.toISOString(),
      sequence: row.sequence,
    },
    timeZone: row.timeZone,
    underlyingPrice: row.underlyingPrice === null ? null : plain(row.underlyingPrice),
    midPrice: row.midPrice === null ? null : plain(row.midPrice),
    madeBy: row.madeBy,
  };
}
