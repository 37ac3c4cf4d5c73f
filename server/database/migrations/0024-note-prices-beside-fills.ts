import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class NotePricesBesideFills extends SqlMigration {
  readonly name = 'NotePricesBesideFills1764600000024';
  protected readonly statement = `
    ALTER TABLE \`fill\`
      ADD COLUMN IF NOT EXISTS \`underlying_price\` DECIMAL(30,12) NULL,
      ADD COLUMN IF NOT EXISTS \`mid_price\` DECIMAL(30,12) NULL
  `;
}
