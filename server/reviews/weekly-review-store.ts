import { type DeskScope } from '@/server/database/desk-scope';
import { NotFoundError } from '@/server/errors/not-found-error';
import { WeeklyReviewEntity } from '@/server/reviews/weekly-review-entity';

interface Week {
  readonly traderId: string;
  readonly weekStartSessionDate: string;
}

/** The weekly reviews of a desk's traders. */
export class WeeklyReviewStore {
  constructor(private readonly scope: DeskScope) {}

  private get rows() {
    return this.scope.repository(WeeklyReviewEntity);
  }

  findById(id: string): Promise<WeeklyReviewEntity | null> {
    return this.rows.findOne({ id });
  }

  /** One of the caller's own. @throws {NotFoundError} for anyone else's. */
  async getOwn(id: string): Promise<WeeklyReviewEntity> {
    const row = await this.rows.findOne({ id, traderId: this.scope.actor.personId });
    if (row === null) throw new NotFoundError();
    return row;
  }

  find({ traderId, weekStartSessionDate }: Week): Promise<WeeklyReviewEntity | null> {
    return this.rows.findOne({ traderId, weekStartSessionDate });
  }

  /** The one written about the latest week before. */
  async findLastBefore({ traderId, weekStartSessionDate }: Week): Promise<WeeklyReviewEntity | null> {
    return this.rows
      .query('review')
      .andWhere('review.traderId = :traderId', { traderId })
      .andWhere('review.weekStartSessionDate < :weekStartSessionDate', { weekStartSessionDate })
      .orderBy('review.weekStartSessionDate', 'DESC')
      .take(1)
      .getOne();
  }

  async insert(review: Omit<WeeklyReviewEntity, 'deskId'>): Promise<void> {
    await this.rows.insert(review);
  }

  /** Writes if the version is still the one the caller saw. */
  async replace(
    { id, version }: { id: string; version: number },
    changes: Pick<WeeklyReviewEntity, 'action' | 'rule' | 'evidence' | 'followedLast' | 'savedAt'>,
  ): Promise<boolean> {
    return (await this.rows.update({ id, version }, { ...changes, version: version + 1 })) === 1;
  }
}
