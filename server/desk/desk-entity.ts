import { Column, Entity, PrimaryColumn } from 'typeorm';
import { idColumn, instantColumn } from '@/server/database/columns';

/** A team and its data: the tenant. */
@Entity({ name: 'desk' })
export class DeskEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column({ type: 'int' }) version!: number;
  @Column({ type: 'varchar', length: 120 }) name!: string;
  @Column({ type: 'char', length: 3 }) currency!: string;
  /** Continuous, a fraction per calendar year. */
  @Column({ name: 'rate_per_year', type: 'double' }) ratePerYear!: number;
  @Column({ name: 'overnight_share', type: 'double' }) overnightShare!: number;
  @Column({ name: 'fee_per_contract', type: 'decimal', precision: 19, scale: 6 }) feePerContract!: string;
  @Column(instantColumn('created_at')) createdAt!: Date;
}
