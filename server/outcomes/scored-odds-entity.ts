import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { EntryEntity } from '@/server/entries/entry-entity';
import { MembershipEntity } from '@/server/people/membership-entity';
import { idColumn } from '@/server/database/columns';

/** One stated probability of a sealed forecast, with its answer once there is one: what scores are computed from. */
@Entity({ name: 'scored_odds' })
@Index('uq_scored_odds_desk_id', ['deskId', 'id'], { unique: true })
@Index('uq_scored_odds_entry_key', ['deskId', 'entryId', 'oddsKey'], { unique: true })
@Index('ix_scored_odds_trader', ['deskId', 'traderId', 'dueSessionDate'])
@ForeignKey(() => EntryEntity, ['deskId', 'entryId'], ['deskId', 'id'], {
  name: 'fk_scored_odds_entry_id',
  onDelete: 'RESTRICT',
})
@ForeignKey(() => MembershipEntity, ['deskId', 'traderId'], ['deskId', 'personId'], {
  name: 'fk_scored_odds_trader_id',
  onDelete: 'RESTRICT',
})
export class ScoredOddsEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column(idColumn('entry_id')) entryId!: string;
  @Column(idColumn('trader_id')) traderId!: string;
  @Column({ name: 'odds_key', type: 'varchar', length: 80, charset: 'ascii', collation: 'ascii_bin' }) oddsKey!: string;
  @Column({ type: 'varchar', length: 120 }) statement!: string;
  @Column({ name: 'due_session_date', type: 'date' }) dueSessionDate!: string;
  @Column({ type: 'double' }) probability!: number;
  @Column({ name: 'market_implied', type: 'double', nullable: true }) marketImplied!: number | null;
  @Column({ type: 'boolean', nullable: true }) happened!: boolean | null;
  /** No bars will ever answer it: neither scored nor waited for. */
  @Column({ name: 'cannot_tell', type: 'boolean', default: 0 }) cannotTell!: boolean;
  @Column({ name: 'is_late_seal', type: 'boolean' }) isLateSeal!: boolean;
}
