import mysql, { type Pool, type PoolConnection, type PoolOptions } from 'mysql2';

const WAIT_MS = 2_000;
const QUEUE_LIMIT = 100;
/** What the driver says when that many wait already; it has no code for it. */
export const POOL_FULL = 'Queue limit reached.';
/** Ends on the server what takes too long there; a client’s own time limit would leave the statement running. */
const SESSION_LIMITS =
  'SET SESSION max_statement_time = 10, innodb_lock_wait_timeout = 5, idle_transaction_timeout = 30';

/** Every connection was in use for too long. */
export class PoolExhaustedError extends Error {
  constructor() {
    super(`No database connection came free within ${WAIT_MS / 1000} s.`);
  }
}

type Taken = (error: NodeJS.ErrnoException | null, connection: PoolConnection) => void;

/** The driver with a pool that does not let requests wait for ever, and connections that do not work for ever. */
export const boundedDriver = { ...mysql, createPool: createBoundedPool };

function createBoundedPool(options: PoolOptions): Pool {
  const pool = mysql.createPool({ ...options, queueLimit: QUEUE_LIMIT, connectTimeout: WAIT_MS });
  // Commands of one connection run in order: whatever comes next finds the limits set.
  pool.on('connection', (connection) => connection.query(SESSION_LIMITS));
  const take = pool.getConnection.bind(pool);
  pool.getConnection = (taken: Taken) => {
    let hasAnswered = false;
    const answer: Taken = (error, connection) => {
      if (hasAnswered) {
        if (error === null) connection.release(); // it came too late for who asked
        return;
      }
      hasAnswered = true;
      clearTimeout(patience);
      taken(error, connection);
    };
    const patience = setTimeout(() => {
      hasAnswered = true;
      taken(new PoolExhaustedError(), undefined as never); // as the driver does it: an error comes without a connection
    }, WAIT_MS);
    take(answer);
  };
  return pool;
}
