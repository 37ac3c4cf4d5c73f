import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateOutcome extends SqlMigration {
  readonly name = 'CreateOutcome1764600000016';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`outcome\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`entry_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`outcome\` JSON NOT NULL,
      \`is_complete\` TINYINT NOT NULL,
      \`computed_at\` DATETIME(6) NOT NULL,
      UNIQUE INDEX \`uq_outcome_desk_id\` (\`desk_id\`, \`id\`),
      UNIQUE INDEX \`uq_outcome_entry\` (\`desk_id\`, \`entry_id\`),
      CONSTRAINT \`fk_outcome_entry_id\` FOREIGN KEY (\`desk_id\`, \`entry_id\`) REFERENCES \`entry\` (\`desk_id\`, \`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
