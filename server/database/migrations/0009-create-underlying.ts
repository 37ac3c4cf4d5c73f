import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateUnderlying extends SqlMigration {
  readonly name = 'CreateUnderlying1764600000009';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`underlying\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`version\` INT NOT NULL,
      \`symbol\` VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`name\` VARCHAR(120) NOT NULL,
      \`style\` VARCHAR(8) NOT NULL,
      \`settlement\` VARCHAR(8) NOT NULL,
      \`settlement_time\` CHAR(2) NOT NULL,
      \`multiplier\` DECIMAL(30,12) NOT NULL,
      \`dividend_yield\` DOUBLE NOT NULL,
      \`currency\` CHAR(3) NOT NULL,
      \`created_at\` DATETIME(6) NOT NULL,
      UNIQUE INDEX \`uq_underlying_desk_id\` (\`desk_id\`, \`id\`),
      UNIQUE INDEX \`uq_underlying_desk_symbol\` (\`desk_id\`, \`symbol\`),
      CONSTRAINT \`ck_underlying_style\` CHECK (\`style\` IN ('european', 'american')),
      CONSTRAINT \`ck_underlying_settlement\` CHECK (\`settlement\` IN ('cash', 'physical')),
      CONSTRAINT \`ck_underlying_settlement_time\` CHECK (\`settlement_time\` IN ('pm', 'am')),
      CONSTRAINT \`ck_underlying_multiplier\` CHECK (\`multiplier\` > 0),
      CONSTRAINT \`fk_underlying_desk_id\` FOREIGN KEY (\`desk_id\`) REFERENCES \`desk\` (\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
