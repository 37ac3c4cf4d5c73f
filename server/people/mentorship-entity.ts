import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { MembershipEntity } from '@/server/people/membership-entity';
import { idColumn, instantColumn } from '@/server/database/columns';

/** A mentor who may read a trader's sealed entries, from acceptance until it is revoked. */
@Entity({ name: 'mentorship' })
@Index('uq_mentorship_desk_id', ['deskId', 'id'], { unique: true })
@Index('uq_mentorship_pair', ['deskId', 'mentorId', 'traderId'], { unique: true })
@ForeignKey(() => MembershipEntity, ['deskId', 'mentorId'], ['deskId', 'personId'], {
  name: 'fk_mentorship_mentor_id',
  onDelete: 'RESTRICT',
})
@ForeignKey(() => MembershipEntity, ['deskId', 'traderId'], ['deskId', 'personId'], {
  name: 'fk_mentorship_trader_id',
  onDelete: 'RESTRICT',
})
export class MentorshipEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column(idColumn('mentor_id')) mentorId!: string;
  @Column(idColumn('trader_id')) traderId!: string;
  @Column({ ...instantColumn('accepted_at'), nullable: true }) acceptedAt!: Date | null;
  @Column({ ...instantColumn('revoked_at'), nullable: true }) revokedAt!: Date | null;
}
