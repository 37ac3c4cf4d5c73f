import { type DeskScope } from '@/server/database/desk-scope';
import { ScoredOddsEntity } from '@/server/outcomes/scored-odds-entity';

/** Stated odds of a desk's traders, by trader. */
export class ScoredOddsStore {
  constructor(private readonly scope: DeskScope) {}

  /** Resolved odds that were sealed in time, newest due first. */
  listResolved(traderIds: readonly string[], { isLateSeal }: { isLateSeal: boolean }): Promise<ScoredOddsEntity[]> {
    if (traderIds.length === 0) return Promise.resolve([]);
    return this.scope
      .repository(ScoredOddsEntity)
      .query('odds')
      .andWhere('odds.traderId IN (:...traderIds)', { traderIds })
      .andWhere('odds.happened IS NOT NULL')
      .andWhere('odds.isLateSeal = :isLateSeal', { isLateSeal })
      .orderBy('odds.dueSessionDate', 'DESC')
      .addOrderBy('odds.id', 'DESC')
      .getMany();
  }

  async countPending(traderIds: readonly string[]): Promise<number> {
    if (traderIds.length === 0) return 0;
    return this.scope
      .repository(ScoredOddsEntity)
      .query('odds')
      .andWhere('odds.traderId IN (:...traderIds)', { traderIds })
      .andWhere('odds.happened IS NULL')
      .getCount();
  }
}
