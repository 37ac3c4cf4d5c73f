import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateOutcomeChange extends SqlMigration {
  readonly name = 'CreateOutcomeChange1764600000030';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`outcome_change\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`entry_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`why\` VARCHAR(10) NOT NULL,
      \`cause\` JSON NOT NULL,
      \`changes\` JSON NOT NULL,
      \`at\` DATETIME(6) NOT NULL,
      UNIQUE INDEX \`uq_outcome_change_desk_id\` (\`desk_id\`, \`id\`),
      INDEX \`ix_outcome_change_entry\` (\`desk_id\`, \`entry_id\`, \`id\`),
      CONSTRAINT \`fk_outcome_change_entry_id\` FOREIGN KEY (\`desk_id\`, \`entry_id\`) REFERENCES \`entry\` (\`desk_id\`, \`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION,
      CONSTRAINT \`ck_outcome_change_why\` CHECK (\`why\` IN ('seal', 'bar', 'settlement', 'fill'))
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
