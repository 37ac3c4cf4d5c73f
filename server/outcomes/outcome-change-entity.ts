import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { EntryEntity } from '@/server/entries/entry-entity';
import { idColumn, instantColumn } from '@/server/database/columns';
import { type KeptOutcomeChange, type OutcomeCause } from '@/shared/entries/outcome-history';

/** What a stored outcome came to say otherwise, and why; insert-only. */
@Entity({ name: 'outcome_change' })
@Index('uq_outcome_change_desk_id', ['deskId', 'id'], { unique: true })
@Index('ix_outcome_change_entry', ['deskId', 'entryId', 'id'])
@ForeignKey(() => EntryEntity, ['deskId', 'entryId'], ['deskId', 'id'], {
  name: 'fk_outcome_change_entry_id',
  onDelete: 'RESTRICT',
})
export class OutcomeChangeEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column(idColumn('entry_id')) entryId!: string;
  /** The kind of the cause. */
  @Column({ type: 'varchar', length: 10 }) why!: OutcomeCause['kind'];
  @Column({ type: 'json' }) cause!: OutcomeCause;
  @Column({ type: 'json' }) changes!: readonly KeptOutcomeChange[];
  @Column(instantColumn('at')) at!: Date;
}
