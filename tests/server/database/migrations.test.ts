import { type DataSource } from 'typeorm';
import { createDataSource } from '@/server/database/data-source';
import { tableGrants } from '@/server/database/grants';
import { migrate } from '@/server/database/migrate';
import { migrations } from '@/server/database/migrations/all-migrations';
import { createTestDatabase, type TestDatabase } from '@/tests/server/support/test-database';

jest.setTimeout(60_000);

let database: TestDatabase;
let dataSource: DataSource;
beforeEach(async () => {
  database = await createTestDatabase({ isMigrated: false });
  dataSource = await createDataSource(database.migrationUrl).initialize();
});
afterEach(async () => {
  await dataSource.destroy();
  await database.drop();
});

const run = () =>
  migrate({ url: database.migrationUrl, applicationAccount: process.env.BRIERBOOK_TEST_APPLICATION_ACCOUNT ?? '' });
async function schema(): Promise<string> {
  const parts = await Promise.all([
    dataSource.query(
      'SELECT TABLE_NAME, COLUMN_NAME, COLUMN_TYPE, IS_NULLABLE, COLUMN_DEFAULT, COLLATION_NAME FROM information_schema.COLUMNS WHERE TABLE_SCHEMA = DATABASE() ORDER BY 1, ORDINAL_POSITION',
    ),
    dataSource.query(
      'SELECT TABLE_NAME, INDEX_NAME, COLUMN_NAME, NON_UNIQUE FROM information_schema.STATISTICS WHERE TABLE_SCHEMA = DATABASE() ORDER BY 1, 2, SEQ_IN_INDEX',
    ),
    dataSource.query(
      'SELECT TABLE_NAME, CONSTRAINT_NAME FROM information_schema.TABLE_CONSTRAINTS WHERE TABLE_SCHEMA = DATABASE() ORDER BY 1, 2',
    ),
    dataSource.query(
      'SELECT TRIGGER_NAME FROM information_schema.TRIGGERS WHERE TRIGGER_SCHEMA = DATABASE() ORDER BY 1',
    ),
  ]);
  return JSON.stringify(parts);
}

describe('migrations', () => {
  it('run once; a second run changes nothing', async () => {
    expect(await run()).toEqual({ applied: migrations.length });
    const first = await schema();
    expect(await run()).toEqual({ applied: 0 });
    expect(await schema()).toBe(first);
  });

  it('run once when two servers start together', async () => {
    const results = await Promise.all([run(), run(), run()]);
    expect(results.map(({ applied }) => applied).sort((a, b) => a - b)).toEqual([0, 0, migrations.length]);
    const rows = await dataSource.query('SELECT name FROM migration');
    expect(rows).toHaveLength(migrations.length);
  });

  it('come to the same schema when a run ended between a statement and its note', async () => {
    await run();
    const whole = await schema();
    for (const forgotten of [1, 5, migrations.length]) {
      await dataSource.query(`DELETE FROM migration ORDER BY id DESC LIMIT ${forgotten}`);
      expect(await run()).toEqual({ applied: forgotten });
      expect(await schema()).toBe(whole);
    }
  });

  it('make what the entities describe: TypeORM would change nothing', async () => {
    await run();
    const { upQueries } = await dataSource.driver.createSchemaBuilder().log();
    expect(upQueries.map(({ query }) => query)).toEqual([]);
    await dataSource.query('ALTER TABLE desk MODIFY name VARCHAR(60) NOT NULL');
    expect((await dataSource.driver.createSchemaBuilder().log()).upQueries).not.toEqual([]); // it would have seen it
  });

  it('are one statement each, only ever go forward, and are in order', async () => {
    const made = migrations.map((Migration) => new Migration());
    const numbers = made.map(({ name }) => Number(/\d+$/.exec(name)?.[0]));
    expect(numbers).toEqual([...numbers].sort((a, b) => a - b));
    expect(new Set(numbers).size).toBe(numbers.length);
    for (const migration of made) await expect(migration.down()).rejects.toThrow('cannot be undone');
  });

  it('give rights on every table by name, none on the whole database, and leave nothing over', async () => {
    await run();
    const tables: { name: string }[] = await dataSource.query(
      "SELECT TABLE_NAME AS name FROM information_schema.TABLES WHERE TABLE_SCHEMA = DATABASE() AND TABLE_TYPE = 'BASE TABLE' ORDER BY 1",
    );
    expect(tables.map(({ name }) => name)).toEqual(Object.keys(tableGrants).sort());
    const application = await createDataSource(database.applicationUrl).initialize();
    try {
      const grants: Record<string, string>[] = await application.query('SHOW GRANTS');
      const own = grants.flatMap((grant) => Object.values(grant)).filter((grant) => grant.includes(database.name));
      expect(own).toHaveLength(tables.length);
      expect(own.filter((grant) => grant.includes(`\`${database.name}\`.*`))).toEqual([]);
    } finally {
      await application.destroy();
    }
  });

  it('refuse an account name that could carry a statement', async () => {
    for (const applicationAccount of ["x'@'%", 'x y@%', '@', 'x@%; DROP TABLE user'])
      await expect(migrate({ url: database.migrationUrl, applicationAccount })).rejects.toThrow('APPLICATION_ACCOUNT');
  });
});
