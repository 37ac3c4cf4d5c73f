import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { DeskEntity } from '@/server/desk/desk-entity';
import { PersonEntity } from '@/server/people/person-entity';
import { idColumn, instantColumn } from '@/server/database/columns';
import { type Role } from '@/shared/contract/roles';

/** A person's place on a desk. */
@Entity({ name: 'membership' })
@Index('uq_membership_desk_id', ['deskId', 'id'], { unique: true })
@Index('uq_membership_desk_user', ['deskId', 'personId'], { unique: true })
@Index('ix_membership_user', ['personId'])
@ForeignKey(() => DeskEntity, ['deskId'], ['id'], { name: 'fk_membership_desk_id', onDelete: 'RESTRICT' })
@ForeignKey(() => PersonEntity, ['personId'], ['id'], { name: 'fk_membership_user_id', onDelete: 'RESTRICT' })
export class MembershipEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column(idColumn('user_id')) personId!: string;
  @Column({ type: 'varchar', length: 8 }) role!: Role;
  @Column(instantColumn('created_at')) createdAt!: Date;
}
