import { Column, Entity, Index, PrimaryColumn } from 'typeorm';
import { digestColumn, idColumn, instantColumn } from '@/server/database/columns';

/** A signed-in browser. The table holds a digest of the session's id, so that a copy of the table opens nothing. */
@Entity({ name: 'session' })
@Index('ix_session_user', ['personId'])
@Index('ix_session_ends', ['endsAt'])
export class SessionEntity {
  @PrimaryColumn(digestColumn('digest')) digest!: string;
  @Column({ ...idColumn('user_id'), nullable: true }) personId!: string | null;
  @Column({ type: 'longtext' }) content!: string;
  @Column(instantColumn('started_at')) startedAt!: Date;
  /** Idle limit, never beyond the absolute one. */
  @Column(instantColumn('ends_at')) endsAt!: Date;
  /** A tombstone: an ended session stays ended, whatever a request in flight still writes. */
  @Column({ ...instantColumn('ended_at'), nullable: true }) endedAt!: Date | null;
}
