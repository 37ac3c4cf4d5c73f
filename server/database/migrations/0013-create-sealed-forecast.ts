import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateSealedForecast extends SqlMigration {
  readonly name = 'CreateSealedForecast1764600000013';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`sealed_forecast\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`trader_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`entry_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`sequence\` INT NOT NULL,
      \`previous_hash\` CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`hash\` CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`commitment\` CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`sealed_at_microseconds\` BIGINT NOT NULL,
      \`engine_version\` VARCHAR(20) NOT NULL,
      UNIQUE INDEX \`uq_sealed_forecast_desk_id\` (\`desk_id\`, \`id\`),
      UNIQUE INDEX \`uq_sealed_forecast_sequence\` (\`desk_id\`, \`trader_id\`, \`sequence\`),
      UNIQUE INDEX \`uq_sealed_forecast_previous\` (\`desk_id\`, \`trader_id\`, \`previous_hash\`),
      UNIQUE INDEX \`uq_sealed_forecast_entry\` (\`desk_id\`, \`entry_id\`),
      CONSTRAINT \`ck_sealed_forecast_sequence\` CHECK (\`sequence\` > 0),
      CONSTRAINT \`fk_sealed_forecast_entry_id\` FOREIGN KEY (\`desk_id\`, \`entry_id\`) REFERENCES \`entry\` (\`desk_id\`, \`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION,
      CONSTRAINT \`fk_sealed_forecast_trader_id\` FOREIGN KEY (\`desk_id\`, \`trader_id\`) REFERENCES \`membership\` (\`desk_id\`, \`user_id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
