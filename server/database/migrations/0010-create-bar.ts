import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateBar extends SqlMigration {
  readonly name = 'CreateBar1764600000010';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`bar\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`underlying_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`session_date\` DATE NOT NULL,
      \`close\` DECIMAL(30,12) NOT NULL,
      \`open\` DECIMAL(30,12) NULL,
      \`high\` DECIMAL(30,12) NULL,
      \`low\` DECIMAL(30,12) NULL,
      \`settlement\` DECIMAL(30,12) NULL,
      \`source\` VARCHAR(6) NOT NULL,
      \`stored_at\` DATETIME(6) NOT NULL,
      UNIQUE INDEX \`uq_bar_desk_id\` (\`desk_id\`, \`id\`),
      UNIQUE INDEX \`uq_bar_session\` (\`desk_id\`, \`underlying_id\`, \`session_date\`),
      CONSTRAINT \`ck_bar_prices\` CHECK (\`close\` > 0 AND (\`open\` IS NULL OR \`open\` > 0) AND (\`high\` IS NULL OR \`high\` > 0) AND (\`low\` IS NULL OR \`low\` > 0) AND (\`high\` IS NULL OR \`low\` IS NULL OR \`high\` >= \`low\`) AND (\`settlement\` IS NULL OR \`settlement\` >= 0)),
      CONSTRAINT \`ck_bar_source\` CHECK (\`source\` IN ('upload', 'typed', 'demo')),
      CONSTRAINT \`fk_bar_underlying_id\` FOREIGN KEY (\`desk_id\`, \`underlying_id\`) REFERENCES \`underlying\` (\`desk_id\`, \`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
