import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateAuditEvent extends SqlMigration {
  readonly name = 'CreateAuditEvent1764600000008';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`audit_event\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`user_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`action\` VARCHAR(60) NOT NULL,
      \`subject_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NULL,
      \`details\` JSON NULL,
      \`request_id\` VARCHAR(60) NOT NULL,
      \`at\` DATETIME(6) NOT NULL,
      UNIQUE INDEX \`uq_audit_event_desk_id\` (\`desk_id\`, \`id\`),
      INDEX \`ix_audit_event_desk_at\` (\`desk_id\`, \`at\`),
      CONSTRAINT \`fk_audit_event_user_id\` FOREIGN KEY (\`desk_id\`, \`user_id\`) REFERENCES \`membership\` (\`desk_id\`, \`user_id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
