import { QueryFailedError } from 'typeorm';
import { POOL_FULL, PoolExhaustedError } from '@/server/database/pool';

const lostConnection = new Set(['ECONNREFUSED', 'ECONNRESET', 'EPIPE', 'ETIMEDOUT', 'PROTOCOL_CONNECTION_LOST']);
/** Changed since read, too many connections, shutting down, lock wait, deadlock, connection killed, statement too long. */
const passing = new Set([1020, 1040, 1053, 1205, 1213, 1927, 1969]);

/** Whether a failure says that the database cannot do its work at this moment, rather than that the work is wrong. */
export function isDatabaseUnavailable(error: unknown): boolean {
  if (error instanceof PoolExhaustedError) return true;
  const cause: unknown = error instanceof QueryFailedError ? error.driverError : error;
  if (!(cause instanceof Error)) return false;
  if (cause.message === POOL_FULL) return true;
  const isOfDriver = cause !== error || 'fatal' in cause;
  if (!isOfDriver) return false;
  const { code, errno } = cause as { code?: unknown; errno?: unknown }; // the driver hangs them on
  return (typeof code === 'string' && lostConnection.has(code)) || (typeof errno === 'number' && passing.has(errno));
}
