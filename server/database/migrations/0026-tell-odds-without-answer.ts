import { SqlMigration } from '@/server/database/migrations/sql-migration';

/** Odds that the prices of whole sessions never answer are no longer waited for. */
export class TellOddsWithoutAnswer extends SqlMigration {
  readonly name = 'TellOddsWithoutAnswer1764600000026';
  protected readonly statement = `
    ALTER TABLE \`scored_odds\`
      ADD COLUMN IF NOT EXISTS \`cannot_tell\` TINYINT NOT NULL DEFAULT 0
  `;
}
