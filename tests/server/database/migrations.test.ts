import { type DataSource } from 'typeorm';
import { createDataSource } from '@/server/database/data-source';
import { migrate } from '@/server/database/migrate';
import { migrations } from '@/server/database/migrations/all-migrations';
import { createTestDatabase, type TestDatabase } from '@/tests/server/support/test-database';

const applicationAccount = process.env.BRIERBOOK_TEST_APPLICATION_ACCOUNT ?? '';

let database: TestDatabase;
let dataSource: DataSource;

beforeAll(async () => {
  database = await createTestDatabase();
  dataSource = createDataSource(database.migrationUrl);
  await dataSource.initialize();
});
afterAll(async () => {
  await dataSource.destroy();
  await database.drop();
});

/** Every table and trigger as the server itself writes them down. */
async function schemaOf(source: DataSource): Promise<string[]> {
  const tables: { name: string }[] = await source.query(
    'SELECT TABLE_NAME AS name FROM information_schema.TABLES WHERE TABLE_SCHEMA = DATABASE() ORDER BY TABLE_NAME',
  );
  const statements: string[] = [];
  for (const { name } of tables) {
    const [row]: Record<string, string>[] = await source.query(`SHOW CREATE TABLE \`${name}\``);
    statements.push((row?.['Create Table'] ?? '').replace(/ AUTO_INCREMENT=\d+/, ''));
  }
  const triggers: { text: string }[] = await source.query(
    "SELECT CONCAT_WS(' ', TRIGGER_NAME, ACTION_TIMING, EVENT_MANIPULATION, EVENT_OBJECT_TABLE, ACTION_STATEMENT) AS text FROM information_schema.TRIGGERS WHERE TRIGGER_SCHEMA = DATABASE() ORDER BY TRIGGER_NAME",
  );
  return [...statements, ...triggers.map(({ text }) => text)];
}

describe('the migrations', () => {
  it('make the very schema that the entities describe', async () => {
    const { upQueries } = await dataSource.driver.createSchemaBuilder().log();
    expect(upQueries.map(({ query }) => query)).toEqual([]);
  });

  it('are each noted once, and none is left to apply', async () => {
    const rows: { name: string }[] = await dataSource.query('SELECT name FROM migration ORDER BY timestamp');
    expect(rows.map(({ name }) => name)).toEqual(migrations.map((Migration) => new Migration().name));
    await expect(dataSource.showMigrations()).resolves.toBe(false);
  });

  it('change nothing when they run a second time', async () => {
    const before = await schemaOf(dataSource);
    await expect(migrate({ url: database.migrationUrl, applicationAccount })).resolves.toEqual({ applied: 0 });
    expect(await schemaOf(dataSource)).toEqual(before);
  });

  it('can each be repeated over their own result, as after a kill between the change and its note', async () => {
    const before = await schemaOf(dataSource);
    await dataSource.query('DELETE FROM migration');
    await expect(migrate({ url: database.migrationUrl, applicationAccount })).resolves.toEqual({
      applied: migrations.length,
    });
    expect(await schemaOf(dataSource)).toEqual(before);
  });

  it.each(migrations.map((Migration) => [new Migration().name, Migration] as const))(
    '%s is one statement and refuses to go back',
    async (_, Migration) => {
      const migration = new Migration();
      const statements: string[] = [];
      const runner = { query: async (statement: string) => void statements.push(statement) };
      await migration.up(runner as never); // only query is used
      expect(statements).toHaveLength(1);
      expect(statements[0]).toMatch(/IF (NOT )?EXISTS/);
      expect(statements[0]?.trim().replace(/;$/, '')).not.toContain(';');
      await expect(migration.down()).rejects.toThrow('cannot be undone');
    },
  );

  it('started by two servers at once are applied once', async () => {
    const fresh = await createTestDatabase({ isMigrated: false });
    const both = await Promise.all([
      migrate({ url: fresh.migrationUrl, applicationAccount }),
      migrate({ url: fresh.migrationUrl, applicationAccount }),
    ]);
    expect(both.map(({ applied }) => applied).sort((a, b) => a - b)).toEqual([0, migrations.length]);
    const freshSource = await createDataSource(fresh.migrationUrl).initialize();
    expect(await schemaOf(freshSource)).toEqual(await schemaOf(dataSource));
    await freshSource.destroy();
    await fresh.drop();
  });
});
