import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { idColumn, instantColumn } from '@/server/database/columns';
import { MembershipEntity } from '@/server/people/membership-entity';
import { type RuleAction, type RuleFollowing } from '@/shared/reviews/weekly-review-endpoints';

/** The one rule a trader took from a week, and whether the one before was followed. */
@Entity({ name: 'weekly_review' })
@Index('uq_weekly_review_desk_id', ['deskId', 'id'], { unique: true })
@Index('uq_weekly_review_week', ['deskId', 'traderId', 'weekStartSessionDate'], { unique: true })
@ForeignKey(() => MembershipEntity, ['deskId', 'traderId'], ['deskId', 'personId'], {
  name: 'fk_weekly_review_trader_id',
  onDelete: 'RESTRICT',
})
export class WeeklyReviewEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column(idColumn('trader_id')) traderId!: string;
  @Column({ type: 'int' }) version!: number;
  @Column({ name: 'week_start_session_date', type: 'date' }) weekStartSessionDate!: string;
  @Column({ type: 'varchar', length: 6 }) action!: RuleAction;
  @Column({ name: 'rule_text', type: 'text' }) rule!: string;
  @Column({ type: 'text' }) evidence!: string;
  @Column({ name: 'followed_last', type: 'varchar', length: 6, nullable: true }) followedLast!: RuleFollowing | null;
  @Column(instantColumn('saved_at')) savedAt!: Date;
}
