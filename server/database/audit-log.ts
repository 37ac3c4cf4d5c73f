import { AuditEventEntity } from '@/server/database/audit-event-entity';
import { type DeskScope } from '@/server/database/desk-scope';
import { type Clock } from '@/server/runtime/clock';
import { type Ids } from '@/server/runtime/ids';

/** Writes who did what into the insert-only trail, in the transaction of the deed. */
export class AuditLog {
  constructor(
    private readonly scope: DeskScope,
    private readonly context: { readonly clock: Clock; readonly ids: Ids; readonly requestId: string },
  ) {}

  async note(action: string, subjectId: string | null, details: Record<string, unknown> | null = null): Promise<void> {
    const { clock, ids, requestId } = this.context;
    await this.scope.repository(AuditEventEntity).insert({
      id: ids.next(),
      personId: this.scope.actor.personId,
      action,
      subjectId,
      details,
      requestId,
      at: clock.now(),
    });
  }
}
