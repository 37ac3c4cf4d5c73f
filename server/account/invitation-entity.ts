import { Column, Entity, PrimaryColumn } from 'typeorm';
import { digestColumn, instantColumn } from '@/server/database/columns';

/** A one-time invitation to become the first lead of a fresh installation. */
@Entity({ name: 'invitation' })
export class InvitationEntity {
  @PrimaryColumn(digestColumn('token_digest')) tokenDigest!: string;
  @Column(instantColumn('expires_at')) expiresAt!: Date;
  @Column({ ...instantColumn('used_at'), nullable: true }) usedAt!: Date | null;
}
