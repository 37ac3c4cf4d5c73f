import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateScoredEntry extends SqlMigration {
  readonly name = 'CreateScoredEntry1764600000025';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`scored_entry\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`entry_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`trader_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`underlying_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`structure_kind\` VARCHAR(40) NOT NULL,
      \`horizon_class\` VARCHAR(10) NOT NULL,
      \`tags\` JSON NOT NULL,
      \`first_session_date\` DATE NOT NULL,
      \`exit_session_date\` DATE NOT NULL,
      \`judged_session_date\` DATE NULL,
      \`is_late_seal\` TINYINT NOT NULL,
      \`is_traded\` TINYINT NOT NULL,
      \`volatility_method\` VARCHAR(40) NOT NULL,
      \`move_deviations\` DOUBLE NULL,
      \`move_place\` DOUBLE NULL,
      \`volatility_ratio\` DOUBLE NULL,
      \`profit_place_low\` DOUBLE NULL,
      \`profit_place_high\` DOUBLE NULL,
      \`expected_mean\` DOUBLE NOT NULL,
      \`expected_deviation\` DOUBLE NOT NULL,
      \`realised_profit\` DECIMAL(30,12) NULL,
      \`profit_from_move\` DECIMAL(30,12) NULL,
      \`profit_from_time\` DECIMAL(30,12) NULL,
      \`profit_from_volatility\` DECIMAL(30,12) NULL,
      \`profit_from_carry\` DECIMAL(30,12) NULL,
      \`profit_from_marks\` DECIMAL(30,12) NULL,
      \`profit_from_slippage\` DECIMAL(30,12) NULL,
      \`profit_from_fees\` DECIMAL(30,12) NULL,
      \`is_followed\` TINYINT NULL,
      \`exit_tag\` VARCHAR(10) NULL,
      UNIQUE INDEX \`uq_scored_entry_desk_id\` (\`desk_id\`, \`id\`),
      UNIQUE INDEX \`uq_scored_entry_entry\` (\`desk_id\`, \`entry_id\`),
      INDEX \`ix_scored_entry_trader\` (\`desk_id\`, \`trader_id\`, \`exit_session_date\`),
      CONSTRAINT \`ck_scored_entry_horizon\` CHECK (\`horizon_class\` IN ('under-1', 'expiry-day', '1-5', '6-30', 'longer')),
      CONSTRAINT \`ck_scored_entry_exit_tag\` CHECK (\`exit_tag\` IN ('target', 'stop', 'time', 'event', 'expiry', 'unplanned')),
      CONSTRAINT \`ck_scored_entry_places\` CHECK (\`move_place\` BETWEEN 0 AND 1 AND \`profit_place_low\` BETWEEN 0 AND 1 AND \`profit_place_high\` BETWEEN 0 AND 1),
      CONSTRAINT \`fk_scored_entry_entry_id\` FOREIGN KEY (\`desk_id\`, \`entry_id\`) REFERENCES \`entry\` (\`desk_id\`, \`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION,
      CONSTRAINT \`fk_scored_entry_trader_id\` FOREIGN KEY (\`desk_id\`, \`trader_id\`) REFERENCES \`membership\` (\`desk_id\`, \`user_id\`) ON DELETE RESTRICT ON UPDATE NO ACTION,
      CONSTRAINT \`fk_scored_entry_underlying_id\` FOREIGN KEY (\`desk_id\`, \`underlying_id\`) REFERENCES \`underlying\` (\`desk_id\`, \`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
