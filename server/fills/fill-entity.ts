import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { EntryEntity } from '@/server/entries/entry-entity';
import { idColumn, instantColumn } from '@/server/database/columns';
import { type EntryFill } from '@/shared/entries/entry';

/** One execution, expiry, exercise or assignment of an entry. */
@Entity({ name: 'fill' })
@Index('uq_fill_desk_id', ['deskId', 'id'], { unique: true })
@Index('ix_fill_entry', ['deskId', 'entryId', 'tradedAt'])
@Index('ix_fill_made_by', ['deskId', 'madeBy'])
@ForeignKey(() => FillEntity, ['deskId', 'madeBy'], ['deskId', 'id'], { name: 'fk_fill_made_by', onDelete: 'RESTRICT' })
@ForeignKey(() => EntryEntity, ['deskId', 'entryId'], ['deskId', 'id'], {
  name: 'fk_fill_entry_id',
  onDelete: 'RESTRICT',
})
export class FillEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column(idColumn('entry_id')) entryId!: string;
  @Column({ type: 'varchar', length: 10 }) kind!: EntryFill['kind'];
  @Column({ type: 'json' }) instrument!: EntryFill['instrument'];
  @Column({ type: 'decimal', precision: 30, scale: 12 }) quantity!: string;
  @Column({ type: 'decimal', precision: 30, scale: 12 }) price!: string;
  @Column({ type: 'decimal', precision: 30, scale: 12 }) fees!: string;
  /** Of the underlying at the time, and the middle of bid and ask; null where it was not noted. */
  @Column({ name: 'underlying_price', type: 'decimal', precision: 30, scale: 12, nullable: true }) underlyingPrice!:
    string | null;
  @Column({ name: 'mid_price', type: 'decimal', precision: 30, scale: 12, nullable: true }) midPrice!: string | null;
  @Column(instantColumn('traded_at')) tradedAt!: Date;
  @Column({ name: 'time_zone', type: 'varchar', length: 64 }) timeZone!: string;
  /** Order in which fills were added, for those of one instant. */
  @Column({ type: 'int' }) sequence!: number;
  /** The exercise or assignment that made this stock fill. */
  @Column({ ...idColumn('made_by'), nullable: true }) madeBy!: string | null;
  @Column(instantColumn('added_at')) addedAt!: Date;
}
