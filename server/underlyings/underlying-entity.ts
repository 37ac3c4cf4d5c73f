import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { DeskEntity } from '@/server/desk/desk-entity';
import { idColumn, instantColumn } from '@/server/database/columns';
import { type Underlying } from '@/shared/underlyings/underlying';

/** What an option is on. */
@Entity({ name: 'underlying' })
@Index('uq_underlying_desk_id', ['deskId', 'id'], { unique: true })
@Index('uq_underlying_desk_symbol', ['deskId', 'symbol'], { unique: true })
@ForeignKey(() => DeskEntity, ['deskId'], ['id'], { name: 'fk_underlying_desk_id', onDelete: 'RESTRICT' })
export class UnderlyingEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column({ type: 'int' }) version!: number;
  @Column({ type: 'varchar', length: 12, charset: 'ascii', collation: 'ascii_bin' }) symbol!: string;
  @Column({ type: 'varchar', length: 120 }) name!: string;
  @Column({ type: 'varchar', length: 8 }) style!: Underlying['style'];
  @Column({ type: 'varchar', length: 8 }) settlement!: Underlying['settlement'];
  @Column({ name: 'settlement_time', type: 'char', length: 2 }) settlementTime!: Underlying['settlementTime'];
  @Column({ type: 'decimal', precision: 30, scale: 12 }) multiplier!: string;
  /** Continuous, a fraction per calendar year. */
  @Column({ name: 'dividend_yield', type: 'double' }) dividendYield!: number;
  @Column({ type: 'char', length: 3 }) currency!: string;
  @Column(instantColumn('created_at')) createdAt!: Date;
}
