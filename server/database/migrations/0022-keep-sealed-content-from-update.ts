import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class KeepSealedContentFromUpdate extends SqlMigration {
  readonly name = 'KeepSealedContentFromUpdate1764600000022';
  protected readonly statement = `
    CREATE TRIGGER IF NOT EXISTS \`tr_sealed_content_update\` BEFORE UPDATE ON \`sealed_content\`
      FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'sealed_content is never changed'
  `;
}
