import { type EntryOutcome } from '@/journal/outcome/entry-outcome';
import { outcomeChanges } from '@/journal/outcome/outcome-changes';
import { type ForecastInput } from '@/journal/forecast/forecast-input';
import { type DeskScope } from '@/server/database/desk-scope';
import { OutcomeChangeEntity } from '@/server/outcomes/outcome-change-entity';
import { oddsStatement } from '@/shared/entries/odds-statement';
import { type KeptOutcomeChange, type OutcomeCause, type OutcomeStep } from '@/shared/entries/outcome-history';

interface Recomputation {
  readonly id: string;
  readonly entryId: string;
  readonly input: ForecastInput;
  readonly before: EntryOutcome | null;
  readonly after: EntryOutcome;
  readonly cause: OutcomeCause;
  readonly at: Date;
}

/** How the outcomes of a desk's entries came to say what they say. */
export class OutcomeChangeStore {
  constructor(private readonly scope: DeskScope) {}

  private get rows() {
    return this.scope.repository(OutcomeChangeEntity);
  }

  /** Keeps what a new outcome says otherwise than the one before; nothing when it says the same. */
  async keep({ id, entryId, input, before, after, cause, at }: Recomputation): Promise<void> {
    const statements = new Map(after.odds.map(({ odds }) => [odds.key, oddsStatement(odds, input)]));
    const changes = outcomeChanges(before, after).map((change): KeptOutcomeChange =>
      change.kind === 'odds' ? { ...change, statement: statements.get(change.oddsKey) ?? '' } : change,
    );
    if (changes.length === 0) return;
    await this.rows.insert({ id, entryId, why: cause.kind, cause, changes, at });
  }

  /** Oldest first. */
  async list(entryId: string): Promise<OutcomeStep[]> {
    const rows = await this.rows.find({ entryId }, { order: { at: 'ASC', id: 'ASC' } });
    return rows.map(({ id, at, cause, changes }) => ({ id, at: at.toISOString(), cause, changes: [...changes] }));
  }
}
