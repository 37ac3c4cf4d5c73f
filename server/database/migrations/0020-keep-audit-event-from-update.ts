import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class KeepAuditEventFromUpdate extends SqlMigration {
  readonly name = 'KeepAuditEventFromUpdate1764600000020';
  protected readonly statement = `
    CREATE TRIGGER IF NOT EXISTS \`tr_audit_event_update\` BEFORE UPDATE ON \`audit_event\`
      FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'audit_event only ever grows'
  `;
}
