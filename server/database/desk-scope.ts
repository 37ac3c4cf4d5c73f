import { type DataSource, type EntityManager, type EntityTarget } from 'typeorm';
import { DeskRepository, type DeskRow } from '@/server/database/desk-repository';
import { inTransaction } from '@/server/database/transaction';
import { type Role } from '@/shared/contract/roles';

/** Who acts, on which desk; made from the session and the database only, never from what a request says. */
export interface Actor {
  readonly personId: string;
  readonly displayName: string;
  readonly deskId: string;
  readonly role: Role;
}

/** The desk of one request: the only way to its tables. */
export class DeskScope {
  constructor(
    readonly actor: Actor,
    private readonly dataSource: DataSource,
    private readonly manager: EntityManager = dataSource.manager,
  ) {}

  get deskId(): string {
    return this.actor.deskId;
  }

  repository<E extends DeskRow>(entity: EntityTarget<E>): DeskRepository<E> {
    return new DeskRepository(this.manager, entity, this.actor.deskId);
  }

  /** Runs work in one transaction, on a scope bound to it. Inside a transaction it joins that one. */
  inTransaction<T>(work: (scope: DeskScope) => Promise<T>): Promise<T> {
    if (this.manager.queryRunner?.isTransactionActive === true) return work(this);
    return inTransaction(this.dataSource, (manager) => work(new DeskScope(this.actor, this.dataSource, manager)));
  }
}

/** Makes scopes; only the code that has proved who acts holds one of these. */
export class DeskScopes {
  constructor(private readonly dataSource: DataSource) {}

  of(actor: Actor): DeskScope {
    return new DeskScope(actor, this.dataSource);
  }
}
