import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateScoredOdds extends SqlMigration {
  readonly name = 'CreateScoredOdds1764600000017';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`scored_odds\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`entry_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`trader_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`odds_key\` VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`statement\` VARCHAR(120) NOT NULL,
      \`due_session_date\` DATE NOT NULL,
      \`probability\` DOUBLE NOT NULL,
      \`market_implied\` DOUBLE NULL,
      \`happened\` TINYINT NULL,
      \`is_late_seal\` TINYINT NOT NULL,
      UNIQUE INDEX \`uq_scored_odds_desk_id\` (\`desk_id\`, \`id\`),
      UNIQUE INDEX \`uq_scored_odds_entry_key\` (\`desk_id\`, \`entry_id\`, \`odds_key\`),
      INDEX \`ix_scored_odds_trader\` (\`desk_id\`, \`trader_id\`, \`due_session_date\`),
      CONSTRAINT \`ck_scored_odds_probability\` CHECK (\`probability\` BETWEEN 0 AND 1),
      CONSTRAINT \`fk_scored_odds_entry_id\` FOREIGN KEY (\`desk_id\`, \`entry_id\`) REFERENCES \`entry\` (\`desk_id\`, \`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION,
      CONSTRAINT \`fk_scored_odds_trader_id\` FOREIGN KEY (\`desk_id\`, \`trader_id\`) REFERENCES \`membership\` (\`desk_id\`, \`user_id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
