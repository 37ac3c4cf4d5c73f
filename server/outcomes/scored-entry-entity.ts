import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { type ExitTag } from '@/journal/process/exit-rule';
import { type HorizonClass } from '@/journal/scoring/horizon-class';
import { EntryEntity } from '@/server/entries/entry-entity';
import { MembershipEntity } from '@/server/people/membership-entity';
import { UnderlyingEntity } from '@/server/underlyings/underlying-entity';
import { idColumn } from '@/server/database/columns';

const model = (name: string) => ({ name, type: 'double', nullable: true }) as const;
const money = (name: string) => ({ name, type: 'decimal', precision: 30, scale: 12, nullable: true }) as const;

/** What one sealed entry brings to the scores: its outcome in columns, written with the outcome. */
@Entity({ name: 'scored_entry' })
@Index('uq_scored_entry_desk_id', ['deskId', 'id'], { unique: true })
@Index('uq_scored_entry_entry', ['deskId', 'entryId'], { unique: true })
@Index('ix_scored_entry_trader', ['deskId', 'traderId', 'exitSessionDate'])
@ForeignKey(() => EntryEntity, ['deskId', 'entryId'], ['deskId', 'id'], {
  name: 'fk_scored_entry_entry_id',
  onDelete: 'RESTRICT',
})
@ForeignKey(() => MembershipEntity, ['deskId', 'traderId'], ['deskId', 'personId'], {
  name: 'fk_scored_entry_trader_id',
  onDelete: 'RESTRICT',
})
@ForeignKey(() => UnderlyingEntity, ['deskId', 'underlyingId'], ['deskId', 'id'], {
  name: 'fk_scored_entry_underlying_id',
  onDelete: 'RESTRICT',
})
export class ScoredEntryEntity {
  @PrimaryColumn(idColumn('id')) id!: string;
  @Column(idColumn('desk_id')) deskId!: string;
  @Column(idColumn('entry_id')) entryId!: string;
  @Column(idColumn('trader_id')) traderId!: string;
  @Column(idColumn('underlying_id')) underlyingId!: string;
  /** "bull put", without strikes. */
  @Column({ name: 'structure_kind', type: 'varchar', length: 40 }) structureKind!: string;
  @Column({ name: 'horizon_class', type: 'varchar', length: 10 }) horizonClass!: HorizonClass;
  @Column({ type: 'json' }) tags!: string[];
  /** The session the forecast starts in, that of its planned exit, and the one its move was judged by. */
  @Column({ name: 'first_session_date', type: 'date' }) firstSessionDate!: string;
  @Column({ name: 'exit_session_date', type: 'date' }) exitSessionDate!: string;
  @Column({ name: 'judged_session_date', type: 'date', nullable: true }) judgedSessionDate!: string | null;
  @Column({ name: 'is_late_seal', type: 'boolean' }) isLateSeal!: boolean;
  @Column({ name: 'is_traded', type: 'boolean' }) isTraded!: boolean;
  /** "20 sessions", "exponentially weighted", "typed". */
  @Column({ name: 'volatility_method', type: 'varchar', length: 40 }) volatilityMethod!: string;
  @Column(model('move_deviations')) moveDeviations!: number | null;
  @Column(model('move_place')) movePlace!: number | null;
  /** Realised over planned daily volatility, once the hold is over. */
  @Column(model('volatility_ratio')) volatilityRatio!: number | null;
  /** Of the realised profit in its forecast distribution; null until the position is closed. */
  @Column(model('profit_place_low')) profitPlaceLow!: number | null;
  @Column(model('profit_place_high')) profitPlaceHigh!: number | null;
  @Column({ name: 'expected_mean', type: 'double' }) expectedMean!: number;
  @Column({ name: 'expected_deviation', type: 'double' }) expectedDeviation!: number;
  /** Null until the position is closed, as are its parts and how it was left. */
  @Column(money('realised_profit')) realisedProfit!: string | null;
  @Column(money('profit_from_move')) profitFromMove!: string | null;
  @Column(money('profit_from_time')) profitFromTime!: string | null;
  @Column(money('profit_from_volatility')) profitFromVolatility!: string | null;
  @Column(money('profit_from_carry')) profitFromCarry!: string | null;
  @Column(money('profit_from_marks')) profitFromMarks!: string | null;
  @Column(money('profit_from_slippage')) profitFromSlippage!: string | null;
  @Column(money('profit_from_fees')) profitFromFees!: string | null;
  @Column({ name: 'is_followed', type: 'boolean', nullable: true }) isFollowed!: boolean | null;
  @Column({ name: 'exit_tag', type: 'varchar', length: 10, nullable: true }) exitTag!: ExitTag | null;
}
