import { type DataSource } from 'typeorm';

/** The database does not keep what the product promises; the message says which setting and what it must be. */
export class DatabaseUnfitError extends Error {}

const wanted: readonly {
  readonly variable: string;
  readonly holds: (value: string) => boolean;
  readonly must: string;
}[] = [
  { variable: 'version', holds: isNewEnough, must: 'be MariaDB 10.11 or newer' },
  { variable: 'innodb_flush_log_at_trx_commit', holds: (value) => value === '1', must: 'be 1' },
  { variable: 'innodb_doublewrite', holds: (value) => value === 'ON' || value === '1', must: 'be ON' },
  { variable: 'innodb_snapshot_isolation', holds: (value) => value === 'ON' || value === '1', must: 'be ON' },
  { variable: 'sql_mode', holds: isStrict, must: 'include TRADITIONAL and ONLY_FULL_GROUP_BY' },
  { variable: 'time_zone', holds: (value) => value === '+00:00' || value === 'UTC', must: 'be +00:00' },
];

/**
 * Refuses a database that could lose or bend data, before the first request.
 * @throws {DatabaseUnfitError} naming what is wrong.
 */
export async function checkDatabase(dataSource: DataSource): Promise<void> {
  const names = wanted.map(({ variable }) => variable);
  const rows: { name: string; value: string }[] = await dataSource.query(
    'SELECT LOWER(VARIABLE_NAME) AS name, COALESCE(SESSION_VALUE, GLOBAL_VALUE) AS value FROM information_schema.SYSTEM_VARIABLES WHERE VARIABLE_NAME IN (?)',
    [[...names, 'log_bin', 'sync_binlog']],
  );
  const values = new Map(rows.map(({ name, value }) => [name, value]));
  const wrong = wanted.filter(({ variable, holds }) => !holds(values.get(variable) ?? ''));
  const problems = wrong.map(({ variable, must }) => `${variable} must ${must}`);
  if (values.get('log_bin') === 'ON' && values.get('sync_binlog') !== '1')
    problems.push('sync_binlog must be 1 while the binary log is on');

  const engines: { name: string }[] = await dataSource.query(
    "SELECT TABLE_NAME AS name FROM information_schema.TABLES WHERE TABLE_SCHEMA = DATABASE() AND TABLE_TYPE = 'BASE TABLE' AND ENGINE <> 'InnoDB'",
  );
  if (engines.length > 0)
    problems.push(`every table must be InnoDB, not ${engines.map(({ name }) => name).join(', ')}`);

  const grants: Record<string, string>[] = await dataSource.query('SHOW GRANTS');
  const tooMuch = grants
    .flatMap((row) => Object.values(row))
    .find((grant) => /\b(SUPER|ALL PRIVILEGES|CREATE|ALTER|DROP|GRANT OPTION)\b/.test(grant));
  if (tooMuch !== undefined) problems.push('the application’s account must have no right to change tables, nor SUPER');
  if (problems.length > 0) throw new DatabaseUnfitError(`The database is not fit to use: ${problems.join('; ')}.`);
}

function isNewEnough(version: string): boolean {
  const [major = 0, minor = 0] = version.split('.').map(Number);
  return version.includes('MariaDB') && (major > 10 || (major === 10 && minor >= 11));
}

function isStrict(mode: string): boolean {
  const modes = mode.split(',');
  return ['STRICT_ALL_TABLES', 'NO_ZERO_DATE', 'ERROR_FOR_DIVISION_BY_ZERO', 'ONLY_FULL_GROUP_BY'].every((name) =>
    modes.includes(name),
  );
}
