import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateDesk extends SqlMigration {
  readonly name = 'CreateDesk1764600000002';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`desk\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`version\` INT NOT NULL,
      \`name\` VARCHAR(120) NOT NULL,
      \`currency\` CHAR(3) NOT NULL,
      \`rate_per_year\` DOUBLE NOT NULL,
      \`overnight_share\` DOUBLE NOT NULL,
      \`fee_per_contract\` DECIMAL(19,6) NOT NULL,
      \`created_at\` DATETIME(6) NOT NULL,
      CONSTRAINT \`ck_desk_overnight_share\` CHECK (\`overnight_share\` BETWEEN 0 AND 1),
      CONSTRAINT \`ck_desk_fee\` CHECK (\`fee_per_contract\` >= 0)
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
