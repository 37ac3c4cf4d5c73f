import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { SealedForecastEntity } from '@/server/seals/sealed-forecast-entity';
import { idColumn } from '@/server/database/columns';

/** What a seal froze, apart from the chain, so that it can be erased one day while the chain still verifies. */
@Entity({ name: 'sealed_content' })
@Index('uq_sealed_content_desk_id', ['deskId', 'id'], { unique: true })
@Index('uq_sealed_content_forecast', ['deskId', 'forecastId'], { unique: true })
@ForeignKey(() => SealedForecastEntity, ['deskId', 'forecastId'], ['deskId', 'id'], {
  name: 'fk_sealed_content_forecast_id',
  onDelete: 'RESTRICT',
})
export class SealedContentEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column(idColumn('forecast_id')) forecastId!: string;
  @Column({ type: 'char', length: 32, charset: 'ascii', collation: 'ascii_bin' }) salt!: string;
  @Column({ type: 'longtext', collation: 'utf8mb4_bin' }) payload!: string;
}
