import { Column, Entity, Index, PrimaryColumn } from 'typeorm';
import { idColumn, instantColumn } from '@/server/database/columns';

@Entity({ name: 'user' })
@Index('uq_user_email_key', ['emailKey'], { unique: true })
export class PersonEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column({ type: 'varchar', length: 254 }) email!: string;
  /** The address folded for comparison. */
  @Column({ name: 'email_key', type: 'varchar', length: 254, collation: 'utf8mb4_bin' }) emailKey!: string;
  @Column({ name: 'display_name', type: 'varchar', length: 120 }) displayName!: string;
  @Column({ name: 'time_zone', type: 'varchar', length: 64 }) timeZone!: string;
  @Column({ name: 'password_hash', type: 'varchar', length: 100, charset: 'ascii', collation: 'ascii_bin' })
  passwordHash!: string;
  /** Raised when every session of the person must end (a new password, a disabled account). */
  @Column({ name: 'session_epoch', type: 'int', default: 0 }) sessionEpoch!: number;
  @Column({ ...instantColumn('disabled_at'), nullable: true }) disabledAt!: Date | null;
  @Column(instantColumn('created_at')) createdAt!: Date;
}
