import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateEntry extends SqlMigration {
  readonly name = 'CreateEntry1764600000012';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`entry\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`trader_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`underlying_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`version\` INT NOT NULL,
      \`state\` VARCHAR(10) NOT NULL,
      \`plan\` JSON NOT NULL,
      \`plan_saved_at\` DATETIME(6) NOT NULL,
      \`structure_name\` VARCHAR(120) NOT NULL,
      \`search_text\` TEXT NOT NULL,
      \`strip\` JSON NULL,
      \`expiry_session_date\` DATE NULL,
      \`exit_session_date\` DATE NULL,
      \`holding_sessions\` DOUBLE NULL,
      \`expected_mean\` DOUBLE NULL,
      \`sealed_at\` DATETIME(6) NULL,
      \`is_late_seal\` TINYINT NOT NULL,
      \`first_fill_at\` DATETIME(6) NULL,
      \`last_fill_at\` DATETIME(6) NULL,
      \`realised_profit\` DECIMAL(30,12) NULL,
      \`lesson\` TEXT NOT NULL,
      \`created_at\` DATETIME(6) NOT NULL,
      UNIQUE INDEX \`uq_entry_desk_id\` (\`desk_id\`, \`id\`),
      INDEX \`ix_entry_desk_trader\` (\`desk_id\`, \`trader_id\`, \`id\`),
      INDEX \`ix_entry_desk_underlying\` (\`desk_id\`, \`underlying_id\`, \`state\`),
      CONSTRAINT \`ck_entry_state\` CHECK (\`state\` IN ('draft', 'sealed', 'open', 'closed', 'reviewed', 'abandoned')),
      CONSTRAINT \`ck_entry_sealed\` CHECK ((\`state\` = 'draft') = (\`sealed_at\` IS NULL)),
      CONSTRAINT \`fk_entry_underlying_id\` FOREIGN KEY (\`desk_id\`, \`underlying_id\`) REFERENCES \`underlying\` (\`desk_id\`, \`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION,
      CONSTRAINT \`fk_entry_trader_id\` FOREIGN KEY (\`desk_id\`, \`trader_id\`) REFERENCES \`membership\` (\`desk_id\`, \`user_id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
