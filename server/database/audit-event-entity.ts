import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { MembershipEntity } from '@/server/people/membership-entity';
import { idColumn, instantColumn } from '@/server/database/columns';

/** Who did what, when; insert-only. */
@Entity({ name: 'audit_event' })
@Index('uq_audit_event_desk_id', ['deskId', 'id'], { unique: true })
@Index('ix_audit_event_desk_at', ['deskId', 'at'])
@ForeignKey(() => MembershipEntity, ['deskId', 'personId'], ['deskId', 'personId'], {
  name: 'fk_audit_event_user_id',
  onDelete: 'RESTRICT',
})
export class AuditEventEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column(idColumn('user_id')) personId!: string;
  @Column({ type: 'varchar', length: 60 }) action!: string;
  @Column({ ...idColumn('subject_id'), nullable: true }) subjectId!: string | null;
  @Column({ type: 'json', nullable: true }) details!: Record<string, unknown> | null;
  @Column({ name: 'request_id', type: 'varchar', length: 60 }) requestId!: string;
  @Column(instantColumn('at')) at!: Date;
}
