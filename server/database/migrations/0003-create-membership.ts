import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateMembership extends SqlMigration {
  readonly name = 'CreateMembership1764600000003';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`membership\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`user_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`role\` VARCHAR(8) NOT NULL,
      \`created_at\` DATETIME(6) NOT NULL,
      UNIQUE INDEX \`uq_membership_desk_id\` (\`desk_id\`, \`id\`),
      UNIQUE INDEX \`uq_membership_desk_user\` (\`desk_id\`, \`user_id\`),
      INDEX \`ix_membership_user\` (\`user_id\`),
      CONSTRAINT \`ck_membership_role\` CHECK (\`role\` IN ('trader', 'mentor', 'lead')),
      CONSTRAINT \`fk_membership_desk_id\` FOREIGN KEY (\`desk_id\`) REFERENCES \`desk\` (\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION,
      CONSTRAINT \`fk_membership_user_id\` FOREIGN KEY (\`user_id\`) REFERENCES \`user\` (\`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
