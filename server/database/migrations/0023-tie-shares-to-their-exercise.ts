import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class TieSharesToTheirExercise extends SqlMigration {
  readonly name = 'TieSharesToTheirExercise1764600000023';
  protected readonly statement = `
    ALTER TABLE \`fill\`
      ADD INDEX IF NOT EXISTS \`ix_fill_made_by\` (\`desk_id\`, \`made_by\`),
      ADD CONSTRAINT \`fk_fill_made_by\` FOREIGN KEY IF NOT EXISTS (\`desk_id\`, \`made_by\`) REFERENCES \`fill\` (\`desk_id\`, \`id\`) ON DELETE RESTRICT ON UPDATE NO ACTION
  `;
}
