import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreatePriceUpload extends SqlMigration {
  readonly name = 'CreatePriceUpload1764600000011';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`price_upload\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`underlying_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`user_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`file_name\` VARCHAR(255) NOT NULL,
      \`state\` VARCHAR(9) NOT NULL,
      \`content\` LONGBLOB NULL,
      \`settled_reading\` JSON NOT NULL,
      \`preview\` JSON NOT NULL,
      \`uploaded_at\` DATETIME(6) NOT NULL,
      UNIQUE INDEX \`uq_price_upload_desk_id\` (\`desk_id\`, \`id\`),
      INDEX \`ix_price_upload_desk_at\` (\`desk_id\`, \`uploaded_at\`),
      CONSTRAINT \`ck_price_upload_state\` CHECK (\`state\` IN ('preview', 'committed')),
      CONSTRAINT \`fk_price_upload_underlying_id\` FOREIGN KEY (\`desk_id\`, \`underlying_id\`) REFERENCES \`underlying\` (\`desk_id\`, \`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION,
      CONSTRAINT \`fk_price_upload_user_id\` FOREIGN KEY (\`desk_id\`, \`user_id\`) REFERENCES \`membership\` (\`desk_id\`, \`user_id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
