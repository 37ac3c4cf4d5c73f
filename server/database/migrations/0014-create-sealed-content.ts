import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateSealedContent extends SqlMigration {
  readonly name = 'CreateSealedContent1764600000014';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`sealed_content\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`forecast_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`salt\` CHAR(32) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`payload\` LONGTEXT COLLATE utf8mb4_bin NOT NULL,
      UNIQUE INDEX \`uq_sealed_content_desk_id\` (\`desk_id\`, \`id\`),
      UNIQUE INDEX \`uq_sealed_content_forecast\` (\`desk_id\`, \`forecast_id\`),
      CONSTRAINT \`fk_sealed_content_forecast_id\` FOREIGN KEY (\`desk_id\`, \`forecast_id\`) REFERENCES \`sealed_forecast\` (\`desk_id\`, \`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
