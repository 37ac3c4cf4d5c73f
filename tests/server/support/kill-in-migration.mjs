// Loaded before the migration command: ends its process by SIGKILL within the migration and at the point it is told.
import mysql from 'mysql2';

const atMigration = Number(process.env.KILL_IN_MIGRATION);
/** `sent`: its statement is on the way; `done`: the database did it, no note was made; `noted`: the note was made, not committed. */
const point = process.env.KILL_AT;
const end = () => process.kill(process.pid, 'SIGKILL');

const base = Object.getPrototypeOf(mysql.Connection).prototype;
const { query } = base;
let migrations = 0;
let statements = 0;
base.query = function (...parts) {
  const sql = typeof parts[0] === 'string' ? parts[0] : parts[0].sql;
  if (sql === 'START TRANSACTION') {
    migrations += 1;
    statements = 0;
  } else statements += 1;
  const isDue = migrations === atMigration && statements === (point === 'noted' ? 2 : 1);
  if (!isDue) return query.apply(this, parts);
  if (point !== 'sent') return query.call(this, ...parts.slice(0, -1), end);
  const command = query.apply(this, parts);
  setImmediate(end);
  return command;
};
