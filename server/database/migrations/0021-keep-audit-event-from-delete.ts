import { SqlMigration } from '@/server/database/migrations/sql-migration';

export class KeepAuditEventFromDelete extends SqlMigration {
  readonly name = 'KeepAuditEventFromDelete1764600000021';
  protected readonly statement = `
    CREATE TRIGGER IF NOT EXISTS \`tr_audit_event_delete\` BEFORE DELETE ON \`audit_event\`
      FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'audit_event only ever grows'
  `;
}
