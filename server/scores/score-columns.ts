import { type SelectQueryBuilder } from 'typeorm';
import { type HorizonClass } from '@/journal/scoring/horizon-class';
import { type DeskScope } from '@/server/database/desk-scope';
import { ScoredEntryEntity } from '@/server/outcomes/scored-entry-entity';
import { ScoredOddsEntity } from '@/server/outcomes/scored-odds-entity';
import { type ScoreFilter } from '@/shared/scores/score-filter';

/** What the figures need of an entry. */
export interface EntryColumns {
  readonly entryId: string;
  readonly traderId: string;
  readonly underlyingId: string;
  readonly structureKind: string;
  readonly horizonClass: HorizonClass;
  readonly tags: readonly string[];
  readonly firstSessionDate: string;
  readonly exitSessionDate: string;
  readonly judgedSessionDate: string | null;
  readonly isLateSeal: boolean;
  readonly volatilityMethod: string;
  readonly moveDeviations: number | null;
  readonly movePlace: number | null;
  readonly volatilityRatio: number | null;
  readonly profitPlaceLow: number | null;
  readonly profitPlaceHigh: number | null;
  readonly expectedMean: number;
  readonly expectedDeviation: number;
  readonly realisedProfit: string | null;
  readonly profitFromMove: string | null;
  readonly profitFromTime: string | null;
  readonly profitFromVolatility: string | null;
  readonly profitFromCarry: string | null;
  readonly profitFromMarks: string | null;
  readonly profitFromSlippage: string | null;
  readonly profitFromFees: string | null;
  readonly isFollowed: boolean | null;
  readonly exitTag: string | null;
}

/** What the figures need of resolved odds, beside their entry. */
export interface OddsColumns {
  readonly entryId: string;
  readonly oddsKey: string;
  readonly dueSessionDate: string;
  readonly probability: number;
  readonly marketImplied: number | null;
  readonly happened: boolean;
}

const entryColumns = [
  'entryId',
  'traderId',
  'underlyingId',
  'structureKind',
  'horizonClass',
  'tags',
  'firstSessionDate',
  'exitSessionDate',
  'judgedSessionDate',
  'isLateSeal',
  'volatilityMethod',
  'moveDeviations',
  'movePlace',
  'volatilityRatio',
  'profitPlaceLow',
  'profitPlaceHigh',
  'expectedMean',
  'expectedDeviation',
  'realisedProfit',
  'profitFromMove',
  'profitFromTime',
  'profitFromVolatility',
  'profitFromCarry',
  'profitFromMarks',
  'profitFromSlippage',
  'profitFromFees',
  'isFollowed',
  'exitTag',
] as const satisfies readonly (keyof EntryColumns)[];

type Flag = 0 | 1;
type RawEntry = Omit<EntryColumns, 'tags' | 'isLateSeal' | 'isFollowed'> & {
  readonly tags: unknown;
  readonly isLateSeal: Flag;
  readonly isFollowed: Flag | null;
};

/** Scored rows of some traders of a desk as plain columns, a statement a set. */
export class ScoreColumns {
  constructor(
    private readonly scope: DeskScope,
    private readonly traderIds: readonly string[],
  ) {}

  /** Entries that fit, in the order of their planned exits. */
  async entries(filter: ScoreFilter): Promise<EntryColumns[]> {
    if (this.traderIds.length === 0) return [];
    const query = this.scope.repository(ScoredEntryEntity).query('entry');
    const rows = await this.narrowed(query, filter)
      .select(entryColumns.map((name) => `entry.${name} AS ${name}`))
      .orderBy('entry.exitSessionDate')
      .addOrderBy('entry.entryId')
      .getRawMany<RawEntry>();
    return rows.map((row) => ({
      ...row,
      tags: tagsOf(row.tags),
      isLateSeal: row.isLateSeal === 1,
      isFollowed: row.isFollowed === null ? null : row.isFollowed === 1,
    }));
  }

  /** Resolved odds of entries that fit, in the order they fell due. */
  async resolvedOdds(filter: ScoreFilter): Promise<OddsColumns[]> {
    if (this.traderIds.length === 0) return [];
    const rows = await this.oddsOf(filter)
      .andWhere('odds.happened IS NOT NULL')
      .select([
        'odds.entryId AS entryId',
        'odds.oddsKey AS oddsKey',
        'odds.dueSessionDate AS dueSessionDate',
        'odds.probability AS probability',
        'odds.marketImplied AS marketImplied',
        'odds.happened AS happened',
      ])
      .orderBy('odds.dueSessionDate')
      .addOrderBy('odds.id')
      .getRawMany<Omit<OddsColumns, 'happened'> & { readonly happened: Flag }>();
    return rows.map((row) => ({ ...row, happened: row.happened === 1 }));
  }

  /** Odds without an answer: those still waited for, and those that no bars will answer. */
  async countUnanswered(filter: ScoreFilter): Promise<{ pending: number; cannotTell: number }> {
    if (this.traderIds.length === 0) return { pending: 0, cannotTell: 0 };
    const rows = await this.oddsOf(filter)
      .andWhere('odds.happened IS NULL')
      .select(['odds.cannotTell AS cannotTell', 'COUNT(*) AS number'])
      .groupBy('odds.cannotTell')
      .getRawMany<{ cannotTell: Flag; number: number | string }>();
    const numberOf = (flag: Flag) => Number(rows.find(({ cannotTell }) => cannotTell === flag)?.number ?? 0);
    return { pending: numberOf(0), cannotTell: numberOf(1) };
  }

  /** How many odds sealed in time are resolved, and their mean Brier score. */
  async brief(): Promise<{ count: number; meanBrierScore: number }> {
    if (this.traderIds.length === 0) return { count: 0, meanBrierScore: 0 };
    const row = await this.scope
      .repository(ScoredOddsEntity)
      .query('odds')
      .andWhere('odds.traderId IN (:...traderIds)', { traderIds: this.traderIds })
      .andWhere('odds.happened IS NOT NULL')
      .andWhere('odds.isLateSeal = 0')
      .select([
        'COUNT(*) AS number',
        'AVG((odds.probability - odds.happened) * (odds.probability - odds.happened)) AS mean',
      ])
      .getRawOne<{ number: number | string; mean: number | null }>();
    return { count: Number(row?.number ?? 0), meanBrierScore: row?.mean ?? 0 };
  }

  /** What the traders' entries can be told apart by, each combination once. */
  async combinations(): Promise<
    Pick<EntryColumns, 'traderId' | 'underlyingId' | 'structureKind' | 'horizonClass' | 'tags'>[]
  > {
    if (this.traderIds.length === 0) return [];
    const names = ['traderId', 'underlyingId', 'structureKind', 'horizonClass', 'tags'] as const;
    const query = this.narrowed(this.scope.repository(ScoredEntryEntity).query('entry'), {}).select(
      names.map((name) => `entry.${name} AS ${name}`),
    );
    const rows = await query
      .distinct(true)
      .getRawMany<Pick<RawEntry, 'traderId' | 'underlyingId' | 'structureKind' | 'horizonClass' | 'tags'>>();
    return rows.map((row) => ({ ...row, tags: tagsOf(row.tags) }));
  }

  private oddsOf(filter: ScoreFilter): SelectQueryBuilder<ScoredOddsEntity> {
    const query = this.scope
      .repository(ScoredOddsEntity)
      .query('odds')
      .innerJoin(ScoredEntryEntity, 'entry', 'entry.deskId = odds.deskId AND entry.entryId = odds.entryId');
    return this.narrowed(query, filter);
  }

  private narrowed<Row extends object>(query: SelectQueryBuilder<Row>, filter: ScoreFilter): SelectQueryBuilder<Row> {
    const { traderId, underlyingId, structureKind, horizonClass, tag, from, to, traded } = filter;
    query.andWhere('entry.traderId IN (:...traderIds)', { traderIds: this.traderIds });
    // On top of the traders that may be read: naming another finds nothing.
    if (traderId !== undefined) query.andWhere('entry.traderId = :traderId', { traderId });
    if (underlyingId !== undefined) query.andWhere('entry.underlyingId = :underlyingId', { underlyingId });
    if (structureKind !== undefined) query.andWhere('entry.structureKind = :structureKind', { structureKind });
    if (horizonClass !== undefined) query.andWhere('entry.horizonClass = :horizonClass', { horizonClass });
    if (tag !== undefined) query.andWhere('JSON_CONTAINS(entry.tags, JSON_QUOTE(:tag))', { tag });
    if (from !== undefined) query.andWhere('entry.exitSessionDate >= :from', { from });
    if (to !== undefined) query.andWhere('entry.exitSessionDate <= :to', { to });
    if (traded !== undefined) query.andWhere('entry.isTraded = :isTraded', { isTraded: traded === 'yes' });
    return query;
  }
}

/** The driver reads a column that the database calls JSON, and hands on the text of one that went through a temporary table. */
function tagsOf(stored: unknown): readonly string[] {
  const value: unknown = typeof stored === 'string' ? JSON.parse(stored) : stored;
  return Array.isArray(value) ? value.filter((tag) => typeof tag === 'string') : [];
}
