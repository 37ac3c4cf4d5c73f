import { Column, Entity, PrimaryColumn } from 'typeorm';
import { digestColumn, instantColumn } from '@/server/database/columns';

/** Failed sign-ins of one account or one address; the key is a digest of either. */
@Entity({ name: 'login_throttle' })
export class LoginThrottleEntity {
  @PrimaryColumn(digestColumn('key_digest')) keyDigest!: string;
  @Column({ type: 'int' }) failures!: number;
  @Column(instantColumn('blocked_until')) blockedUntil!: Date;
  @Column(instantColumn('window_ends_at')) windowEndsAt!: Date;
}
