import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { MembershipEntity } from '@/server/people/membership-entity';
import { UnderlyingEntity } from '@/server/underlyings/underlying-entity';
import { idColumn, instantColumn } from '@/server/database/columns';
import { type DraftPlan } from '@/shared/entries/draft-plan';
import { type EntryState, type Strip } from '@/shared/entries/entry';

/** One journal entry: the plan as it was last typed, and what a list shows of it. */
@Entity({ name: 'entry' })
@Index('uq_entry_desk_id', ['deskId', 'id'], { unique: true })
@Index('ix_entry_desk_trader', ['deskId', 'traderId', 'id'])
@Index('ix_entry_desk_underlying', ['deskId', 'underlyingId', 'state'])
@ForeignKey(() => MembershipEntity, ['deskId', 'traderId'], ['deskId', 'personId'], {
  name: 'fk_entry_trader_id',
  onDelete: 'RESTRICT',
})
@ForeignKey(() => UnderlyingEntity, ['deskId', 'underlyingId'], ['deskId', 'id'], {
  name: 'fk_entry_underlying_id',
  onDelete: 'RESTRICT',
})
export class EntryEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column(idColumn('trader_id')) traderId!: string;
  @Column(idColumn('underlying_id')) underlyingId!: string;
  @Column({ type: 'int' }) version!: number;
  @Column({ type: 'varchar', length: 10 }) state!: EntryState;
  @Column({ type: 'json' }) plan!: DraftPlan;
  @Column(instantColumn('plan_saved_at')) planSavedAt!: Date;
  @Column({ name: 'structure_name', type: 'varchar', length: 120 }) structureName!: string;
  /** Words to search by: symbol, structure, idea, tags. */
  @Column({ name: 'search_text', type: 'text' }) searchText!: string;
  @Column({ type: 'json', nullable: true }) strip!: Strip | null;
  @Column({ name: 'expiry_session_date', type: 'date', nullable: true }) expirySessionDate!: string | null;
  @Column({ name: 'exit_session_date', type: 'date', nullable: true }) exitSessionDate!: string | null;
  @Column({ name: 'holding_sessions', type: 'double', nullable: true }) holdingSessions!: number | null;
  @Column({ name: 'expected_mean', type: 'double', nullable: true }) expectedMean!: number | null;
  @Column({ ...instantColumn('sealed_at'), nullable: true }) sealedAt!: Date | null;
  @Column({ name: 'is_late_seal', type: 'boolean' }) isLateSeal!: boolean;
  @Column({ ...instantColumn('first_fill_at'), nullable: true }) firstFillAt!: Date | null;
  @Column({ ...instantColumn('last_fill_at'), nullable: true }) lastFillAt!: Date | null;
  @Column({ name: 'realised_profit', type: 'decimal', precision: 30, scale: 12, nullable: true }) realisedProfit!:
    string | null;
  @Column({ type: 'text' }) lesson!: string;
  @Column(instantColumn('created_at')) createdAt!: Date;
}
