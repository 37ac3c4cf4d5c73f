import { type DataSource } from 'typeorm';
import { checkDatabase, DatabaseUnfitError } from '@/server/database/check-database';
import { createDataSource } from '@/server/database/data-source';
import { createTestDatabase, type TestDatabase } from '@/tests/server/support/test-database';

jest.setTimeout(60_000);

let database: TestDatabase;
let dataSource: DataSource;
beforeAll(async () => {
  database = await createTestDatabase();
  dataSource = await createDataSource(database.applicationUrl).initialize();
});
afterAll(async () => {
  await dataSource.destroy();
  await database.drop();
});

interface Setting {
  readonly name: string;
  readonly value: string;
}
/** The real database, but for one setting that it reports otherwise. */
function reporting(changes: Readonly<Record<string, string | null>>): DataSource {
  const stub = {
    query: async (sql: string, values?: unknown[]) => {
      const rows: Setting[] = await dataSource.query(sql, values);
      if (!sql.includes('SYSTEM_VARIABLES')) return rows;
      const kept = rows.filter(({ name }) => !(name in changes));
      const changed = Object.entries(changes).flatMap(([name, value]) => (value === null ? [] : [{ name, value }]));
      return [...kept, ...changed];
    },
  };
  return stub as unknown as DataSource; // the check asks for nothing else
}

const mode = 'STRICT_ALL_TABLES,NO_ZERO_DATE,ERROR_FOR_DIVISION_BY_ZERO,ONLY_FULL_GROUP_BY';
const wrong: readonly (readonly [string, string | null])[] = [
  ['version', '10.6.18-MariaDB'],
  ['version', '10.10.9-MariaDB'],
  ['version', '8.4.3'],
  ['version', null],
  ['innodb_flush_log_at_trx_commit', '2'],
  ['innodb_flush_log_at_trx_commit', '0'],
  ['innodb_doublewrite', 'OFF'],
  ['innodb_snapshot_isolation', 'OFF'],
  ['innodb_snapshot_isolation', null],
  ['time_zone', 'SYSTEM'],
  ['time_zone', '+01:00'],
  ['sql_mode', ''],
  ...mode.split(',').map((part) => ['sql_mode', mode.replace(part, 'ANSI_QUOTES')] as const),
];

describe('the check of the database', () => {
  it('is content with the database the product is run on', async () => {
    await expect(checkDatabase(dataSource)).resolves.toBeUndefined();
  });

  it.each(wrong)('refuses %s = %s and names it', async (name, value) => {
    const failure: unknown = await checkDatabase(reporting({ [name]: value })).catch((error: unknown) => error);
    expect(failure).toBeInstanceOf(DatabaseUnfitError);
    expect(String(failure)).toContain(`${name} must`);
    expect(String(failure).split(' must ')).toHaveLength(2); // and nothing else
  });

  it('refuses a binary log that is not written through', async () => {
    await expect(checkDatabase(reporting({ log_bin: 'ON', sync_binlog: '0' }))).rejects.toThrow(
      'sync_binlog must be 1',
    );
    await expect(checkDatabase(reporting({ log_bin: 'ON', sync_binlog: '1' }))).resolves.toBeUndefined();
    await expect(checkDatabase(reporting({ log_bin: 'OFF', sync_binlog: '0' }))).resolves.toBeUndefined();
  });

  it('accepts newer versions', async () => {
    for (const version of ['10.11.6-MariaDB', '11.8.6-MariaDB-0+deb13u1', '12.1.0-MariaDB'])
      await expect(checkDatabase(reporting({ version }))).resolves.toBeUndefined();
  });

  it('refuses a session whose own settings differ, whatever the server’s are', async () => {
    const runner = dataSource.createQueryRunner();
    const bent = { query: runner.query.bind(runner) } as unknown as DataSource; // the one connection that is bent
    try {
      await runner.query("SET SESSION sql_mode = ''");
      await expect(checkDatabase(bent)).rejects.toThrow('sql_mode must');
      await runner.query('SET SESSION sql_mode = DEFAULT');
      await runner.query("SET SESSION time_zone = '+02:00'");
      await expect(checkDatabase(bent)).rejects.toThrow('time_zone must');
      await runner.query('SET SESSION time_zone = DEFAULT');
      await expect(checkDatabase(bent)).resolves.toBeUndefined();
    } finally {
      await runner.release();
    }
  });

  it('refuses the account that may change tables, and a table of another engine', async () => {
    const owner = await createDataSource(database.migrationUrl).initialize();
    try {
      await expect(checkDatabase(owner)).rejects.toThrow('must have no right to change tables');
      await owner.query('CREATE TABLE loose (id INT) ENGINE=Aria');
      await expect(checkDatabase(owner)).rejects.toThrow('every table must be InnoDB, not loose');
    } finally {
      await owner.query('DROP TABLE IF EXISTS loose');
      await owner.destroy();
    }
  });
});
