import { randomUUID } from 'node:crypto';
import { addDays } from '@/journal/sessions/session-date';
import { insertRow, type Row, sampleRow } from '@/tests/server/support/sample-rows';
import { type TestApp, type TestPerson } from '@/tests/server/support/test-app';

export interface ScoredOdds {
  readonly probability: number;
  readonly happened: boolean;
  readonly marketImplied?: number;
}

/** Adds scored entries of a trader, each alone on its days, so that none moves with another. */
export class ScoredRows {
  private made = 0;

  constructor(
    private readonly app: TestApp,
    private readonly trader: TestPerson,
    readonly underlyingId: string,
  ) {}

  /** One entry with its odds; gives its id. */
  async add(changes: Row = {}, odds: readonly ScoredOdds[] = []): Promise<string> {
    const entryId = randomUUID();
    const from = addDays('2025-01-01', 3 * this.made);
    const through = addDays(from, 1);
    this.made += 1;
    const ids = {
      deskId: this.trader.deskId,
      personId: this.trader.id,
      otherPersonId: this.trader.id,
      underlyingId: this.underlyingId,
      entryId,
      forecastId: '',
      fillId: '',
    };
    const insert = (table: string, row: Row) => insertRow(this.app.dataSource, table, sampleRow(table, ids, row));
    await insert('entry', {
      id: entryId,
      state: 'closed',
      sealed_at: '2025-01-01 20:00:00.000000',
      structure_name: 'bull put 97 / 95',
    });
    const scored = { first_session_date: from, exit_session_date: through, judged_session_date: through, ...changes };
    await insert('scored_entry', scored);
    for (const { probability, happened, marketImplied = null } of odds)
      await insert('scored_odds', {
        due_session_date: scored.exit_session_date,
        probability,
        market_implied: marketImplied,
        happened: Number(happened),
        is_late_seal: changes.is_late_seal ?? 0,
      });
    return entryId;
  }
}
