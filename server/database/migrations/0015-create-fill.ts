import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateFill extends SqlMigration {
  readonly name = 'CreateFill1764600000015';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`fill\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`entry_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`kind\` VARCHAR(10) NOT NULL,
      \`instrument\` JSON NOT NULL,
      \`quantity\` DECIMAL(30,12) NOT NULL,
      \`price\` DECIMAL(30,12) NOT NULL,
      \`fees\` DECIMAL(30,12) NOT NULL,
      \`traded_at\` DATETIME(6) NOT NULL,
      \`time_zone\` VARCHAR(64) NOT NULL,
      \`sequence\` INT NOT NULL,
      \`made_by\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
      \`added_at\` DATETIME(6) NOT NULL,
      UNIQUE INDEX \`uq_fill_desk_id\` (\`desk_id\`, \`id\`),
      INDEX \`ix_fill_entry\` (\`desk_id\`, \`entry_id\`, \`traded_at\`),
      CONSTRAINT \`ck_fill_kind\` CHECK (\`kind\` IN ('buy', 'sell', 'expiry', 'assignment', 'exercise')),
      CONSTRAINT \`ck_fill_amounts\` CHECK (\`quantity\` > 0 AND \`price\` >= 0),
      CONSTRAINT \`fk_fill_entry_id\` FOREIGN KEY (\`desk_id\`, \`entry_id\`) REFERENCES \`entry\` (\`desk_id\`, \`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
