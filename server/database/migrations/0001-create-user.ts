import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateUser extends SqlMigration {
  readonly name = 'CreateUser1764600000001';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`user\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`email\` VARCHAR(254) NOT NULL,
      \`email_key\` VARCHAR(254) COLLATE utf8mb4_bin NOT NULL,
      \`display_name\` VARCHAR(120) NOT NULL,
      \`time_zone\` VARCHAR(64) NOT NULL,
      \`password_hash\` VARCHAR(100) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`session_epoch\` INT NOT NULL DEFAULT 0,
      \`disabled_at\` DATETIME(6) NULL,
      \`created_at\` DATETIME(6) NOT NULL,
      UNIQUE INDEX \`uq_user_email_key\` (\`email_key\`)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
