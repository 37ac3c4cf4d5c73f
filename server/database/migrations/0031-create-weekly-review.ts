import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class CreateWeeklyReview extends SqlMigration {
  readonly name = 'CreateWeeklyReview1764600000031';
  protected readonly statement = `
    CREATE TABLE IF NOT EXISTS \`weekly_review\` (
      \`id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL PRIMARY KEY,
      \`desk_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`trader_id\` CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      \`version\` INT NOT NULL,
      \`week_start_session_date\` DATE NOT NULL,
      \`action\` VARCHAR(6) NOT NULL,
      \`rule_text\` TEXT NOT NULL,
      \`evidence\` TEXT NOT NULL,
      \`followed_last\` VARCHAR(6) NULL,
      \`saved_at\` DATETIME(6) NOT NULL,
      UNIQUE INDEX \`uq_weekly_review_desk_id\` (\`desk_id\`, \`id\`),
      UNIQUE INDEX \`uq_weekly_review_week\` (\`desk_id\`, \`trader_id\`, \`week_start_session_date\`),
      CONSTRAINT \`fk_weekly_review_trader_id\` FOREIGN KEY (\`desk_id\`, \`trader_id\`) REFERENCES \`membership\` (\`desk_id\`, \`user_id\`) ON DELETE RESTRICT ON UPDATE NO ACTION,
      CONSTRAINT \`ck_weekly_review_action\` CHECK (\`action\` IN ('keep', 'change', 'drop')),
      CONSTRAINT \`ck_weekly_review_followed_last\` CHECK (\`followed_last\` IN ('yes', 'partly', 'no'))
    ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `;
}
