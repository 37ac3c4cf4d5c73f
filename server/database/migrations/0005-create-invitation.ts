import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateInvitation extends SqlMigration {
  readonly name = 'CreateInvitation1764600000005';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`invitation\` (
      \`token_digest\` CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`expires_at\` DATETIME(6) NOT NULL,
      \`used_at\` DATETIME(6) NULL
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
