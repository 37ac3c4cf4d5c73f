import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { EntryEntity } from '@/server/entries/entry-entity';
import { idColumn, instantColumn } from '@/server/database/columns';
import { type EntryOutcome } from '@/journal/outcome/entry-outcome';

/** Expected against realised for one entry, computed again whenever a bar or a fill changes. */
@Entity({ name: 'outcome' })
@Index('uq_outcome_desk_id', ['deskId', 'id'], { unique: true })
@Index('uq_outcome_entry', ['deskId', 'entryId'], { unique: true })
@ForeignKey(() => EntryEntity, ['deskId', 'entryId'], ['deskId', 'id'], {
  name: 'fk_outcome_entry_id',
  onDelete: 'RESTRICT',
})
export class OutcomeEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column(idColumn('entry_id')) entryId!: string;
  @Column({ type: 'json' }) outcome!: EntryOutcome;
  @Column({ name: 'is_complete', type: 'boolean' }) isComplete!: boolean;
  @Column(instantColumn('computed_at')) computedAt!: Date;
}
