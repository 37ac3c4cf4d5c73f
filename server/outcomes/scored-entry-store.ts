import { type EntryOutcome } from '@/journal/outcome/entry-outcome';
import { type DeskScope } from '@/server/database/desk-scope';
import { type EntryEntity } from '@/server/entries/entry-entity';
import { ScoredEntryEntity } from '@/server/outcomes/scored-entry-entity';
import { scoredEntryRow } from '@/server/outcomes/scored-entry-row';
import { type StoredSeal } from '@/server/seals/seal-store';

/** Columns that an outcome may change; whose entry it is and what was sealed stays. */
const changing = [
  'judged_session_date',
  'is_late_seal',
  'is_traded',
  'move_deviations',
  'move_place',
  'volatility_ratio',
  'profit_place_low',
  'profit_place_high',
  'expected_mean',
  'realised_profit',
  'profit_from_move',
  'profit_from_time',
  'profit_from_volatility',
  'profit_from_carry',
  'profit_from_marks',
  'profit_from_slippage',
  'profit_from_fees',
  'is_followed',
  'exit_tag',
];

/** What the sealed entries of a desk bring to its scores. */
export class ScoredEntryStore {
  constructor(private readonly scope: DeskScope) {}

  /** Writes the row of an entry anew; called in the transaction of its outcome. */
  async keep(id: string, entry: EntryEntity, { content }: StoredSeal, outcome: EntryOutcome): Promise<void> {
    await this.scope.repository(ScoredEntryEntity).upsert([{ id, ...scoredEntryRow(entry, content, outcome) }], {
      key: ['desk_id', 'entry_id'],
      overwrite: changing,
    });
  }
}
