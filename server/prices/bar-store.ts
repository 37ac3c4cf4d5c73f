import { toDecimal } from '@/journal/money/decimal';
import { addDays } from '@/journal/sessions/session-date';
import { type DeskScope } from '@/server/database/desk-scope';
import { BarEntity } from '@/server/prices/bar-entity';
import { type BarPrices } from '@/server/prices/compare-bars';
import { type Bar } from '@/shared/underlyings/underlying';

/** Rows of one INSERT: large enough to be quick, small enough for any packet limit. */
const rowsPerStatement = 1_000;
/** About 300 sessions: the past year's rolling volatilities and the window before them. */
const recentCalendarDays = 440;

/** The column's fixed scale is the database's affair; prices are compared and shown in their one plain spelling. */
const plain = (price: string): string => toDecimal(price).toFixed();
const plainOrNull = (price: string | null): string | null => (price === null ? null : plain(price));

const pricesOf = ({ close, open, high, low }: BarEntity): BarPrices => ({
  close: plain(close),
  open: plainOrNull(open),
  high: plainOrNull(high),
  low: plainOrNull(low),
});

export const barOf = (row: BarEntity): Bar => ({
  sessionDate: row.sessionDate,
  ...pricesOf(row),
  settlement: plainOrNull(row.settlement),
  source: row.source,
  storedAt: row.storedAt.toISOString(),
});

export interface BarSummary {
  readonly underlyingId: string;
  readonly barCount: number;
  readonly lastSessionDate: string;
}

/** The bars of one desk. */
export class BarStore {
  constructor(private readonly scope: DeskScope) {}

  private get rows() {
    return this.scope.repository(BarEntity);
  }

  async pricesByDate(underlyingId: string): Promise<Map<string, BarPrices>> {
    const rows = await this.rows.find({ underlyingId });
    return new Map(rows.map((row) => [row.sessionDate, pricesOf(row)]));
  }

  async find(underlyingId: string, sessionDate: string): Promise<Bar | null> {
    const row = await this.rows.findOne({ underlyingId, sessionDate });
    return row === null ? null : barOf(row);
  }

  /** The newest bars, oldest first. */
  async newest(underlyingId: string, count: number): Promise<Bar[]> {
    const rows = await this.rows.find({ underlyingId }, { order: { sessionDate: 'DESC' }, take: count });
    return rows.map(barOf).reverse();
  }

  async summaries(): Promise<BarSummary[]> {
    const raw: { underlyingId: string; barCount: string; lastSessionDate: string }[] = await this.rows
      .query('bar')
      .select('bar.underlyingId', 'underlyingId')
      .addSelect('COUNT(*)', 'barCount')
      .addSelect('CAST(MAX(bar.sessionDate) AS CHAR)', 'lastSessionDate')
      .groupBy('bar.underlyingId')
      .getRawMany();
    return raw.map((row) => ({ ...row, barCount: Number(row.barCount) })); // counts come as text
  }

  /** About the last 300 bars of each underlying, oldest first, in one query. */
  async recent(summaries: readonly BarSummary[]): Promise<Map<string, Bar[]>> {
    if (summaries.length === 0) return new Map();
    const parameters: Record<string, string> = {};
    const conditions = summaries.map(({ underlyingId, lastSessionDate }, index) => {
      parameters[`underlying${index}`] = underlyingId;
      parameters[`from${index}`] = addDays(lastSessionDate, -recentCalendarDays);
      return `bar.underlyingId = :underlying${index} AND bar.sessionDate >= :from${index}`;
    });
    const rows = await this.rows
      .query('bar')
      .andWhere(`(${conditions.join(' OR ')})`, parameters)
      .orderBy('bar.sessionDate', 'ASC')
      .getMany();
    const recent = new Map<string, Bar[]>();
    for (const row of rows) {
      const bars = recent.get(row.underlyingId) ?? [];
      bars.push(barOf(row));
      recent.set(row.underlyingId, bars);
    }
    return recent;
  }

  async countOf(underlyingId: string): Promise<number> {
    return this.rows.query('bar').andWhere('bar.underlyingId = :underlyingId', { underlyingId }).getCount();
  }

  /** Stores bars, each as it shall stand; the settlement value of an upload's session stays as it was. */
  async write(
    bars: readonly Omit<BarEntity, 'deskId'>[],
    { withSettlement }: { withSettlement: boolean },
  ): Promise<void> {
    const overwrite = [
      'close',
      'open',
      'high',
      'low',
      ...(withSettlement ? ['settlement'] : []),
      'source',
      'stored_at',
    ];
    for (let start = 0; start < bars.length; start += rowsPerStatement) {
      await this.rows.upsert(bars.slice(start, start + rowsPerStatement), {
        key: ['desk_id', 'underlying_id', 'session_date'],
        overwrite,
      });
    }
  }
}
