import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { EntryEntity } from '@/server/entries/entry-entity';
import { MembershipEntity } from '@/server/people/membership-entity';
import { digestColumn, idColumn } from '@/server/database/columns';

/** One link of a trader's chain; the application can add links and change none. */
@Entity({ name: 'sealed_forecast' })
@Index('uq_sealed_forecast_desk_id', ['deskId', 'id'], { unique: true })
@Index('uq_sealed_forecast_sequence', ['deskId', 'traderId', 'sequence'], { unique: true })
@Index('uq_sealed_forecast_previous', ['deskId', 'traderId', 'previousHash'], { unique: true })
@Index('uq_sealed_forecast_entry', ['deskId', 'entryId'], { unique: true })
@ForeignKey(() => EntryEntity, ['deskId', 'entryId'], ['deskId', 'id'], {
  name: 'fk_sealed_forecast_entry_id',
  onDelete: 'RESTRICT',
})
@ForeignKey(() => MembershipEntity, ['deskId', 'traderId'], ['deskId', 'personId'], {
  name: 'fk_sealed_forecast_trader_id',
  onDelete: 'RESTRICT',
})
export class SealedForecastEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column(idColumn('trader_id')) traderId!: string;
  @Column(idColumn('entry_id')) entryId!: string;
  @Column({ type: 'int' }) sequence!: number;
  @Column(digestColumn('previous_hash')) previousHash!: string;
  @Column(digestColumn('hash')) hash!: string;
  @Column(digestColumn('commitment')) commitment!: string;
  @Column({ name: 'sealed_at_microseconds', type: 'bigint' }) sealedAtMicroseconds!: string;
  @Column({ name: 'engine_version', type: 'varchar', length: 20 }) engineVersion!: string;
}
