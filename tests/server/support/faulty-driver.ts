import { type Pool, type PoolConnection, type PoolOptions } from 'mysql2';
import { boundedDriver } from '@/server/database/pool';

/** How a statement fails. `lost`: the connection ends before it; `answer-lost`: after the database did it. */
export type Fault = 1213 | 1205 | 1020 | 1062 | 'lost' | 'answer-lost';
export interface FaultPlan {
  readonly fault: Fault;
  /** Which statement of a transaction fails: 0 is its START, the last is its COMMIT. */
  readonly at: number;
  /** Whether each try fails, or the first alone. */
  readonly isLasting: boolean;
  /** Whether the ROLLBACK that follows fails too. */
  readonly isRollbackRefused?: boolean;
}

type Done = (error: Error | null, ...results: unknown[]) => void;

const failure = (errno: number | undefined, code: string) =>
  Object.assign(new Error(`${code}, on purpose`), { errno, code, sqlState: 'HY000' });

/** The product's own driver, which notes the statements of transactions and fails the one it is told to. */
export class FaultyDriver {
  /** The statements of each transaction since the last `watch`, from START to COMMIT or ROLLBACK. */
  transactions: string[][] = [];
  /** Statements that ran on another connection while a transaction was open; for tests with one request at a time. */
  foreign: string[] = [];
  private plan: FaultPlan | null = null;
  private readonly open = new Map<PoolConnection, string[]>();

  readonly driver = {
    ...boundedDriver,
    createPool: (options: PoolOptions): Pool => {
      const pool = boundedDriver.createPool(options);
      pool.on('connection', (connection) => this.listen(connection));
      return pool;
    },
  };

  watch(plan: FaultPlan | null): void {
    this.plan = plan;
    this.transactions = [];
    this.foreign = [];
  }

  private listen(connection: PoolConnection): void {
    const run = connection.query.bind(connection) as (...parts: unknown[]) => unknown; // its overloads in one
    const query = (...parts: unknown[]): unknown => {
      const done = parts.at(-1);
      const sql = textOf(parts[0]);
      const fault = this.note(connection, sql);
      if (fault === null || typeof done !== 'function') return run(...parts);
      const fail = (error: Error) => setImmediate(() => (done as Done)(error)); // the driver's own callback
      switch (fault) {
        case 'lost':
          connection.destroy();
          return fail(failure(undefined, 'PROTOCOL_CONNECTION_LOST'));
        case 'answer-lost':
          return run(...parts.slice(0, -1), () => {
            connection.destroy();
            fail(failure(undefined, 'PROTOCOL_CONNECTION_LOST'));
          });
        case 1213: // the database has undone the transaction when it says so
        case 1020:
          return run('ROLLBACK', () => fail(failure(fault, `ERROR_${fault}`)));
        default:
          return fail(failure(fault, `ERROR_${fault}`));
      }
    };
    Object.assign(connection, { query });
  }

  /** Puts the statement in its transaction; gives the fault that is due, if any. */
  private note(connection: PoolConnection, sql: string): Fault | null {
    if (sql === 'START TRANSACTION') {
      const statements: string[] = [];
      this.transactions.push(statements);
      this.open.set(connection, statements);
    }
    const own = this.open.get(connection);
    if (own === undefined) {
      if (this.open.size > 0) this.foreign.push(sql);
      return null;
    }
    own.push(sql);
    const { plan } = this;
    const isEnd = sql === 'COMMIT' || sql === 'ROLLBACK';
    if (isEnd) this.open.delete(connection);
    if (plan === null) return null;
    const isRightTry = plan.isLasting || this.transactions.length === 1;
    if (sql === 'ROLLBACK') return plan.isRollbackRefused === true && isRightTry ? 1205 : null;
    return isRightTry && own.length - 1 === plan.at ? plan.fault : null;
  }
}

function textOf(first: unknown): string {
  if (typeof first === 'string') return first;
  return typeof first === 'object' && first !== null && 'sql' in first ? String(first.sql) : '';
}
