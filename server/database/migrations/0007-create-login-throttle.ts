import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateLoginThrottle extends SqlMigration {
  readonly name = 'CreateLoginThrottle1764600000007';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`login_throttle\` (
      \`key_digest\` CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`failures\` INT NOT NULL,
      \`blocked_until\` DATETIME(6) NOT NULL,
      \`window_ends_at\` DATETIME(6) NOT NULL
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
