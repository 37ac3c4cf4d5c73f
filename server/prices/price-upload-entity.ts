import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { UnderlyingEntity } from '@/server/underlyings/underlying-entity';
import { MembershipEntity } from '@/server/people/membership-entity';
import { idColumn, instantColumn } from '@/server/database/columns';
import { type SettledReading } from '@/server/prices/reading/interpret-table';
import { type PriceUpload } from '@/shared/prices/price-upload';

/** A price file on its way in; any server can go on with it. */
@Entity({ name: 'price_upload' })
@Index('uq_price_upload_desk_id', ['deskId', 'id'], { unique: true })
@Index('ix_price_upload_desk_at', ['deskId', 'uploadedAt'])
@ForeignKey(() => UnderlyingEntity, ['deskId', 'underlyingId'], ['deskId', 'id'], {
  name: 'fk_price_upload_underlying_id',
  onDelete: 'RESTRICT',
})
@ForeignKey(() => MembershipEntity, ['deskId', 'personId'], ['deskId', 'personId'], {
  name: 'fk_price_upload_user_id',
  onDelete: 'RESTRICT',
})
export class PriceUploadEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column(idColumn('underlying_id')) underlyingId!: string;
  @Column(idColumn('user_id')) personId!: string;
  @Column({ name: 'file_name', type: 'varchar', length: 255 }) fileName!: string;
  @Column({ type: 'varchar', length: 9 }) state!: PriceUpload['state'];
  /** The file as it came; gone once its bars are stored. Read only where it is asked for: it is large. */
  @Column({ type: 'longblob', nullable: true, select: false }) content!: Buffer | null;
  @Column({ name: 'settled_reading', type: 'json' }) settledReading!: SettledReading;
  /** What the person was shown last, and in the end what was stored. */
  @Column({ type: 'json' }) preview!: PriceUpload;
  @Column(instantColumn('uploaded_at')) uploadedAt!: Date;
}
