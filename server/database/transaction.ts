import { setTimeout as pause } from 'node:timers/promises';
import { type PoolConnection } from 'mysql2';
import { type DataSource, type EntityManager, QueryFailedError, type QueryRunner } from 'typeorm';

/** Deadlock, lock wait timeout, and a row changed since the snapshot: the same work may succeed when it is done again. */
const worthRepeating = new Set([1213, 1205, 1020]);
const MOST_TRIES = 4;

/**
 * The one way to write: all of it or none, repeated a few times when the database asks for that. Nothing inside may use
 * another connection, send mail or call out, since it can run more than once.
 */
export async function inTransaction<T>(
  dataSource: DataSource,
  work: (manager: EntityManager) => Promise<T>,
): Promise<T> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await tryOnce(dataSource, work);
    } catch (error) {
      if (attempt >= MOST_TRIES || !isWorthRepeating(error)) throw error;
      await pause(spread(attempt));
    }
  }
}

async function tryOnce<T>(dataSource: DataSource, work: (manager: EntityManager) => Promise<T>): Promise<T> {
  const runner = dataSource.createQueryRunner();
  try {
    await runner.startTransaction();
    const result = await work(runner.manager);
    await runner.commitTransaction();
    return result;
  } catch (error) {
    await undo(runner);
    throw error;
  } finally {
    await runner.release();
  }
}

/**
 * A connection that did not roll back may still be inside the transaction, and whoever got it next would commit what it
 * holds: it is ended, and the database undoes the rest.
 */
async function undo(runner: QueryRunner): Promise<void> {
  try {
    await runner.rollbackTransaction();
  } catch {
    await runner.connect().then(
      (connection: PoolConnection) => connection.destroy(),
      () => undefined, // there was no connection to begin with
    );
  }
}

function isWorthRepeating(error: unknown): boolean {
  if (!(error instanceof QueryFailedError)) return false;
  const { driverError } = error;
  return 'errno' in driverError && typeof driverError.errno === 'number' && worthRepeating.has(driverError.errno);
}

let pauses = 0;

/** Milliseconds before the next try, apart for each process and each pause so that two do not meet again. */
function spread(attempt: number): number {
  pauses += 1;
  return attempt * 10 + (process.pid % 17) + ((pauses * 37) % 61);
}

/** Whether an insert met a row that is already there. */
export function isDuplicate(error: unknown): boolean {
  return error instanceof QueryFailedError && 'errno' in error.driverError && error.driverError.errno === 1062;
}
