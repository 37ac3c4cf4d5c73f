import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateSession extends SqlMigration {
  readonly name = 'CreateSession1764600000006';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`session\` (
      \`digest\` CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`user_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
      \`content\` LONGTEXT NOT NULL,
      \`started_at\` DATETIME(6) NOT NULL,
      \`ends_at\` DATETIME(6) NOT NULL,
      \`ended_at\` DATETIME(6) NULL,
      INDEX \`ix_session_user\` (\`user_id\`),
      INDEX \`ix_session_ends\` (\`ends_at\`)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
