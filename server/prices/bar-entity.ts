import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { UnderlyingEntity } from '@/server/underlyings/underlying-entity';
import { idColumn, instantColumn } from '@/server/database/columns';
import { type Bar } from '@/shared/underlyings/underlying';

const priceColumn = { type: 'decimal', precision: 30, scale: 12 } as const;

/** One session's prices of an underlying. */
@Entity({ name: 'bar' })
@Index('uq_bar_desk_id', ['deskId', 'id'], { unique: true })
@Index('uq_bar_session', ['deskId', 'underlyingId', 'sessionDate'], { unique: true })
@ForeignKey(() => UnderlyingEntity, ['deskId', 'underlyingId'], ['deskId', 'id'], {
  name: 'fk_bar_underlying_id',
  onDelete: 'RESTRICT',
})
export class BarEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column(idColumn('underlying_id')) underlyingId!: string;
  @Column({ name: 'session_date', type: 'date' }) sessionDate!: string;
  @Column({ ...priceColumn }) close!: string;
  @Column({ ...priceColumn, nullable: true }) open!: string | null;
  @Column({ ...priceColumn, nullable: true }) high!: string | null;
  @Column({ ...priceColumn, nullable: true }) low!: string | null;
  /** The settlement value where it differs from the close; it need not lie in the session's range. */
  @Column({ ...priceColumn, nullable: true }) settlement!: string | null;
  @Column({ type: 'varchar', length: 6 }) source!: Bar['source'];
  @Column(instantColumn('stored_at')) storedAt!: Date;
}
