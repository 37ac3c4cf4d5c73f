import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateMentorship extends SqlMigration {
  readonly name = 'CreateMentorship1764600000004';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`mentorship\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`mentor_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`trader_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`accepted_at\` DATETIME(6) NULL,
      \`revoked_at\` DATETIME(6) NULL,
      UNIQUE INDEX \`uq_mentorship_desk_id\` (\`desk_id\`, \`id\`),
      UNIQUE INDEX \`uq_mentorship_pair\` (\`desk_id\`, \`mentor_id\`, \`trader_id\`),
      CONSTRAINT \`ck_mentorship_pair\` CHECK (\`mentor_id\` <> \`trader_id\`),
      CONSTRAINT \`fk_mentorship_mentor_id\` FOREIGN KEY (\`desk_id\`, \`mentor_id\`) REFERENCES \`membership\` (\`desk_id\`, \`user_id\`) ON DELETE RESTRICT ON UPDATE NO ACTION,
      CONSTRAINT \`fk_mentorship_trader_id\` FOREIGN KEY (\`desk_id\`, \`trader_id\`) REFERENCES \`membership\` (\`desk_id\`, \`user_id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
